package turnsheet.reading;

import java.time.Instant;
import java.time.OffsetDateTime;
import java.util.List;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import turnsheet.shop.InstrumentId;

/**
 * The floors of recordings: what their noise alone would show as fluctuation. They stand beside the
 * figures of each reading, under their path in the result contract and without uncertainty.
 */
@Component
public final class Floors {

  static final String PATH = "signal.floorPercent";

  private final JdbcClient jdbc;

  public Floors(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  /** Of what was recorded with an instrument, in the order of arrival. */
  public List<Floor> ofInstrument(InstrumentId instrument) {
    return jdbc.sql(
            """
            select c.received_at, f.amount
            from capture c join reading r on r.capture_id = c.id and c.state = 'measured' and %s
              join reading_figure f on f.reading_id = r.id and f.figure = ?
            where c.instrument_id = ? and f.amount is not null
            order by c.received_at, c.id
            """
                .formatted(Readings.NEWEST_OF_ITS_CAPTURE))
        .params(PATH, instrument.value())
        .query(
            (row, number) ->
                new Floor(
                    row.getObject("received_at", OffsetDateTime.class).toInstant(),
                    row.getDouble("amount")))
        .list();
  }

  /** Of one capture. */
  public record Floor(Instant receivedAt, double percent) {}
}
