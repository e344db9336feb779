-- Rules of the shop. One script for H2 and PostgreSQL.

create table shop_rules (
  id int primary key check (id = 1),
  decision_rule varchar(20) not null,
  least_flutter_change_percent double precision not null,
  least_speed_change_percent double precision not null
);

insert into shop_rules values (1, 'GUARDED', 10, 0.02);
