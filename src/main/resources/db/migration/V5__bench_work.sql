-- The bench's daily work around a visit. One script for H2 and PostgreSQL.

-- filled, and then required, by V5_1
alter table unit add column code varchar(8);

alter table visit add column sensor_replaced boolean default false not null;
alter table visit add column sensor_note varchar(1000) default '' not null;

create table fitted_part (
  visit_id uuid not null references visit (id),
  position int not null,
  name varchar(200) not null,
  quantity int,
  primary key (visit_id, position)
);

create table plate_photo (
  visit_id uuid primary key references visit (id),
  sha256 char(64) not null,
  byte_length bigint not null,
  width_px int not null,
  height_px int not null,
  taken_in_at timestamp with time zone not null,
  taken_in_by varchar(80) not null
);

-- null for whatever is not a tone, and where nobody has said it
alter table capture add column tone_method varchar(30);
-- how the speed setting was found; null where the bench named it
alter table capture add column setting_proposal varchar(30);

alter table shop_profile add column speed_unit varchar(20) default 'CM_PER_S' not null;
alter table shop_profile add column mains_hz int default 50 not null;
alter table shop_profile add column paper varchar(20) default 'A4' not null;
alter table shop_profile add column language varchar(10) default 'en' not null;
