-- What it held was packed into zone_block.

drop table zone_before;

create index zone_plant on zone (plant);
create index zone_latest on zone (latest);
create index zone_judged on zone (judged);
create index zone_worst on zone (level, drive_share desc nulls last, saving_wh desc nulls last);

update settings set content = '5' where name = 'schema';
