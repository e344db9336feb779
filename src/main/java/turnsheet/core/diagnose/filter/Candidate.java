package turnsheet.core.diagnose.filter;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Progress;
import turnsheet.core.signal.RejectedException;

/** Tries one candidate. One use; what it is given is only read. */
final class Candidate {

  private final Recorded recorded;
  private final TrialPlan plan;
  private final @Nullable FilterDesign design;
  private final DiscreteFilter response;
  private final List<Other> others;
  private final MeanWave wave;
  private final MeanWave.Shape shape;

  /**
   * Another speed.
   *
   * @param gain of the sensor there
   */
  record Other(double hertz, double gain, double seconds, SampleSource played) {}

  Candidate(Recorded recorded, TrialPlan plan, @Nullable FilterDesign design, List<Other> others) {
    this.recorded = recorded;
    this.plan = plan;
    this.design = design;
    this.others = others;
    this.response = filter();
    this.wave = recorded.wave().behind(response);
    this.shape = wave.shape();
  }

  private DiscreteFilter filter() {
    DiscreteFilter filter =
        design == null
            ? DiscreteFilter.none(recorded.rateHertz())
            : design.at(recorded.rateHertz());
    filter.settleAt(recorded.wave().mean());
    return filter;
  }

  TrialResult.Row row(SampleSource source, Progress progress)
      throws IOException, RejectedException {
    double tooth = recorded.wave().toothHz();
    List<TrialResult.Hum> hum = new ArrayList<>();
    for (NoiseSpectrum.Line line : recorded.noise().hum()) {
      double left = line.peak() * response.response(line.hertz()).magnitude();
      hum.add(new TrialResult.Hum(line.hertz(), 20 * Math.log10(left / wave.peak())));
    }
    return new TrialResult.Row(
        design,
        response.gainDb(tooth),
        hum,
        1e6 * response.groupDelaySeconds(tooth),
        edges(source, false, part -> progress.reached(part / 2)),
        edges(source, true, part -> progress.reached((1 + part) / 2)));
  }

  private TrialResult.Edges edges(SampleSource source, boolean compared, Progress progress)
      throws IOException, RejectedException {
    Threshold threshold = compared ? comparator() : Threshold.middle(shape.low(), shape.high());
    double period = recorded.pulses().meanPeriodSeconds();
    double from = Math.max(response.settleSeconds(), recorded.pulses().first());
    Pulses found;
    try (FilteredReader reader =
        new FilteredReader(source.open(), filter(), Recorded.LONGEST_SECONDS, progress)) {
      found = Pulses.of(reader, threshold, period, from, false);
    }
    Pulses own = recorded.pulses();
    long lost =
        found.none()
            ? expected(from)
            : Math.max(0, found.missing() - ownMissing(from))
                + ends(found, from, own.last(), period);
    double square = shape.squareSecondsPerUnit(threshold);
    Double noise = Double.isNaN(found.noiseSeconds()) ? null : 1e6 * found.noiseSeconds();
    return new TrialResult.Edges(
        found.counted(),
        lost,
        found.extra(),
        noise,
        noise == null ? null : Double.valueOf(noise / (1e4 * period)),
        microseconds(square * recorded.noise().edgeVariance(response, period)),
        microseconds(square * humVariance()),
        speed(others.get(0), compared),
        speed(others.get(1), compared));
  }

  /** What the comparator is built with does not change with the speed. */
  private Threshold comparator() {
    double swing = recorded.wave().shape().high() - recorded.wave().shape().low();
    // behind a capacitor the signal lies about nothing; without one the bench sets the middle
    boolean coupled = design != null && design.lowHz() != null;
    double middle = coupled ? 0 : (shape.low() + shape.high()) / 2;
    return Threshold.comparator(
        middle + plan.offsetPercent() / 100 * swing, plan.hysteresisPercent() / 100 * swing);
  }

  private static @Nullable Double microseconds(double squareSeconds) {
    return Double.isNaN(squareSeconds) ? null : Double.valueOf(1e6 * Math.sqrt(squareSeconds));
  }

  private double humVariance() {
    double sum = 0;
    for (NoiseSpectrum.Line line : recorded.noise().hum()) {
      double left = line.peak() * response.response(line.hertz()).magnitude();
      sum += left * left / 2;
    }
    return sum;
  }

  /** Pulses of the recording after a time. */
  private long expected(double fromSeconds) {
    long count = 0;
    for (double time : recorded.pulses().times()) {
      count += time >= fromSeconds ? 1 : 0;
    }
    return count;
  }

  /** Gaps that the recording itself has, such as a reference mark, are no loss. */
  private long ownMissing(double fromSeconds) {
    Pulses own = recorded.pulses();
    long count = 0;
    for (int i = 0; i < own.times().length; i++) {
      count += own.times()[i] >= fromSeconds && !own.real()[i] ? 1 : 0;
    }
    return count;
  }

  /** Whole periods without an edge at either end; one may go by before the first edge is due. */
  private static long ends(Pulses found, double from, double to, double period) {
    long before = (long) Math.max(0, Math.floor((found.first() - from) / period - 0.5));
    long after = (long) Math.max(0, Math.floor((to - found.last()) / period - 0.5));
    return before + after;
  }

  private TrialResult.Speed speed(Other other, boolean compared)
      throws IOException, RejectedException {
    double period = 1 / other.hertz();
    DiscreteFilter filter = filter();
    double from = filter.settleSeconds();
    MeanWave there =
        recorded
            .wave()
            .at(other.hertz(), other.gain(), 0.45 * recorded.rateHertz())
            .behind(response);
    MeanWave.Shape shapeThere = there.shape();
    Threshold threshold =
        compared ? comparator() : Threshold.middle(shapeThere.low(), shapeThere.high());
    double seconds = other.seconds();
    Pulses found;
    try (FilteredReader reader =
        new FilteredReader(other.played().open(), filter, seconds, part -> {})) {
      found = Pulses.of(reader, threshold, period, from, false);
    }
    long pulses = (long) Math.floor((seconds - from) * other.hertz());
    return new TrialResult.Speed(
        other.hertz(),
        20 * Math.log10(there.peak() / recorded.wave().peak()),
        response.gainDb(other.hertz()),
        pulses,
        found.none() ? pulses : found.missing() + ends(found, from, seconds, period),
        found.extra());
  }
}
