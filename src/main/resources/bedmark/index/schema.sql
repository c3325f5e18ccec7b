-- The index over one journal. It holds nothing that the journal does not say, and is made anew where it does not fit.

-- format: version of this schema; journal: identity of the journal
create table settings (
  name varchar(40) primary key,
  content varchar(200) not null
);

-- The last entry that was taken in, how many there are, and how many of each kind that is looked for: one row.
create table mark (
  one int primary key,
  sequence_no bigint not null,
  segment int not null,
  start_at bigint not null,
  byte_length int not null,
  hash binary(32) not null,
  entries bigint not null,
  landmarks varchar not null,
  seal binary(32) not null
);

-- Every entry: where it lies, its hash, and what it is about.
create table entry (
  sequence_no bigint primary key,
  segment int not null,
  start_at bigint not null,
  byte_length int not null,
  hash binary(32) not null,
  act varchar(40) not null,
  made_at varchar(40) not null,
  person varchar not null,
  survey uuid
);
create index entry_survey on entry (survey, sequence_no);

-- Entries that are about several surveys.
create table touch (
  survey uuid not null,
  sequence_no bigint not null,
  primary key (survey, sequence_no)
);
create index touch_entry on touch (sequence_no);

-- Entries that are looked for by what they are: registers, packs, receipts, backups.
create table landmark (
  act varchar(40) not null,
  sequence_no bigint not null,
  primary key (act, sequence_no)
);
create index landmark_entry on landmark (sequence_no);

-- The newest walk of a round: the entries that started and finished it.
create table walk (
  round varchar primary key,
  started bigint not null,
  finished bigint
);

-- Every survey as it stands: the fold of its entries. The hash is that of the last of them; the seal covers the row.
create table survey (
  id uuid primary key,
  revision int not null,
  supersedes uuid,
  round varchar,
  transfer varchar not null,
  state varchar(20) not null,
  inspection varchar(20) not null,
  started varchar(40),
  completed varchar(40),
  finished bigint not null,
  verdict varchar not null,
  left_open int not null,
  first_no bigint not null,
  last_no bigint not null,
  hash binary(32) not null,
  seal binary(32) not null
);
create index survey_round on survey (round);
create index survey_transfer on survey (transfer, finished);
create index survey_newest on survey (transfer, first_no desc);
create index survey_state on survey (state);
create index survey_supersedes on survey (supersedes);
