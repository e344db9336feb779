package turnsheet.core.diagnose.filter;

import java.io.IOException;
import java.util.Arrays;
import java.util.Locale;
import turnsheet.core.measure.Progress;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.stats.Quantiles;

/**
 * What a recording tells before any candidate is tried: its pulses, their mean shape, and what lies
 * beside them.
 *
 * @param seconds used
 * @param pulses found behind a wide band-pass about the pulse rate, which takes hum away and makes
 *     all of them equally late
 */
record Recorded(
    double rateHertz, double seconds, Pulses pulses, MeanWave wave, NoiseSpectrum noise) {

  /** More of a recording than this is not used. */
  static final double LONGEST_SECONDS = 60;

  /** Passes over the recording that are made here. */
  static final int PASSES = 3;

  private static final double BEGINNING_SECONDS = 5;
  private static final double LEVEL_SHARE = 0.005;
  private static final double SEARCH_SHARE = 0.12;
  private static final int FEWEST = 20;

  static Recorded of(SampleSource source, double nominalHertz, Progress progress)
      throws IOException, RejectedException {
    double rate;
    Threshold middle;
    try (FilteredReader reader = band(source, nominalHertz, BEGINNING_SECONDS, Progress.NONE)) {
      rate = reader.sampleRateHertz();
      middle = levels(reader, settleSeconds(nominalHertz, rate));
    }
    Pulses pulses;
    double seconds;
    try (FilteredReader reader =
        band(source, nominalHertz, LONGEST_SECONDS, part -> progress.reached(part / 2))) {
      pulses = Pulses.of(reader, middle, 1 / nominalHertz, settleSeconds(nominalHertz, rate), true);
      seconds = reader.count() / rate;
    }
    require(pulses, nominalHertz);
    MeanWave.Builder wave = new MeanWave.Builder(pulses, rate);
    NoiseSpectrum.Builder noise = new NoiseSpectrum.Builder(rate);
    try (FilteredReader reader =
        new FilteredReader(
            source.open(),
            DiscreteFilter.none(rate),
            LONGEST_SECONDS,
            part -> progress.reached((1 + part) / 2))) {
      double[] block = new double[8192];
      int count;
      while ((count = reader.read(block)) > 0) {
        wave.add(block, count);
        noise.add(block, count);
      }
    }
    if (!noise.ready()) {
      throw new RejectedException(
          "tooShort", "The recording is shorter than two seconds: record at least 10 s.");
    }
    double tooth = 1 / pulses.meanPeriodSeconds();
    return new Recorded(rate, seconds, pulses, wave.build(), noise.build(tooth));
  }

  private static FilteredReader band(
      SampleSource source, double nominalHertz, double limitSeconds, Progress progress)
      throws IOException, RejectedException {
    SampleReader samples = source.open();
    double rate = samples.sampleRateHertz();
    if (!(nominalHertz < 0.2 * rate)) {
      samples.close();
      throw new RejectedException(
          "tooSlow",
          String.format(
              Locale.ROOT,
              "%.6g samples per second are too few to try filters on %.5g pulses per second: record"
                  + " at five times the pulse rate or more.",
              rate,
              nominalHertz));
    }
    return new FilteredReader(samples, wide(nominalHertz, rate), limitSeconds, progress);
  }

  private static DiscreteFilter wide(double nominalHertz, double rate) {
    return FilterDesign.bandPass(
            FilterFamily.BUTTERWORTH,
            4,
            0.4 * nominalHertz,
            Math.min(4 * nominalHertz, DiscreteFilter.HIGHEST_SHARE * rate))
        .at(rate);
  }

  private static double settleSeconds(double nominalHertz, double rate) {
    return wide(nominalHertz, rate).settleSeconds();
  }

  private static Threshold levels(FilteredReader reader, double settle)
      throws IOException, RejectedException {
    double rate = reader.sampleRateHertz();
    double[] kept = new double[(int) (BEGINNING_SECONDS * rate)];
    double[] block = new double[8192];
    int used = 0;
    int count;
    while ((count = reader.read(block)) > 0) {
      System.arraycopy(block, 0, kept, used, count);
      used += count;
    }
    int from = (int) (settle * rate);
    if (used <= from + 100) {
      throw new RejectedException(
          "tooShort", "The recording is shorter than a second: record at least 10 s.");
    }
    Quantiles levels = new Quantiles(Arrays.copyOfRange(kept, from, used));
    double low = levels.at(LEVEL_SHARE);
    double high = levels.at(1 - LEVEL_SHARE);
    if (!(high > low)) {
      throw new RejectedException(
          "silent",
          "The channel holds no signal: check the probe, the channel and the level, and record"
              + " again.");
    }
    return Threshold.middle(low, high);
  }

  private static void require(Pulses pulses, double nominalHertz) throws RejectedException {
    if (pulses.times().length < FEWEST) {
      throw new RejectedException(
          "noPulses",
          String.format(
              Locale.ROOT,
              "Only %d pulses were found, and %d are the least to try filters on: check the probe,"
                  + " the channel and the level, and record again.",
              pulses.times().length,
              FEWEST));
    }
    double hertz = 1 / pulses.meanPeriodSeconds();
    if (Math.abs(hertz / nominalHertz - 1) > SEARCH_SHARE) {
      throw new RejectedException(
          "otherRate",
          String.format(
              Locale.ROOT,
              "The pulses come %.6g times per second, not within 12 %% of the nominal %.6g: check"
                  + " the speed setting and the pulses per turn.",
              hertz,
              nominalHertz));
    }
  }

  /**
   * A short stretch of the same shape, hum and noise at another speed.
   *
   * @param gain of the pulses
   */
  double[] playedAt(double hertz, double gain, double lengthSeconds, long seed) {
    MeanWave.Shape shape = wave.at(hertz, gain, 0.45 * rateHertz).shape();
    double[] samples = new double[(int) (lengthSeconds * rateHertz)];
    java.util.Random random = new java.util.Random(seed);
    double rms = noise.whiteRms();
    for (int i = 0; i < samples.length; i++) {
      double turns = hertz * i / rateHertz;
      samples[i] = shape.at(turns - Math.floor(turns));
      samples[i] += rms * random.nextGaussian();
    }
    for (NoiseSpectrum.Line line : noise.hum()) {
      double phase = 2 * Math.PI * random.nextDouble();
      for (int i = 0; i < samples.length; i++) {
        samples[i] += line.peak() * Math.sin(2 * Math.PI * line.hertz() * i / rateHertz + phase);
      }
    }
    return samples;
  }
}
