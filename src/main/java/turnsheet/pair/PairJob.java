package turnsheet.pair;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.Captures;
import turnsheet.core.diagnose.Difference;
import turnsheet.core.diagnose.Run;
import turnsheet.core.diagnose.Runs;
import turnsheet.core.diagnose.pair.PairFindings;
import turnsheet.core.diagnose.pair.PairSide;
import turnsheet.core.diagnose.pair.SensorPair;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Progress;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Rejection;
import turnsheet.job.JobHandler;
import turnsheet.job.JobRun;
import turnsheet.reading.CapturePlace;
import turnsheet.reading.CapturePlaces;
import turnsheet.reading.Readings;
import turnsheet.reading.VisitReading;

/** Works out a comparison; the first result stays, whatever runs again. */
@Component
class PairJob implements JobHandler {

  private static final List<FigureName> COMPARED =
      List.of(
          FigureName.WEIGHTED_TWO_SIGMA,
          FigureName.WEIGHTED_RMS,
          FigureName.UNWEIGHTED_RMS,
          FigureName.CYCLE_TO_CYCLE);
  private static final String EDGE_NOISE = "edges.edgeNoiseMicroseconds";

  private final Captures captures;
  private final CaptureStore store;
  private final CapturePlaces places;
  private final Readings readings;
  private final Measurement measurement;
  private final PairStore pairs;

  PairJob(
      Captures captures,
      CaptureStore store,
      CapturePlaces places,
      Readings readings,
      Measurement measurement,
      PairStore pairs) {
    this.captures = captures;
    this.store = store;
    this.places = places;
    this.readings = readings;
    this.measurement = measurement;
    this.pairs = pairs;
  }

  @Override
  public String name() {
    return Pairs.JOB;
  }

  @Override
  public void run(JobRun run) throws IOException {
    StoredPair pair = pairs.find(run.subject()).orElse(null);
    if (pair == null || pair.sheet() != null) {
      return;
    }
    PairOrder order = pair.order();
    Outcome one = measured(order, order.original(), f -> run.progress(0.45 * f));
    Outcome other = measured(order, order.replacement(), f -> run.progress(0.45 + 0.45 * f));
    pairs.finish(pair.id(), sheet(order, one, other));
  }

  private PairSheet sheet(PairOrder order, Outcome one, Outcome other) {
    CapturePlace place = place(order.original().capture());
    PairFindings findings = null;
    List<PairSheet.Compared> compared = List.of();
    Rejection refusal = null;
    if (one instanceof Outcome.Refused refused) {
      refusal = of("The original sensor: ", refused.rejection());
    } else if (other instanceof Outcome.Refused refused) {
      refusal = of("The replacement sensor: ", refused.rejection());
    } else if (order.together()) {
      try {
        findings =
            SensorPair.together(
                PairSide.of((Outcome.Measured) one, order.original().teeth()),
                PairSide.of((Outcome.Measured) other, order.replacement().teeth()));
      } catch (RejectedException e) {
        refusal = e.rejection();
      }
    } else {
      compared = compared(order, (Outcome.Measured) one, (Outcome.Measured) other);
    }
    return new PairSheet(
        PairSheet.VERSION,
        Measurement.METHOD_VERSION,
        place.modelName() + " " + place.serialNumber(),
        place.settingLabel(),
        order,
        source(order.original(), one),
        source(order.replacement(), other),
        findings,
        compared,
        refusal);
  }

  private static Rejection of(String which, Rejection rejection) {
    return new Rejection(rejection.code(), which + rejection.message());
  }

  private PairSheet.Source source(PairOrder.Side side, Outcome outcome) {
    CapturePlace place = place(side.capture());
    Capture capture = capture(side);
    Double rate =
        outcome instanceof Outcome.Measured measured
            ? measured.reading().speed().meanHz().value()
            : null;
    double pulses = rate == null ? 0 : rate;
    return new PairSheet.Source(
        place.fileName(),
        capture.bytes().sha256(),
        place.condition(),
        pulses / side.teeth(),
        pulses);
  }

  private CapturePlace place(UUID capture) {
    return places.find(new CaptureId(capture)).orElseThrow();
  }

  private Capture capture(PairOrder.Side side) {
    return captures.find(new CaptureId(side.capture())).orElseThrow();
  }

