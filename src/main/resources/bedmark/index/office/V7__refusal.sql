-- Packs that were refused and did not come in since: notes for whoever looks in later, made anew from nothing.
-- The key is the pack's digest, or the file's name where it could not be read to its end.

create table refusal (
  pack varchar primary key,
  file varchar not null,
  sha256 varchar(64),
  bytes bigint,
  device varchar,
  fingerprint varchar(100),
  why varchar not null,
  first_at bigint not null,
  last_at bigint not null
);
create index refusal_last on refusal (last_at);

update settings set content = '7' where name = 'schema';
