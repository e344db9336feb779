-- What was found by reading the bytes of captures again. One script for H2 and PostgreSQL.

create table evidence (
  capture_id uuid not null references capture (id) on delete cascade,
  channel int not null,
  version varchar(20) not null,
  made_at timestamp with time zone not null,
  document varchar(4000000) not null,
  primary key (capture_id, channel, version)
);
