-- What kind of part it is and the numbers that its kind has beside the amount: teeth, balls, a rim,
-- a bare hub, slip, a tolerance. Null as all parts of before have it: a kind nobody has said.
alter table rotating_part add column kind varchar(20);
alter table rotating_part add column details varchar(1000);
