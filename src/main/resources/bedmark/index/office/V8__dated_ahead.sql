-- A survey that a tablet dated later than it came, by more than a day, keeps when it came: its date can't be believed,
-- and it must not hide the true ones before it. Zones that hold one are put together and judged once more. No index
-- finds zones by their latest survey any more.

alter table survey add column came bigint;

-- A moment on a whole minute is written without its seconds, which not every database reads.
update survey set came = (select cast(floor(extract(epoch from cast(case substring(deed.made_at from 17 for 1)
    when ':' then deed.made_at else substring(deed.made_at from 1 for 16) || ':00' || substring(deed.made_at from 17) end
    as timestamp with time zone)) * 1000) as bigint)
  from pack join deed on deed.seq = pack.seq where pack.sha256 = survey.pack);

update survey set came = null where coalesce(finished, begun, made) - came <= 86400000;

update zone set judged = false where zone in (select zone from survey where came is not null);

drop index zone_latest;

update settings set content = '8' where name = 'schema';
