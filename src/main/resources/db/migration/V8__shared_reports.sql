-- Links open issued reports. Those made before opened the sheet of a visit and open nothing now.

alter table share_link add column report_number bigint;
alter table share_link add column shows_history boolean default false not null;
alter table share_link add constraint share_link_report foreign key (report_number) references report (number);
create index share_link_of_report on share_link (report_number);
