-- Every channel of a capture may have readings. One script for H2 and PostgreSQL.

-- the channel that stands for the capture in histories and on sheets
alter table capture add column main_channel int default 1 not null;

update capture set main_channel = cast(substring(choices
    from position('"channel":' in choices) + 10
    for position(',"contents"' in choices) - position('"channel":' in choices) - 10) as int)
  where position('"channel":' in choices) > 0 and position('"channel":null' in choices) = 0;

alter table reading add column channel int default 1 not null;

-- the source stands first in a document
update reading set channel = cast(substring(document
    from position('"channel":' in document) + 10
    for position(',"sampleRateHz"' in document) - position('"channel":' in document) - 10) as int);

alter table reading alter column channel drop default;

-- channels that the latest measurement of a capture could make nothing of
create table refused_channel (
  capture_id uuid not null references capture (id),
  channel int not null,
  code varchar(60) not null,
  message varchar(2000) not null,
  primary key (capture_id, channel)
);
