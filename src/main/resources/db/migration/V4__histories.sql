-- What histories ask for. One script for H2 and PostgreSQL.

-- the floor of a recording stands with the figures, so that it can be followed over time
insert into reading_figure (reading_id, figure, amount, expanded_uncertainty)
  select id, 'signal.floorPercent',
    cast(substring(tail from 1 for position(',' in tail) - 1) as double precision), null
  from (
    select id, substring(document from position('"floorPercent":{"value":' in document) + 24 for 40)
      as tail
    from reading where position('"floorPercent":{"value":' in document) > 0) found
  where substring(tail from 1 for 4) <> 'null';

create index capture_speed_setting on capture (speed_setting_id);
create index capture_instrument on capture (instrument_id);
create index visit_closed on visit (closed_at);
