package turnsheet.core.dsp;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

class BetweenSamplesTest {

  /**
   * Crossings of a wave with all odd harmonics below 0.44 of the sample rate, as a recorder's own
   * filter leaves a square; the sine is the case of one. Error in samples: what 48 taps leave.
   */
  @ParameterizedTest
  @CsvSource({"2.6, 1e-4", "3.7, 2e-5", "7.3, 2e-5", "30.3, 2e-5", "120.7, 2e-5"})
  void crossingsOfABandLimitedWaveAreWhereTheyAre(double samplesPerTurn, double bound)
      throws Exception {
    double[] wave = new double[6000];
    for (int h = 1; h == 1 || h < 0.44 * samplesPerTurn; h += 2) {
      for (int i = 0; i < wave.length; i++) {
        wave[i] += Math.sin(2 * Math.PI * h * (i / samplesPerTurn + 0.3)) / h;
      }
    }
    double[] times = new double[8000];
    boolean[] rising = new boolean[8000];
    int count;
    try (EdgeReader edges = new CrossingReader(samples(wave), 0, 0.1)) {
      count = edges.read(times, rising);
      assertThat(edges.read(times, rising)).isZero();
    }
    double worst = 0;
    int rises = 0;
    for (int i = 0; i < count; i++) {
      rises += rising[i] ? 1 : 0;
      // within half the reach of the ends a cubic has to do
      if (times[i] > 24 && times[i] < wave.length - 24) {
        double turns = times[i] / samplesPerTurn + 0.3 + (rising[i] ? 0 : 0.5);
        worst = Math.max(worst, Math.abs(turns - Math.rint(turns)) * samplesPerTurn);
      }
    }
    assertThat(worst).isLessThan(bound);
    assertThat((double) rises)
        .isBetween(wave.length / samplesPerTurn - 2, wave.length / samplesPerTurn + 1);
  }

  /** A sine passes a threshold h above its middle asin(h) after it, and falls as much late. */
  @Test
  void aComparatorSwitchesAtItsThresholds() throws Exception {
    double period = 61.3;
    double[] wave = new double[4000];
    for (int i = 0; i < wave.length; i++) {
      wave[i] = 0.2 + Math.sin(2 * Math.PI * (i / period));
    }
    double[] times = new double[400];
    boolean[] rising = new boolean[400];
    int count;
    try (EdgeReader edges = CrossingReader.comparator(samples(wave), 0.2, 0.8)) {
      count = edges.read(times, rising);
    }
    assertThat(count).isGreaterThan(120);
    double late = Math.asin(0.4) / (2 * Math.PI);
    for (int i = 0; i < count; i++) {
      if (times[i] > 24 && times[i] < wave.length - 24) {
        double turns = times[i] / period - late - (rising[i] ? 0 : 0.5);
        // away from the middle 48 taps leave 1e-4 of the peak, over a slope of 0.094 a sample
        assertThat(Math.abs(turns - Math.rint(turns)) * period).isLessThan(1e-3);
      }
    }
  }

  @ParameterizedTest
  @CsvSource({"600, 200", "800, 200", "1002.27, 200", "1200, 150", "2000, 200", "50, 10"})
  void fineValuesLieOnTheSine(double rate, double hertz) {
    FineValues fine = FineValues.at(rate);
    assertThat(rate * fine.perSample()).isBetween(2000.0, 4000.0);
    double worst = 0;
    for (int i = 0; i < 500; i++) {
      fine.add(Math.sin(2 * Math.PI * hertz * i / rate));
      for (int p = 0; p < fine.perSample() && i > 20; p++) {
        double at = (i - fine.delaySamples() + p / (double) fine.perSample()) / rate;
        worst = Math.max(worst, Math.abs(fine.value(p) - Math.sin(2 * Math.PI * hertz * at)));
      }
    }
    // 65 dB of the window
    assertThat(worst).isLessThan(1e-3);
  }

  @Test
  void fineValuesKeepTheSamplesThemselves() {
    FineValues fine = FineValues.at(1000);
    for (int i = 0; i < 40; i++) {
      fine.add(i * i);
    }
    int back = 39 - fine.delaySamples();
    assertThat(fine.value(0)).isEqualTo(back * back);
  }

  private static SampleReader samples(double[] values) {
    return new SampleReader() {
      private int next;

      @Override
      public double sampleRateHertz() {
        return 1;
      }

      @Override
      public int read(double[] into) {
        int n = Math.min(into.length, values.length - next);
        System.arraycopy(values, next, into, 0, n);
        next += n;
        return n;
      }

      @Override
      public List<Warning> warnings() {
        return List.of();
      }

      @Override
      public void close() {}
    };
  }
}
