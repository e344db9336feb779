package turnsheet.capture;

import static java.util.Objects.requireNonNull;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.LocalDate;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import turnsheet.core.format.TestFormats;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.signal.Rejection;
import turnsheet.job.IdleJobs;
import turnsheet.job.Jobs;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.Customers;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.Media;
import turnsheet.shop.MediumId;
import turnsheet.shop.ReferenceMedium;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.SpeedUnit;
import turnsheet.shop.Unit;
import turnsheet.shop.Units;
import turnsheet.shop.VisitId;
import turnsheet.shop.Visits;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

@OnEachDatabase
class IntakeTest {

  @TempDir Path data;
  private final Database database;
  private final Clock clock = Clock.systemUTC();
  private final Visits visits;
  private final Instruments instruments;
  private final Media media;
  private final MachineModels models;
  private final Captures captures;
  private final Jobs jobs;
  private final CaptureKey key;
  private final Set<Integer> measuredChannels = new HashSet<>();
  private Intake intake;
  private Corrections corrections;

  IntakeTest(Database database) {
    database.empty();
    this.database = database;
    models = new MachineModels(database.jdbc(), database.transactions());
    visits = new Visits(database.jdbc(), database.transactions(), clock);
    instruments = new Instruments(database.jdbc());
    media = new Media(database.jdbc());
    captures = new Captures(database.jdbc());
    jobs = IdleJobs.on(database);
    SpeedSetting setting =
        new SpeedSetting(SpeedSettingId.next(), "9.5", SpeedUnit.CM_PER_S, 9.525, 3150.0, 400.0);
    MachineModel model =
        models.add(MachineModel.named("Invented deck", 120, "").withSetting(setting));
    var customer = new Customers(database.jdbc(), clock).add("An invented customer", "");
    var unit =
        new Units(database.jdbc(), database.transactions(), clock)
            .add(model.id(), customer.id(), "1001", "");
    key =
        new CaptureKey(
            visits.open(unit.id(), "").id(), setting.id(), CaptureKey.AS_RECEIVED, null, null);
  }

  @BeforeEach
  void start() throws IOException {
    CaptureStore store = new CaptureStore(data, new IncomingFolder(data, clock));
    Looker looker = new Looker(store, TestFormats.formats());
    Shelf shelf = new Shelf(visits, models, instruments, media);
    corrections = new Corrections(captures, looker, shelf);
    intake =
        new Intake(
            store,
            captures,
            looker,
            new SettingFinder(store, TestFormats.formats()),
            shelf,
            (capture, settings) -> measuredChannels.contains(settings.channel()),
            jobs,
            database.transactions(),
            clock);
  }

  @Test
  void aTestTapeImpliesThatTheToneWasOnlyReplayed() throws IOException {
    ReferenceMedium tape =
        media.add(new ReferenceMedium(MediumId.next(), "A tape", 3150.0, 0.1, null, ""));
    CaptureKey played = new CaptureKey(key.visit(), key.setting(), "as received", null, tape.id());
    Capture capture = intake.receive(played, "a.wav", "bench", bytes("tone"));
    assertThat(capture.key().toneMethod()).isEqualTo(ToneMethod.REPLAY);
    assertThat(captures.find(capture.id())).contains(capture);
    assertThat(corrections.nameMethod(capture.id(), null).key().toneMethod()).isNull();
    assertThat(receive("tone").key().toneMethod()).isNull();
  }

  @Test
  void aModelThatChangesWhileTheFileIsOnItsWayIsNoticed() {
    Units units = new Units(database.jdbc(), database.transactions(), clock);
    Unit unit = units.find(visits.find(key.visit()).orElseThrow().unitId()).orElseThrow();
    MachineModel other = models.add(MachineModel.named("Another deck", 120, ""));
    InputStream file = bytes("tone");
    InputStream slow =
        new InputStream() {
          @Override
          public int read() throws IOException {
            return file.read();
          }

          @Override
          public int read(byte[] into, int from, int length) throws IOException {
            units.change(unit.id(), other.id(), unit.customerId(), "1001", "");
            return file.read(into, from, length);
          }
        };

    assertThatThrownBy(() -> intake.receive(key, "a.wav", "bench", slow))
        .isInstanceOfSatisfying(
            RefusedRequestException.class, e -> assertThat(e.code()).isEqualTo("foreignSetting"));
    assertThat(captures.ofVisit(key.visit())).isEmpty();
  }

