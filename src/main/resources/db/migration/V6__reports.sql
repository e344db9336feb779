-- Rules of the shop and issued reports. One script for H2 and PostgreSQL.

create table shop_logo (
  id int primary key check (id = 1),
  media_type varchar(40) not null,
  content bytea not null
);

create table shop_rules (
  id int primary key check (id = 1),
  decision_rule varchar(20) not null,
  least_flutter_change_percent double precision not null,
  least_speed_change_percent double precision not null
);

insert into shop_rules values (1, 'GUARDED', 10, 0.02);

create table report (
  number bigint primary key,
  visit_id uuid not null references visit (id),
  issued_at timestamp with time zone not null,
  revises bigint unique references report (number),
  check_code varchar(40) not null unique,
  content_sha256 char(64) not null,
  content bytea not null,
  pdf bytea not null
);

create index report_visit on report (visit_id);
