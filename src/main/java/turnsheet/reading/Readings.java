package turnsheet.reading;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.List;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.capture.CaptureId;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Reading;
import turnsheet.core.measure.Series;
import turnsheet.core.signal.Fluctuation;
import turnsheet.document.ReadingDocument;
import turnsheet.reading.chart.Curve;
import turnsheet.shop.VisitId;

/** All readings with their curves. Readings are added, never changed. */
@Component
public final class Readings {

  static final String NEWEST_OF_ITS_CHANNEL =
      """
      not exists (select 1 from reading later where later.capture_id = r.capture_id
        and later.channel = r.channel
        and (later.made_at > r.made_at or (later.made_at = r.made_at and later.id > r.id)))
      """;

  /** The newest of the channel that stands for the capture. */
  static final String NEWEST_OF_ITS_CAPTURE =
      "r.channel = (select m.main_channel from capture m where m.id = r.capture_id) and "
          + NEWEST_OF_ITS_CHANNEL;

  private final JdbcClient jdbc;
  private final TransactionOperations transactions;
  private final Clock clock;
  private final SeriesRows rows;

  public Readings(JdbcClient jdbc, TransactionOperations transactions, Clock clock) {
    this.jdbc = jdbc;
    this.transactions = transactions;
    this.clock = clock;
    this.rows = new SeriesRows(jdbc);
  }

  /**
   * Stores a reading beside those that the capture has.
   *
   * <p>Joins the caller's transaction. Where the newest reading of the channel is the same
   * document, as after a job that was run twice, nothing is stored.
   *
   * @return the new reading, or the same one
   */
  public ReadingId add(CaptureId capture, Reading reading, Series series) {
    return add(capture, reading, KeptSeries.of(series));
  }

  ReadingId add(CaptureId capture, Reading reading, KeptSeries series) {
    return transactions.execute(status -> addOnce(capture, reading, series));
  }

  public Optional<StoredReading> find(ReadingId id) {
    return jdbc.sql("select * from reading r where r.id = ?")
        .param(id.value())
        .query(Readings::stored)
        .optional();
  }

  /** The reading that stands for a capture: the newest of its main channel. */
  public Optional<StoredReading> newestOf(CaptureId capture) {
    return jdbc.sql("select * from reading r where r.capture_id = ? and " + NEWEST_OF_ITS_CAPTURE)
        .param(capture.value())
        .query(Readings::stored)
        .optional();
  }

  /** The newest reading of each channel of a capture, in the order of the channels. */
  public List<StoredReading> ofChannels(CaptureId capture) {
    return jdbc.sql(
            "select * from reading r where r.capture_id = ? and "
                + NEWEST_OF_ITS_CHANNEL
                + " order by r.channel")
        .param(capture.value())
        .query(Readings::stored)
        .list();
  }

  /**
   * Which readings a capture has, without their documents: those of its main channel first, then by
   * channel, the newest first.
   */
  public List<Version> versionsOf(CaptureId capture) {
    return jdbc.sql(
            """
            select r.id, r.made_at, r.method_version, r.channel, c.main_channel
            from reading r join capture c on c.id = r.capture_id where r.capture_id = ?
            order by case when r.channel = c.main_channel then 0 else 1 end, r.channel,
              r.made_at desc, r.id desc
            """)
        .param(capture.value())
        .query(
            (row, number) ->
                new Version(
                    new ReadingId(row.getObject("id", UUID.class)),
                    row.getObject("made_at", OffsetDateTime.class).toInstant(),
                    row.getString("method_version"),
                    row.getInt("channel"),
                    row.getInt("channel") == row.getInt("main_channel")))
        .list();
  }

  /** The reading that stands for each measured capture of a visit, in one statement. */
  public List<VisitReading> ofVisit(VisitId visit) {
    return jdbc.sql(
            """
            select r.*, c.speed_setting_id, c.bench_condition, c.file_name, c.received_at,
              c.tone_method, i.name as instrument_name, m.name as medium_name, l.reason as left_out
            from reading r join capture c on c.id = r.capture_id
              left join bench_instrument i on i.id = c.instrument_id
              left join reference_medium m on m.id = c.medium_id
              left join left_out_capture l on l.capture_id = c.id
            where c.visit_id = ? and c.state = 'measured' and %s
            order by c.received_at, c.id
            """
                .formatted(NEWEST_OF_ITS_CAPTURE))
        .param(visit.value())
        .query(VisitReading::of)
        .list();
  }

  /** A curve of a reading; empty where the reading has none of that name. */
  public Optional<Curve> curve(ReadingId id, SeriesName name) {
    return rows.curve(id, name);
  }

  public Optional<Series.Histogram> histogram(ReadingId id) {
    return rows.histogram(id);
  }

  /** The fluctuation in blocks; empty for readings of the time before it was kept. */
  public Optional<Series.Blocks> blocks(ReadingId id) {
    return rows.blocks(id);
  }

  /** The fluctuation itself; empty for readings of the time before it was kept. */
  public Optional<Fluctuation> fluctuation(ReadingId id) {
    return rows.fluctuation(id);
  }

  private ReadingId addOnce(CaptureId capture, Reading reading, KeptSeries series) {
    String document = ReadingDocument.toJson(reading);
    Optional<UUID> same =
        jdbc.sql(
                "select r.id from reading r where r.capture_id = ? and r.document = ? and "
                    + NEWEST_OF_ITS_CHANNEL)
            .params(capture.value(), document)
            .query(UUID.class)
            .optional();
    if (same.isPresent()) {
      ReadingId kept = new ReadingId(same.get());
      rows.addWhereNone(kept, series);
      return kept;
    }
    ReadingId id = ReadingId.next();
    jdbc.sql(
            """
            insert into reading (id, capture_id, method_version, made_at, document, channel)
            values (?, ?, ?, ?, ?, ?)
            """)
        .params(
            id.value(),
            capture.value(),
            reading.method().version(),
            now(),
            document,
            reading.source().channel())
        .update();
    addFigures(id, reading);
    rows.addWhereNone(id, series);
    return id;
  }

  /** Enters the figures of a reading whose document is there, for whoever looks for figures. */
  public void addFigures(ReadingId id, Reading reading) {
    for (FigureName name : FigureName.values()) {
      Figure figure = name.of(reading);
      addFigure(id, name.path(), figure.value(), figure.expandedUncertainty());
    }
    addFigure(id, Floors.PATH, reading.signal().floorPercent().value(), null);
  }

  private void addFigure(
      ReadingId id, String path, @Nullable Double amount, @Nullable Double uncertainty) {
    jdbc.sql("insert into reading_figure values (:reading, :figure, :amount, :uncertainty)")
        .param("reading", id.value())
        .param("figure", path)
        .param("amount", amount)
        .param("uncertainty", uncertainty)
        .update();
  }

  /** To the microsecond, which both databases keep. */
  private OffsetDateTime now() {
    return clock.instant().truncatedTo(ChronoUnit.MICROS).atOffset(ZoneOffset.UTC);
  }

  static StoredReading stored(ResultSet row, int number) throws SQLException {
    return new StoredReading(
        new ReadingId(row.getObject("id", UUID.class)),
        new CaptureId(row.getObject("capture_id", UUID.class)),
        row.getObject("made_at", OffsetDateTime.class).toInstant(),
        ReadingDocument.fromJson(row.getString("document")));
  }

  /**
   * A reading without its figures.
   *
   * @param main whether its channel stands for the capture
   */
  public record Version(ReadingId id, Instant madeAt, String version, int channel, boolean main) {}
}