  @Test
  void recognisesAToneAndWaits() throws IOException {
    Capture capture = receive("tone");
    assertThat(capture.state()).isEqualTo(CaptureState.RECOGNISED);
    assertThat(capture.refusal()).isNull();
    Looked looked = requireNonNull(capture.looked());
    assertThat(looked.recognised().channels()).hasSize(2);
    assertThat(requireNonNull(looked.guess()).kind()).isEqualTo(CaptureKind.TONE);
    assertThat(captures.find(capture.id())).contains(capture);
    assertThat(captures.ofVisit(key.visit())).containsExactly(capture);
    assertThat(captures.in(List.of(CaptureState.RECOGNISED), 5)).containsExactly(capture);
    assertThat(captures.in(List.of(CaptureState.QUEUED), 5)).isEmpty();
  }

  @Test
  void aMeasuredChannelStandsForTheCaptureWithoutAJob() throws IOException {
    CaptureId id = receive("tone").id();
    intake.confirm(id, onChannel(1));
    captures.measured(id);
    measuredChannels.add(2);

    Capture chosen = intake.confirm(id, onChannel(2));

    assertThat(chosen.state()).isEqualTo(CaptureState.MEASURED);
    assertThat(requireNonNull(chosen.choices()).settings().channel()).isEqualTo(2);
    assertThat(requireNonNull(chosen.looked()).recognised().channel()).isEqualTo(2);
    assertThat(mainChannel(id)).isEqualTo(2);
    assertThat(jobs.ofSubject(id.value())).hasSize(1);
  }

  @Test
  void whatIsNotTheChannelAloneIsMeasuredAgain() throws IOException {
    CaptureId id = receive("tone").id();
    intake.confirm(id, onChannel(1));
    captures.measured(id);
    measuredChannels.addAll(List.of(1, 2));

    assertThat(intake.confirm(id, onChannel(1)).state())
        .as("measure again")
        .isEqualTo(CaptureState.QUEUED);
    captures.measured(id);
    Wish finer = new Wish(null, null, 5.0, null, ReadOptions.none().withChannel(2));
    assertThat(intake.confirm(id, finer).state())
        .as("another search range")
        .isEqualTo(CaptureState.QUEUED);
    captures.measured(id);
    measuredChannels.remove(1);
    Wish first = new Wish(null, null, 5.0, null, ReadOptions.none().withChannel(1));
    assertThat(intake.confirm(id, first).state())
        .as("a channel without a reading")
        .isEqualTo(CaptureState.QUEUED);
    assertThat(mainChannel(id)).isEqualTo(1);
  }

  @Test
  void aCaptureMeasuredOnAnotherChannelSaysWhy() throws IOException {
    CaptureId id = receive("tone").id();
    Capture queued = intake.confirm(id, onChannel(1));
    Looked looked = requireNonNull(queued.looked()).onChannel(2, "the first is silent");
    CaptureChoices choices = requireNonNull(queued.choices()).onChannel(2);

    assertThat(captures.measuredOn(id, looked, choices)).isTrue();
    assertThat(captures.measuredOn(id, looked, choices)).as("waits no more").isFalse();

    Capture measured = captures.find(id).orElseThrow();
    assertThat(measured.looked()).isEqualTo(looked);
    assertThat(measured.choices()).isEqualTo(choices);
    assertThat(mainChannel(id)).isEqualTo(2);
  }

  private static Wish onChannel(int channel) {
    return new Wish(null, null, null, null, ReadOptions.none().withChannel(channel));
  }

  private int mainChannel(CaptureId id) {
    return database
        .jdbc()
        .sql("select main_channel from capture where id = ?")
        .param(id.value())
        .query(Integer.class)
        .single();
  }

  @Test
  void keepsTheBytesOfARefusedFile() throws IOException {
    Capture capture = receive("no format at all");
    assertThat(capture.state()).isEqualTo(CaptureState.REFUSED);
    assertThat(code(capture)).isEqualTo("unknownFormat");
    assertThat(storedFiles()).hasSize(1);
    assertThat(captures.find(capture.id())).contains(capture);
  }

  @Test
  void refusesAnEmptyFileWithItsSentence() throws IOException {
    assertThat(code(receive(""))).isEqualTo("empty");
  }

  @Test
  void refusesWhatBreaksInItsFirstSeconds() throws IOException {
    assertThat(code(receive("torn"))).isEqualTo("torn");
  }

  @Test
  void survivesAFaultOfAReader() throws IOException {
    Capture capture = receive("bug");
    assertThat(code(capture)).isEqualTo("readerFailed");
    assertThat(String.valueOf(capture.refusal())).doesNotContain("planted");
  }

  @Test
  void storesNothingOfAnAbortedUpload() {
    assertThatThrownBy(() -> intake.receive(key, "a.wav", "bench", new BrokenStream()))
        .isInstanceOf(BrokenUploadException.class);
    assertThat(captures.ofVisit(key.visit())).isEmpty();
    assertThat(storedFiles()).isEmpty();
  }

