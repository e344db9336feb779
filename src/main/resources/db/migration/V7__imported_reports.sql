-- A report that came with an import has no print of its own; it is printed from its content when asked for. One script for H2 and PostgreSQL.

alter table report alter column pdf drop not null;
