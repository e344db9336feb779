package turnsheet.reading;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Clock;
import java.util.List;
import org.junit.jupiter.api.Test;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureState;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.core.diagnose.Verdict;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Reading;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class ReadingsTest {

  private final Readings readings;
  private final CaptureResults results;
  private final CapturePlaces places;
  private final SampleBench bench;

  ReadingsTest(Database database) {
    database.empty();
    Clock clock = Clock.systemUTC();
    readings = new Readings(database.jdbc(), database.transactions(), clock);
    results = new CaptureResults(database.jdbc());
    places = new CapturePlaces(database.jdbc());
    bench = new SampleBench(database.jdbc(), database.transactions(), clock);
  }

  @Test
  void readingComesBackAsItWent() {
    CaptureId capture = bench.capture("as received", "measured");
    Reading reading = SampleReadings.tone(0.37);
    ReadingId id = readings.add(capture, reading, SampleReadings.series());

    assertThat(readings.find(id).orElseThrow().reading()).isEqualTo(reading);
    assertThat(readings.curve(id, SeriesName.TRACE).orElseThrow().size()).isEqualTo(2000);
    assertThat(readings.curve(id, SeriesName.SPECTRUM).orElseThrow().low(40)).isEqualTo(0.05f);
    assertThat(readings.histogram(id).orElseThrow().count(1)).isEqualTo(5);
  }

  @Test
  void sameDocumentTwiceIsOneReading() {
    CaptureId capture = bench.capture("as received", "measured");
    ReadingId first = readings.add(capture, SampleReadings.tone(0.37), SampleReadings.series());
    ReadingId again = readings.add(capture, SampleReadings.tone(0.37), SampleReadings.series());

    assertThat(again).isEqualTo(first);
    assertThat(readings.versionsOf(capture)).hasSize(1);
  }

  @Test
  void otherDocumentStandsBesideTheOldOneAndForTheCapture() {
    CaptureId capture = bench.capture("as received", "measured");
    ReadingId first = readings.add(capture, SampleReadings.tone(0.37), SampleReadings.series());
    ReadingId second = readings.add(capture, SampleReadings.tone(0.12), SampleReadings.series());
    ReadingId third = readings.add(capture, SampleReadings.tone(0.37), SampleReadings.series());

    assertThat(readings.versionsOf(capture))
        .extracting(Readings.Version::id)
        .containsExactlyInAnyOrder(first, second, third);
    assertThat(readings.find(first)).isPresent();
    assertThat(readings.newestOf(capture).orElseThrow().id())
        .isEqualTo(readings.versionsOf(capture).get(0).id());
    assertThat(readings.ofVisit(bench.visit.id())).hasSize(1);
  }

  @Test
  void visitGivesItsReadingsWithSettingAndCondition() {
    CaptureId before = bench.capture("as received", "measured");
    CaptureId after = bench.capture("after repair", "measured");
    bench.capture("after repair", "recognised");
    readings.add(before, SampleReadings.tone(0.37), SampleReadings.series());
    readings.add(after, SampleReadings.tone(0.02), SampleReadings.series());

    List<VisitReading> found = readings.ofVisit(bench.visit.id());

    assertThat(found)
        .extracting(VisitReading::condition)
        .containsExactlyInAnyOrder("as received", "after repair");
    assertThat(found).allMatch(r -> r.settingId().equals(bench.setting));
  }

  @Test
  void resultsTellHowEachCaptureStands() {
    CaptureId measured = bench.capture("as received", "measured");
    bench.capture("after repair", "refused");
    ReadingId reading = readings.add(measured, SampleReadings.tone(0.37), SampleReadings.series());

    List<CaptureResult> found = results.ofVisit(bench.visit.id());
    CaptureResult first =
        found.stream().filter(r -> r.captureId().equals(measured)).findFirst().orElseThrow();

    assertThat(found).hasSize(2);
    assertThat(first.readingId()).isEqualTo(reading);
    assertThat(first.settingLabel()).isEqualTo("19 cm/s");
    assertThat(first.figure(FigureName.DEVIATION).value()).isEqualTo(0.37);
    assertThat(first.figure(FigureName.DEVIATION).expandedUncertainty()).isEqualTo(0.006);
    assertThat(first.figure(FigureName.WEIGHTED_RMS).expandedUncertainty()).isNull();
    assertThat(first.figure(FigureName.DRIFT).value()).isNull();
    assertThat(found)
        .filteredOn(r -> r.state() == CaptureState.REFUSED)
        .extracting(CaptureResult::refusal)
        .containsExactly("The file is silent: record it again.");
    assertThat(results.ofUnit(bench.unit.id())).isEqualTo(found);
    assertThat(results.onTheBench()).isEqualTo(found);
  }

  @Test
  void limitsOfTheBenchJudgeItsResults() {
    CaptureId capture = bench.capture("as received", "measured");
    readings.add(capture, SampleReadings.tone(0.37), SampleReadings.series());

    List<Judged> judged =
        Judged.all(
            results.limitsOnTheBench().getOrDefault(bench.setting, List.of()),
            results.onTheBench().get(0)::figure,
            DecisionRule.GUARDED);

    // 0.37 keeps 0.5; 0.067 with U = 0.002 breaks 0.06
    assertThat(judged)
        .anyMatch(j -> j.limit().figure() == FigureName.DEVIATION && j.is(Verdict.WITHIN))
        .anyMatch(j -> j.limit().figure() == FigureName.WEIGHTED_TWO_SIGMA && j.is(Verdict.OUTSIDE))
        .hasSize(2);
  }

  @Test
  void placeNamesEverythingAroundACapture() {
    CaptureId capture = bench.capture("as received", "measured");
    CapturePlace place = places.find(capture).orElseThrow();

    assertThat(place.modelName()).isEqualTo(bench.model.name());
    assertThat(place.serialNumber()).isEqualTo("0042");
    assertThat(place.customerName()).isEqualTo("A. Customer");
    assertThat(place.unitId()).isEqualTo(bench.unit.id());
    assertThat(place.instrumentName()).isNull();
  }
}