  @Test
  void refusesAClosedVisitAnUnknownOneAForeignSettingAndAnOddName() {
    assertRefused("fileName", key, "../a.wav");
    assertRefused("fileName", key, "a\\b.wav");
    assertRefused("fileName", key, " ");
    assertRefused("fileName", key, "a\nb");
    CaptureKey foreign =
        new CaptureKey(key.visit(), SpeedSettingId.next(), "as received", null, null);
    assertRefused("foreignSetting", foreign, "a.wav");
    CaptureKey unknown = new CaptureKey(VisitId.next(), key.setting(), "as received", null, null);
    assertThatThrownBy(() -> intake.receive(unknown, "a.wav", "bench", bytes("tone")))
        .isInstanceOf(NotFoundException.class);
    visits.close(key.visit());
    assertRefused("visitClosed", key, "a.wav");
    assertThat(storedFiles()).isEmpty();
  }

  @Test
  void ordersTheMeasurementWithWhatIsProposed() throws IOException {
    Capture queued = intake.confirm(receive("tone").id(), Wish.none());
    assertThat(queued.state()).isEqualTo(CaptureState.QUEUED);
    assertThat(settings(queued)).isEqualTo(MeasureSettings.tone(3150));
    assertThat(jobs.ofSubject(queued.id().value())).hasSize(1);
    assertThat(jobs.ofSubject(queued.id().value()).get(0).id()).isEqualTo(queued.job());
  }

  @Test
  void foldsInTheClockOfTheInstrumentAndTheToleranceOfTheMedium() throws IOException {
    var card =
        instruments.add(
            new BenchInstrument(
                InstrumentId.next(), "card", 12.5, 4.0, LocalDate.of(2026, 1, 2), ""));
    var tape = media.add(new ReferenceMedium(MediumId.next(), "tape", 3000.0, 0.3, null, ""));
    CaptureKey both =
        new CaptureKey(key.visit(), key.setting(), "as received", card.id(), tape.id());
    Capture tone = intake.receive(both, "a.wav", "bench", bytes("tone"));
    MeasureSettings settings = settings(intake.confirm(tone.id(), Wish.none()));
    assertThat(settings.nominalHz()).isEqualTo(3000);
    assertThat(settings.clockErrorPpm()).isEqualTo(12.5);
    // expanded uncertainty 4 at k = 2; rectangular half width 0.3 (JCGM 100:2008, 4.3.7)
    assertThat(settings.clockStandardUncertaintyPpm()).isEqualTo(2);
    assertThat(settings.mediumStandardUncertaintyPercent()).isEqualTo(0.3 / Math.sqrt(3));

    Capture edges = intake.receive(both, "a.txt", "bench", bytes("edges"));
    MeasureSettings ofEdges = settings(intake.confirm(edges.id(), Wish.none()));
    assertThat(ofEdges.kind()).isEqualTo(CaptureKind.EDGES);
    assertThat(ofEdges.nominalHz()).isEqualTo(400);
    assertThat(ofEdges.teeth()).isEqualTo(120);
    assertThat(ofEdges.mediumStandardUncertaintyPercent()).isZero();
  }

  @Test
  void takesTheWishInPlaceOfTheProposal() throws IOException {
    Wish wish =
        new Wish(CaptureKind.TACHOMETER, 1600.0, 20.0, 60, ReadOptions.none().withChannel(2));
    Capture queued = intake.confirm(receive("tone").id(), wish);
    MeasureSettings settings = settings(queued);
    assertThat(settings.kind()).isEqualTo(CaptureKind.TACHOMETER);
    assertThat(settings.channel()).isEqualTo(2);
    assertThat(settings.nominalHz()).isEqualTo(1600);
    assertThat(settings.searchPercent()).isEqualTo(20);
    assertThat(settings.teeth()).isEqualTo(60);
  }

  @Test
  void refusesAWishThatDoesNotFitAndOrdersNothing() throws IOException {
    CaptureId tone = receive("tone").id();
    assertWishRefused("kindDoesNotFit", tone, wish(CaptureKind.EDGES, null, null, null));
    assertWishRefused("nominalTooHigh", tone, wish(CaptureKind.TONE, 24000.0, null, null));
    assertWishRefused("nominal", tone, wish(CaptureKind.TONE, -1.0, null, null));
    assertWishRefused("searchRange", tone, wish(CaptureKind.TONE, null, 51.0, null));
    assertWishRefused("teeth", tone, wish(CaptureKind.TACHOMETER, null, null, 0));
    assertThat(captures.find(tone).orElseThrow().state()).isEqualTo(CaptureState.RECOGNISED);
    assertThat(jobs.ofSubject(tone.value())).isEmpty();
  }

