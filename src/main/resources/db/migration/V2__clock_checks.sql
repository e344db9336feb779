-- Checks of the clocks of bench instruments. One script for H2 and PostgreSQL.

create table clock_check (
  id uuid primary key,
  instrument_id uuid not null references bench_instrument (id),
  made_at timestamp with time zone not null,
  made_by varchar(80) not null,
  source varchar(300) not null,
  reference_hz double precision not null,
  reference_expanded_uncertainty_ppm double precision not null,
  file_name varchar(300) not null,
  sha256 char(64) not null,
  byte_length bigint not null,
  format varchar(400) not null,
  kind varchar(20) not null,
  channel int not null,
  sample_rate_hz double precision,
  duration_seconds double precision not null,
  method_version varchar(40) not null,
  measured_hz double precision not null,
  recording_ppm double precision not null,
  error_ppm double precision not null,
  expanded_uncertainty_ppm double precision not null,
  keeping_ppm double precision not null,
  warnings varchar(20000) not null,
  taken_at timestamp with time zone,
  taken_by varchar(80),
  before_error_ppm double precision,
  before_expanded_uncertainty_ppm double precision,
  before_checked_on date
);

create index clock_check_instrument on clock_check (instrument_id, made_at);
