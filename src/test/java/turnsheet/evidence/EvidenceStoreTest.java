package turnsheet.evidence;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import org.junit.jupiter.api.Test;
import turnsheet.capture.CaptureId;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.signal.Rejection;
import turnsheet.reading.SampleBench;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class EvidenceStoreTest {

  private static final Instant NOON = Instant.parse("2026-03-01T12:00:00Z");

  /** What a gatherer might find. */
  record Found(double hertz, List<String> words) {}

  private final Database database;
  private final SampleBench bench;

  EvidenceStoreTest(Database database) {
    database.empty();
    this.database = database;
    this.bench =
        new SampleBench(
            database.jdbc(), database.transactions(), Clock.fixed(NOON, ZoneOffset.UTC));
  }

  @Test
  void theLatestOfEachChannelIsGivenAndTakesThePlaceOfItsVersion() {
    CaptureId id = bench.capture("as received", "measured");
    EvidenceStore store = at(NOON);
    store.keep(id, document("1", 2, new Found(50, List.of("a"))));
    store.keep(id, document("1", 1, new Found(49.98, List.of())));
    store.keep(id, document("1", 1, new Found(50.02, List.of("b", "c"))));
    at(NOON.plusSeconds(60)).keep(id, document("2", 2, new Found(60, List.of())));

    List<StoredEvidence> all = store.ofCapture(id);
    assertThat(all).extracting(e -> e.document().channel()).containsExactly(1, 2);
    assertThat(found(all.get(0))).isEqualTo(new Found(50.02, List.of("b", "c")));
    assertThat(found(all.get(1))).isEqualTo(new Found(60, List.of()));
    assertThat(all.get(1).madeAt()).isEqualTo(NOON.plusSeconds(60));
    assertThat(all.get(0).document().section("none"))
        .map(Section::refusal)
        .hasValue(new Rejection("silent", "There is nothing."));
    assertThat(all.get(0).document().section("later")).isEmpty();
    assertThat(database.jdbc().sql("select count(*) from evidence").query(Long.class).single())
        .isEqualTo(3);
  }

  private EvidenceStore at(Instant now) {
    return new EvidenceStore(
        database.jdbc(), database.transactions(), Clock.fixed(now, ZoneOffset.UTC));
  }

  private static EvidenceDocument document(String version, int channel, Found found) {
    return new EvidenceDocument(
        version,
        "ab".repeat(32),
        channel,
        MeasureSettings.tone(3150).onChannel(channel),
        List.of(
            Section.found("mains", found),
            Section.refused("none", new Rejection("silent", "There is nothing."))));
  }

  private static Found found(StoredEvidence stored) {
    return stored.document().section("mains").flatMap(s -> s.found(Found.class)).orElseThrow();
  }
}