  @Test
  void aWishThatMakesTheFileUnusableRefusesTheCapture() throws IOException {
    CaptureId tone = receive("tone").id();
    Capture refused =
        intake.confirm(tone, new Wish(null, null, null, null, ReadOptions.none().withChannel(3)));
    assertThat(refused.state()).isEqualTo(CaptureState.REFUSED);
    assertThat(code(refused)).isEqualTo("noSuchChannel");
    assertThat(intake.confirm(tone, Wish.none()).state()).isEqualTo(CaptureState.QUEUED);
  }

  @Test
  void anotherLookCanHelpARefusedFile() throws IOException {
    CaptureId unclear = receive("unclear").id();
    ReadOptions said = new ReadOptions(null, Contents.EDGE_TIMES, null, null);
    Capture seen = intake.lookAgain(unclear, said);
    assertThat(seen.state()).isEqualTo(CaptureState.RECOGNISED);
    assertThat(seen.refusal()).isNull();
    assertThat(code(intake.lookAgain(unclear, ReadOptions.none()))).isEqualTo("unclear");
  }

  @Test
  void measuresOnlyOnceAtATime() throws IOException {
    CaptureId id = receive("tone").id();
    intake.confirm(id, Wish.none());
    assertWishRefused("busy", id, Wish.none());
    assertThat(jobs.ofSubject(id.value())).hasSize(1);
    assertThatThrownBy(() -> intake.lookAgain(id, ReadOptions.none()))
        .isInstanceOf(RefusedRequestException.class);
  }

  @Test
  void stepsOnlyWhereAStepIsAllowed() throws IOException {
    CaptureId id = receive("tone").id();
    assertThat(captures.measured(id)).isFalse();
    assertThat(captures.failed(id, "x")).isFalse();
    assertThat(captures.refused(id, new Rejection("noTone", "There is no tone."))).isFalse();
    intake.confirm(id, Wish.none());
    assertThat(captures.refused(id, new Rejection("noTone", "There is no tone."))).isTrue();
    assertThat(captures.measured(id)).isFalse();
    assertThat(code(captures.find(id).orElseThrow())).isEqualTo("noTone");
    intake.confirm(id, Wish.none());
    assertThat(captures.failed(id, "It failed.")).isTrue();
    assertThat(captures.find(id).orElseThrow().state()).isEqualTo(CaptureState.FAILED);
    intake.confirm(id, Wish.none());
    assertThat(captures.measured(id)).isTrue();
    Capture measured = captures.find(id).orElseThrow();
    assertThat(measured.state()).isEqualTo(CaptureState.MEASURED);
    assertThat(measured.refusal()).isNull();
    assertThat(jobs.ofSubject(id.value())).hasSize(3);
  }

  @Test
  void aLostRaceTakesItsJobBack() throws IOException {
    CaptureId id = receive("tone").id();
    Capture before = captures.find(id).orElseThrow();
    Looked looked = requireNonNull(before.looked());
    intake.confirm(id, Wish.none());
    CaptureChoices choices = requireNonNull(captures.find(id).orElseThrow().choices());
    boolean second =
        Boolean.TRUE.equals(
            database
                .transactions()
                .execute(
                    status ->
                        captures.queue(
                                id, looked, choices, jobs.enqueue(Intake.MEASURE, id.value()))
                            || rolledBack(status)));
    assertThat(second).isFalse();
    assertThat(jobs.ofSubject(id.value())).hasSize(1);
  }

  private static boolean rolledBack(org.springframework.transaction.TransactionStatus status) {
    status.setRollbackOnly();
    return false;
  }

  private Capture receive(String content) throws IOException {
    return intake.receive(key, "a file.wav", "bench", bytes(content));
  }

  private void assertRefused(String code, CaptureKey under, String name) {
    assertThatThrownBy(() -> intake.receive(under, name, "bench", bytes("tone")))
        .isInstanceOfSatisfying(
            RefusedRequestException.class, e -> assertThat(e.code()).isEqualTo(code));
  }

  private void assertWishRefused(String code, CaptureId id, Wish wish) {
    assertThatThrownBy(() -> intake.confirm(id, wish))
        .isInstanceOfSatisfying(
            RefusedRequestException.class, e -> assertThat(e.code()).isEqualTo(code));
  }

  private static Wish wish(
      CaptureKind kind,
      @Nullable Double nominal,
      @Nullable Double search,
      @Nullable Integer teeth) {
    return new Wish(kind, nominal, search, teeth, ReadOptions.none());
  }

  private static String code(Capture capture) {
    return requireNonNull(capture.refusal()).code();
  }

  private static MeasureSettings settings(Capture capture) {
    return requireNonNull(capture.choices()).settings();
  }

  private static InputStream bytes(String text) {
    return new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8));
  }

  private List<Path> storedFiles() {
    try (Stream<Path> all = Files.walk(data)) {
      return all.filter(Files::isRegularFile).toList();
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }
}
