package turnsheet.evidence;

import java.time.Clock;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.temporal.ChronoUnit;
import java.util.List;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Repository;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.capture.CaptureId;

/** The evidence of all captures: one document for each channel and version. */
@Repository
public class EvidenceStore {

  private final JdbcClient jdbc;
  private final TransactionOperations transactions;
  private final Clock clock;

  public EvidenceStore(JdbcClient jdbc, TransactionOperations transactions, Clock clock) {
    this.jdbc = jdbc;
    this.transactions = transactions;
    this.clock = clock;
  }

  /** Keeps a document in place of the one of its channel and version. */
  public void keep(CaptureId capture, EvidenceDocument document) {
    transactions.executeWithoutResult(
        status -> {
          jdbc.sql("delete from evidence where capture_id = ? and channel = ? and version = ?")
              .params(capture.value(), document.channel(), document.version())
              .update();
          jdbc.sql(
                  """
                  insert into evidence (capture_id, channel, version, made_at, document)
                  values (?, ?, ?, ?, ?)
                  """)
              .params(
                  capture.value(), document.channel(), document.version(), now(), document.toJson())
              .update();
        });
  }

  /** The latest evidence of each channel, in the order of the channels. */
  public List<StoredEvidence> ofCapture(CaptureId capture) {
    return jdbc.sql(
            """
            select e.made_at, e.document from evidence e
            where e.capture_id = ? and not exists (select 1 from evidence later
              where later.capture_id = e.capture_id and later.channel = e.channel
                and (later.made_at > e.made_at
                  or (later.made_at = e.made_at and later.version > e.version)))
            order by e.channel
            """)
        .param(capture.value())
        .query(
            (row, number) ->
                new StoredEvidence(
                    row.getObject("made_at", OffsetDateTime.class).toInstant(),
                    EvidenceDocument.fromJson(row.getString("document"))))
        .list();
  }

  /** To the microsecond, which both databases keep. */
  private OffsetDateTime now() {
    return clock.instant().truncatedTo(ChronoUnit.MICROS).atOffset(ZoneOffset.UTC);
  }
}
