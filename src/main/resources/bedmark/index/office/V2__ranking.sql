-- The head of the worst-first list, in its order, without reading every zone.

create index zone_worst on zone (level, drive_share desc nulls last, saving_wh desc nulls last);

update settings set content = '2' where name = 'schema';
