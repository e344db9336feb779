-- Captures that sheets and reports leave out, each with its reason. One script for H2 and PostgreSQL.

create table left_out_capture (
  capture_id uuid primary key references capture (id),
  reason varchar(300) not null,
  left_out_at timestamp with time zone not null,
  left_out_by varchar(80) not null
);
