-- A finding is kept as it stands today and as it stands at design feed; whatever was judged before is judged once more.

update zone set judged = false where latest is not null;

update settings set content = '6' where name = 'schema';
