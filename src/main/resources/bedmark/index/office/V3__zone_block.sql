-- A zone's row holds what the tables are asked by; whatever else a list shows of it stands in a block, packed with other
-- zones of its plant. All zones are read at once for such a list, and three thousand rows of two columns are read many
-- times as fast as two hundred thousand of thirty.

alter table zone rename to zone_before;

create table zone (
  zone varchar primary key,
  plant varchar not null,
  latest varchar(64),
  clashes int not null,
  judged boolean not null,
  level int,
  drive_share double precision,
  saving_wh double precision
);

insert into zone (zone, plant, latest, clashes, judged, level, drive_share, saving_wh)
select zone, plant, latest, clashes, judged, level, case when level is not null then drive_share end,
  case when level is not null then saving_wh end from zone_before;

create table zone_block (
  block varchar primary key,
  zones bytea not null
);
