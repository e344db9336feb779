-- Filters tried on the waveform of captures. One script for H2 and PostgreSQL.

create table trial (
  id uuid primary key,
  capture_id uuid not null references capture (id) on delete cascade,
  ordered_at timestamp with time zone not null,
  ordered_by varchar(80) not null,
  orders varchar(20000) not null,
  job_id uuid not null references job (id),
  refusal_code varchar(60),
  refusal_message varchar(2000),
  result varchar(2000000)
);

create index trial_capture on trial (capture_id);
