package turnsheet.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.tuple;

import java.time.Clock;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.springframework.jdbc.core.simple.JdbcClient;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureState;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.core.diagnose.Verdict;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Rejection;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class ReadingsTest {

  private final Readings readings;
  private final CaptureResults results;
  private final CapturePlaces places;
  private final CaptureChannels channels;
  private static final Instant LATER = Instant.parse("2100-01-01T00:00:00Z");

  private final JdbcClient jdbc;
  private final SampleBench bench;

  ReadingsTest(Database database) {
    database.empty();
    Clock clock = Clock.systemUTC();
    readings = new Readings(database.jdbc(), database.transactions(), clock);
    results = new CaptureResults(database.jdbc());
    places = new CapturePlaces(database.jdbc());
    channels = new CaptureChannels(database.jdbc(), readings);
    jdbc = database.jdbc();
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
    assertThat(results.onTheBench(LATER)).isEqualTo(found);
  }

  @Test
  void whatWasHandedBackSinceIsStillOnTheBench() {
    CaptureId capture = bench.capture("as received", "measured");
    readings.add(capture, SampleReadings.tone(0.37), SampleReadings.series());
    Instant gone = Instant.parse("2026-03-02T12:00:00Z");
    jdbc.sql("update visit set closed_at = ? where id = ?")
        .params(gone.atOffset(java.time.ZoneOffset.UTC), bench.visit.id().value())
        .update();
    assertThat(results.onTheBench(gone))
        .extracting(r -> r.figure(FigureName.DEVIATION).value())
        .containsExactly(0.37);
    assertThat(results.onTheBench(gone.plusSeconds(1))).isEmpty();
  }

  @Test
  void limitsOfTheBenchJudgeItsResults() {
    CaptureId capture = bench.capture("as received", "measured");
    readings.add(capture, SampleReadings.tone(0.37), SampleReadings.series());

    List<Judged> judged =
        Judged.all(
            results.limitsOnTheBench(LATER).getOrDefault(bench.setting, List.of()),
            results.onTheBench(LATER).get(0)::figure,
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

  @Test
  void onlyTheMainChannelStandsForItsCapture() {
    CaptureId capture = bench.capture("as received", "measured");
    ReadingId left = readings.add(capture, SampleReadings.tone(0.37, 1), SampleReadings.series());
    ReadingId right = readings.add(capture, SampleReadings.tone(0.39, 2), SampleReadings.series());

    assertThat(readings.newestOf(capture)).map(StoredReading::id).hasValue(left);
    assertThat(readings.ofVisit(bench.visit.id())).hasSize(1);
    assertThat(results.onTheBench(LATER))
        .singleElement()
        .satisfies(r -> assertThat(r.readingId()).isEqualTo(left))
        .satisfies(r -> assertThat(r.figure(FigureName.DEVIATION).value()).isEqualTo(0.37));
    assertThat(readings.ofChannels(capture))
        .extracting(StoredReading::id)
        .containsExactly(left, right);
    assertThat(readings.versionsOf(capture))
        .extracting(Readings.Version::channel, Readings.Version::main)
        .containsExactly(tuple(1, true), tuple(2, false));

    jdbc.sql("update capture set main_channel = 2").update();

    assertThat(readings.newestOf(capture)).map(StoredReading::id).hasValue(right);
    assertThat(results.onTheBench(LATER).get(0).readingId()).isEqualTo(right);
    assertThat(readings.versionsOf(capture).get(0).id()).isEqualTo(right);
  }

  @Test
  void aChannelMeasuredAgainIsNewestAmongItsOwnOnly() {
    CaptureId capture = bench.capture("as received", "measured");
    readings.add(capture, SampleReadings.tone(0.37, 1), SampleReadings.series());
    ReadingId right = readings.add(capture, SampleReadings.tone(0.39, 2), SampleReadings.series());
    ReadingId left = readings.add(capture, SampleReadings.tone(0.36, 1), SampleReadings.series());

    assertThat(readings.add(capture, SampleReadings.tone(0.39, 2), SampleReadings.series()))
        .isEqualTo(right);
    assertThat(readings.newestOf(capture)).map(StoredReading::id).hasValue(left);
  }

  @Test
  void refusedChannelsAreThoseOfTheLatestMeasurement() {
    CaptureId capture = bench.capture("as received", "measured");
    Rejection silent = new Rejection("silent", "The channel holds no signal.");
    ReadingId left = readings.add(capture, SampleReadings.tone(0.37, 1), SampleReadings.series());
    readings.add(capture, SampleReadings.tone(0.39, 2), SampleReadings.series());
    channels.noteRefused(capture, Map.of(2, silent, 3, silent));

    assertThat(channels.of(capture))
        .extracting(
            ChannelStanding::channel,
            ChannelStanding::main,
            s -> s.reading() == null ? null : s.reading().id(),
            ChannelStanding::refusal)
        .containsExactly(
            tuple(1, true, left, null),
            tuple(2, false, null, silent),
            tuple(3, false, null, silent));

    channels.noteRefused(capture, Map.of());

    assertThat(channels.of(capture)).hasSize(2).noneMatch(s -> s.refusal() != null);
  }

  @Test
  void aChannelNeedsNoMeasuringOnlyForTheSameSettingsAndMethod() {
    CaptureId capture = bench.capture("as received", "measured");
    Reading second = SampleReadings.tone(0.39, 2);
    MeasureSettings settings = second.method().settings();
    readings.add(capture, second, SampleReadings.series());
    assertThat(channels.has(capture, settings)).as("made by another method").isFalse();

    Reading now =
        new Reading(
            second.source(),
            new Reading.Method(Measurement.METHOD_VERSION, settings),
            second.speed(),
            second.flutter(),
            second.lines(),
            null,
            second.signal(),
            second.warnings());
    readings.add(capture, now, SampleReadings.series());

    assertThat(channels.has(capture, settings)).isTrue();
    assertThat(channels.has(capture, settings.onChannel(1))).isFalse();
    assertThat(channels.has(capture, MeasureSettings.tone(3000).onChannel(2))).isFalse();
    channels.noteRefused(capture, Map.of(2, new Rejection("silent", "No signal.")));
    assertThat(channels.has(capture, settings)).as("refused since").isFalse();
  }
}
