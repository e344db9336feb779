package turnsheet.core.synth;

import java.util.Arrays;
import java.util.Random;
import java.util.Set;

/** A sensor wheel with uneven, missing and split teeth on a shaft of known speed. Immutable. */
public final class WheelSynth {

  private static final double SPLIT_AFTER = 0.4;

  /** So that a pulse has fallen to a thousandth before the next one rises. */
  private static final double FLANK = 0.06;

  private final double[] latePeriods;
  private final Set<Integer> missing;
  private final Set<Integer> split;
  private final int first;

  /**
   * A wheel.
   *
   * @param latePeriods for every place how far its edge lies behind its even place, in periods
   * @param missing places without a tooth, from 0
   * @param split places whose edge is followed by one too many 0.4 periods later
   * @param first place that passes the sensor at time zero
   */
  private WheelSynth(double[] latePeriods, Set<Integer> missing, Set<Integer> split, int first) {
    this.latePeriods = latePeriods.clone();
    this.missing = Set.copyOf(missing);
    this.split = Set.copyOf(split);
    this.first = first;
  }

  /** For every place how far its edge lies behind its even place, in periods. */
  public double[] latePeriods() {
    return latePeriods.clone();
  }

  /** A wheel with evenly spaced teeth. */
  public static WheelSynth even(int places) {
    return new WheelSynth(new double[places], Set.of(), Set.of(), 0);
  }

  /** Teeth that lie anywhere about their places, normally distributed. */
  public static WheelSynth uneven(int places, double deviationPeriods, long seed) {
    double[] late = new double[places];
    Random random = new Random(seed);
    for (int j = 0; j < places; j++) {
      late[j] = deviationPeriods * random.nextGaussian();
    }
    return new WheelSynth(late, Set.of(), Set.of(), 0);
  }

  /** The same, off its middle as well: late by a sine once a turn. */
  public WheelSynth eccentric(double peakPeriods, double phaseRadians) {
    double[] late = latePeriods.clone();
    for (int j = 0; j < late.length; j++) {
      late[j] += peakPeriods * Math.sin(2 * Math.PI * j / late.length + phaseRadians);
    }
    return new WheelSynth(late, missing, split, first);
  }

  /** The same with one tooth moved further back. */
  public WheelSynth late(int place, double periods) {
    double[] late = latePeriods.clone();
    late[place] += periods;
    return new WheelSynth(late, missing, split, first);
  }

  /** The same without these teeth. */
  public WheelSynth without(Integer... places) {
    return new WheelSynth(latePeriods, Set.of(places), split, first);
  }

  /** The same with these teeth split. */
  public WheelSynth withSplit(Integer... places) {
    return new WheelSynth(latePeriods, missing, Set.of(places), first);
  }

  /** The same, with another place at the sensor at time zero. */
  public WheelSynth startingAt(int place) {
    return new WheelSynth(latePeriods, missing, split, place);
  }

  /**
   * Times of the rising edges.
   *
   * @param pulsesPerSecond places that pass in a second at nominal speed
   * @param jitterSeconds standard deviation of Gaussian noise on each edge
   * @param stepSeconds of the clock that stamps them; 0 for none
   */
  public double[] risingEdges(
      SpeedFunction speed,
      double pulsesPerSecond,
      double durationSeconds,
      double jitterSeconds,
      double stepSeconds,
      long seed) {
    int count = (int) Math.floor(speed.travelled(durationSeconds) * pulsesPerSecond) - 1;
    double[] times = new double[2 * count];
    Random random = new Random(seed);
    int n = 0;
    for (int k = 1; k < count; k++) {
      int place = (k + first) % latePeriods.length;
      if (missing.contains(place)) {
        continue;
      }
      double at = k + latePeriods[place];
      for (double turned : split.contains(place) ? new double[] {at, at + SPLIT_AFTER} : one(at)) {
        double seconds = speed.timeOf(turned / pulsesPerSecond);
        if (jitterSeconds > 0) {
          seconds += jitterSeconds * random.nextGaussian();
        }
        times[n++] = stepSeconds > 0 ? Math.rint(seconds / stepSeconds) * stepSeconds : seconds;
      }
    }
    return Arrays.copyOf(times, n);
  }

  private static double[] one(double at) {
    return new double[] {at};
  }

  /** Root mean square of the spacing of the teeth about their own mean, in periods. */
  public double rmsPeriods() {
    double sum = 0;
    double squares = 0;
    int teeth = 0;
    for (int j = 0; j < latePeriods.length; j++) {
      if (!missing.contains(j)) {
        sum += latePeriods[j];
        squares += latePeriods[j] * latePeriods[j];
        teeth++;
      }
    }
    double mean = sum / teeth;
    return Math.sqrt(squares / teeth - mean * mean);
  }

  /**
   * The waveform of a sensor that gives such edges: pulses of half a period that rise through zero
   * at each of them, with rounded flanks.
   *
   * @param rises times of the edges, in order
   * @param periodSeconds typical
   * @param noiseRms standard deviation of added white Gaussian noise, 1 is full scale
   */
  public static double[] waveform(
      double[] rises,
      double periodSeconds,
      double sampleRateHertz,
      double durationSeconds,
      double amplitude,
      double noiseRms,
      long seed) {
    double[] samples = new double[(int) Math.round(durationSeconds * sampleRateHertz)];
    Arrays.fill(samples, -amplitude);
    double flank = FLANK * periodSeconds;
    for (double rise : rises) {
      int from = (int) Math.max(0, (rise - periodSeconds / 2) * sampleRateHertz);
      int to = (int) Math.min(samples.length, (rise + periodSeconds) * sampleRateHertz);
      for (int i = from; i < to; i++) {
        double t = i / sampleRateHertz - rise;
        samples[i] +=
            amplitude * (Math.tanh(t / flank) - Math.tanh((t - periodSeconds / 2) / flank));
      }
    }
    Random random = new Random(seed);
    for (int i = 0; i < samples.length; i++) {
      samples[i] += noiseRms * random.nextGaussian();
    }
    return samples;
  }
}
