-- One script for H2 and PostgreSQL. Times are instants; ids are made by the application.

-- access
create table account (
  id uuid primary key,
  sign_in_name varchar(80) not null unique,
  display_name varchar(120) not null,
  role varchar(20) not null,
  password_hash varchar(200) not null,
  created_at timestamp with time zone not null,
  disabled_at timestamp with time zone
);

create table one_time_address (
  token_sha256 char(64) primary key,
  purpose varchar(20) not null,
  account_id uuid references account (id),
  expires_at timestamp with time zone not null,
  used_at timestamp with time zone
);

create table api_key (
  id uuid primary key,
  account_id uuid not null references account (id),
  label varchar(120) not null,
  key_sha256 char(64) not null unique,
  created_at timestamp with time zone not null,
  last_used_at timestamp with time zone,
  withdrawn_at timestamp with time zone
);

create table audit_entry (
  id bigint generated always as identity primary key,
  happened_at timestamp with time zone not null,
  account_name varchar(80) not null,
  action varchar(60) not null,
  subject varchar(400) not null
);

-- shop
create table shop_profile (
  id int primary key check (id = 1),
  name varchar(200) not null,
  address varchar(1000) not null
);

create table customer (
  id uuid primary key,
  name varchar(200) not null,
  contact varchar(1000) not null,
  created_at timestamp with time zone not null
);

create table machine_model (
  id uuid primary key,
  name varchar(200) not null unique,
  pulses_per_turn int,
  note varchar(4000) not null
);

create table speed_setting (
  id uuid primary key,
  model_id uuid not null references machine_model (id),
  position int not null,
  label varchar(80) not null,
  speed_unit varchar(20) not null,
  nominal_speed double precision not null,
  tone_hz double precision,
  pulses_per_second double precision,
  unique (model_id, label)
);

create table rotating_part (
  model_id uuid not null references machine_model (id),
  position int not null,
  name varchar(120) not null,
  basis varchar(30) not null,
  amount double precision not null,
  reference_part varchar(120),
  primary key (model_id, name)
);

create table service_limit (
  model_id uuid not null references machine_model (id),
  position int not null,
  speed_setting_id uuid not null references speed_setting (id),
  figure varchar(60) not null,
  upper_bound double precision not null,
  origin varchar(300) not null,
  primary key (speed_setting_id, figure)
);

create index service_limit_model on service_limit (model_id);

create table unit (
  id uuid primary key,
  model_id uuid not null references machine_model (id),
  customer_id uuid not null references customer (id),
  serial_number varchar(120) not null,
  note varchar(4000) not null,
  created_at timestamp with time zone not null,
  unique (model_id, serial_number)
);

create index unit_customer on unit (customer_id);

create table visit (
  id uuid primary key,
  unit_id uuid not null references unit (id),
  opened_at timestamp with time zone not null,
  closed_at timestamp with time zone,
  complaint varchar(4000) not null,
  work_done varchar(4000) not null
);

create index visit_unit on visit (unit_id, opened_at);

create table bench_instrument (
  id uuid primary key,
  name varchar(200) not null unique,
  clock_error_ppm double precision not null,
  clock_expanded_uncertainty_ppm double precision,
  checked_on date,
  note varchar(4000) not null
);

create table reference_medium (
  id uuid primary key,
  name varchar(200) not null unique,
  tone_hz double precision,
  speed_tolerance_percent double precision not null,
  own_flutter_percent double precision,
  note varchar(4000) not null
);

-- job
create table job (
  id uuid primary key,
  name varchar(60) not null,
  subject uuid not null,
  state varchar(20) not null,
  progress double precision not null,
  message varchar(1000) not null,
  attempts int not null,
  created_at timestamp with time zone not null,
  started_at timestamp with time zone,
  finished_at timestamp with time zone
);

create index job_subject on job (subject);

create table scheduled_tasks (
  task_name varchar(100) not null,
  task_instance varchar(100) not null,
  task_data bytea,
  execution_time timestamp with time zone not null,
  picked boolean not null,
  picked_by varchar(50),
  last_success timestamp with time zone,
  last_failure timestamp with time zone,
  consecutive_failures int,
  last_heartbeat timestamp with time zone,
  version bigint not null,
  priority smallint,
  primary key (task_name, task_instance)
);

create index scheduled_tasks_execution_time on scheduled_tasks (execution_time);
create index scheduled_tasks_last_heartbeat on scheduled_tasks (last_heartbeat);

-- capture
create table capture (
  id uuid primary key,
  visit_id uuid not null references visit (id),
  speed_setting_id uuid not null references speed_setting (id),
  bench_condition varchar(60) not null,
  instrument_id uuid references bench_instrument (id),
  medium_id uuid references reference_medium (id),
  file_name varchar(300) not null,
  sha256 char(64) not null,
  byte_length bigint not null,
  received_at timestamp with time zone not null,
  received_by varchar(80) not null,
  state varchar(20) not null,
  recognition varchar(200000),
  choices varchar(20000),
  refusal_code varchar(60),
  refusal_message varchar(2000),
  job_id uuid references job (id)
);

create index capture_visit on capture (visit_id);

-- reading
create table reading (
  id uuid primary key,
  capture_id uuid not null references capture (id),
  method_version varchar(40) not null,
  made_at timestamp with time zone not null,
  document varchar(1000000) not null
);

create index reading_capture on reading (capture_id);

create table reading_figure (
  reading_id uuid not null references reading (id),
  figure varchar(60) not null,
  amount double precision,
  expanded_uncertainty double precision,
  primary key (reading_id, figure)
);

create table reading_series (
  reading_id uuid not null references reading (id),
  name varchar(40) not null,
  content bytea not null,
  primary key (reading_id, name)
);

-- share
create table share_link (
  id uuid primary key,
  token_sha256 char(64) not null unique,
  visit_id uuid not null references visit (id),
  created_at timestamp with time zone not null,
  created_by varchar(80) not null,
  expires_at timestamp with time zone not null,
  withdrawn_at timestamp with time zone,
  views int not null,
  last_view_at timestamp with time zone
);