  private Outcome measured(PairOrder order, PairOrder.Side side, Progress progress)
      throws IOException {
    Capture capture = capture(side);
    CaptureChoices choices = capture.choices();
    if (choices == null || !store.holds(capture.bytes())) {
      return new Outcome.Refused(
          new Rejection("fileMissing", "Its recording is no longer here: upload it again."));
    }
    CaptureChoices chosen = choices.onChannel(side.channel());
    return measurement.measure(
        store.open(capture.bytes()),
        capture.bytes().sha256(),
        chosen.options(),
        withTeeth(chosen.settings(), side.teeth(), confirmedTeeth(order, side, choices)),
        progress);
  }

  /** The pulses per turn that the confirmed pulse rate belongs to. */
  private static int confirmedTeeth(PairOrder order, PairOrder.Side side, CaptureChoices choices) {
    Integer said = choices.settings().teeth();
    if (said != null) {
      return said;
    }
    boolean ofReplacement =
        order.together() && order.replacement().channel() == choices.settings().channel();
    if (order.together()) {
      return ofReplacement ? order.replacement().teeth() : order.original().teeth();
    }
    return side.teeth();
  }

  private static MeasureSettings withTeeth(MeasureSettings settings, int teeth, int confirmed) {
    return new MeasureSettings(
        settings.kind(),
        settings.channel(),
        settings.nominalHz() * teeth / confirmed,
        settings.searchPercent(),
        teeth,
        settings.clockStandardUncertaintyPpm(),
        settings.clockErrorPpm(),
        settings.mediumStandardUncertaintyPercent());
  }

  /** Every recording of the same condition counts, so that the machine's own variation is known. */
  private List<PairSheet.Compared> compared(
      PairOrder order, Outcome.Measured one, Outcome.Measured other) {
    List<PairSheet.Compared> rows = new ArrayList<>();
    // of one condition nothing but the file tells the two sensors apart
    boolean apart =
        !place(order.original().capture())
            .condition()
            .equals(place(order.replacement().capture()).condition());
    List<Reading> before = apart ? likeIt(order.original(), one.reading()) : List.of(one.reading());
    List<Reading> after =
        apart ? likeIt(order.replacement(), other.reading()) : List.of(other.reading());
    rows.add(row(EDGE_NOISE, "µs", null, before, after));
    for (FigureName name : COMPARED) {
      rows.add(row(name.path(), name.unit(), name, before, after));
    }
    return rows;
  }

  private List<Reading> likeIt(PairOrder.Side side, Reading own) {
    CapturePlace place = place(side.capture());
    List<Reading> like = new ArrayList<>();
    like.add(own);
    for (VisitReading v : readings.ofVisit(place.visitId())) {
      Reading reading = v.stored().reading();
      if (!v.stored().captureId().value().equals(side.capture())
          && v.settingId().equals(place.settingId())
          && v.condition().equals(place.condition())
          && v.leftOut() == null
          && reading.source().kind() == own.source().kind()
          && sameRate(reading, own)) {
        like.add(reading);
      }
    }
    return like;
  }

  private static boolean sameRate(Reading one, Reading other) {
    return Math.abs(one.speed().nominalHz() / other.speed().nominalHz() - 1) < 1e-3;
  }

  private static PairSheet.Compared row(
      String path, String unit, @Nullable FigureName name, List<Reading> one, List<Reading> other) {
    Runs before = runs(name, one);
    Runs after = runs(name, other);
    return new PairSheet.Compared(
        path,
        unit,
        before.figure(),
        after.figure(),
        Difference.of(before, after, 0),
        before.count(),
        after.count());
  }

  private static Runs runs(@Nullable FigureName name, List<Reading> readings) {
    return new Runs(
        readings.stream()
            .map(
                reading ->
                    Run.of(
                        name == null ? FigureName.CYCLE_TO_CYCLE : name,
                        name == null ? edgeNoise(reading) : name.of(reading),
                        null,
                        Set.of()))
            .toList());
  }

  private static Figure edgeNoise(Reading reading) {
    Reading.Edges edges = reading.edges();
    return edges == null ? Figure.absent("a tone has no edges") : edges.edgeNoiseMicroseconds();
  }
}
