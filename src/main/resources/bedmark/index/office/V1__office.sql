-- The office's tables, for the embedded database of a folder and for a server that several desks share.
-- ${bytes} is the type of long binary content: blob or bytea.

create table settings (
  name varchar(40) primary key,
  content varchar(400) not null
);

-- Everything the office did, in order, as its journal says it. On a server this table is that journal.
create table deed (
  seq bigint primary key,
  made_at varchar(40) not null,
  person varchar not null,
  device uuid not null,
  code varchar(40) not null,
  payload ${bytes} not null
);
create index deed_code on deed (code, seq);

-- Packs that were taken in. On a server the content lies here, else in the folder.
create table pack (
  sha256 varchar(64) primary key,
  seq bigint not null,
  content ${bytes}
);

-- Every version of a plant's register that a survey was made with.
create table register (
  digest varchar(64) primary key,
  plant varchar not null,
  content ${bytes} not null
);

-- The register, forms and rounds of a plant that hold today: the office's own, else the newest that came.
create table plant (
  id varchar primary key,
  made bigint not null,
  own boolean not null,
  digest varchar(64) not null,
  register varchar(64) not null,
  content ${bytes} not null
);

-- Every content of every survey, once.
create table survey (
  digest varchar(64) primary key,
  id uuid not null,
  revision int not null,
  supersedes uuid,
  zone varchar not null,
  round varchar not null,
  status varchar(20) not null,
  begun bigint,
  finished bigint,
  made bigint not null,
  register varchar(64) not null,
  conveyor varchar not null,
  drive varchar not null,
  pack varchar(64) not null,
  content bytea not null
);
create index survey_zone on survey (zone);
create index survey_drive on survey (drive);
create index survey_id on survey (id);

-- Every loading zone as it stands: its names by today's register, what counts of its surveys, and the judgement.
create table zone (
  zone varchar primary key,
  plant varchar not null,
  transfer varchar not null,
  plant_name varchar not null,
  area varchar not null,
  conveyor varchar not null,
  conveyor_tag varchar not null,
  tag varchar not null,
  asset varchar not null,
  material varchar not null,
  registered boolean not null,
  visit varchar(64),
  visit_status varchar(20),
  visited bigint,
  latest varchar(64),
  moment bigint,
  clashes int not null,
  clock_wrong boolean not null,
  judged boolean not null,
  level int,
  incomplete boolean,
  drive_share double precision,
  skirt_power double precision,
  saving_wh double precision,
  saving_cost double precision,
  saving_co2 double precision,
  remedy varchar(60),
  energy_wh double precision,
  cost double precision,
  co2 double precision,
  energy_kind varchar(20),
  currency varchar(20),
  findings varchar
);
create index zone_plant on zone (plant);
create index zone_latest on zone (latest);
create index zone_judged on zone (judged);

insert into settings (name, content) values ('schema', '1');
