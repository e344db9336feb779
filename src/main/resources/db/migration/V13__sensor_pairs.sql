-- Two sensors compared, and the links that open a comparison. One script for H2 and PostgreSQL.

create table sensor_pair (
  id uuid primary key,
  capture_id uuid not null references capture (id) on delete cascade,
  made_at timestamp with time zone not null,
  made_by varchar(80) not null,
  ordered varchar(20000) not null,
  document varchar(4000000)
);

create index sensor_pair_of_capture on sensor_pair (capture_id, made_at);

create table sensor_pair_link (
  token_sha256 char(64) primary key,
  pair_id uuid not null references sensor_pair (id) on delete cascade,
  created_at timestamp with time zone not null,
  created_by varchar(80) not null,
  expires_at timestamp with time zone not null,
  withdrawn_at timestamp with time zone
);

create index sensor_pair_link_of_pair on sensor_pair_link (pair_id);
