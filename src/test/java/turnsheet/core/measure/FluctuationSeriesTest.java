package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import turnsheet.core.diagnose.motion.MovingLine;
import turnsheet.core.diagnose.motion.MovingLines;
import turnsheet.core.diagnose.motion.Reel;
import turnsheet.core.signal.Fluctuation;
import turnsheet.core.signal.SpeedTrace;

/** Traces in closed form: 1 % fast, a line, at the rates that traces have. */
class FluctuationSeriesTest {

  private static Fluctuation of(double rate, double seconds, double lineHertz, Stretch... out) {
    float[] percent = new float[(int) (seconds * rate)];
    for (int i = 0; i < percent.length; i++) {
      percent[i] = (float) (1 + 0.1 * Math.sin(2 * Math.PI * lineHertz * (2 + i / rate)));
    }
    return FluctuationSeries.of(
        Residual.of(new CleanTrace(SpeedTrace.of(2, rate, percent), List.of(out))));
  }

  @ParameterizedTest
  @ValueSource(doubles = {800, 1000, 1714.2857, 1999})
  void holdsALineAtItsTimeAndSizeWhateverTheRateOfTheTrace(double rate) {
    Fluctuation f = of(rate, 20, 190);

    assertThat(f.rateHertz()).isBetween(500.0, 1000.0);
    double worst = 0;
    for (int i = 200; i < f.length() - 200; i++) {
      double t = f.startSeconds() + i / f.rateHertz();
      // relative to the mean speed, which is 1.01 of nominal
      double truth = 0.1 / 1.01 * Math.sin(2 * Math.PI * 190 * t);
      worst = Math.max(worst, Math.abs(f.percent(i) - truth));
    }
    // ripple of 80 dB, single precision of the trace, 16 bits; half a sample late would be 0.06
    assertThat(worst).isLessThan(5e-5);
  }

  @Test
  void aLongGapIsSilentAndWhatFollowsKeepsItsTime() {
    Fluctuation f = of(1000, 20, 3, new Stretch(8, 12));

    assertThat(f.percent((int) ((10 - f.startSeconds()) * f.rateHertz()))).isZero();
    int later = (int) ((15 - f.startSeconds()) * f.rateHertz());
    double t = f.startSeconds() + later / f.rateHertz();
    // the gap takes whole turns out of the mean but for 1e-3
    assertThat(f.percent(later))
        .isCloseTo(0.1 / 1.01 * Math.sin(2 * Math.PI * 3 * t), within(2e-3));
  }

  @Test
  void endsAfterAnHour() {
    Fluctuation f = of(550, FluctuationSeries.LONGEST_SECONDS + 60, 1);

    assertThat(f.durationSeconds()).isCloseTo(3600, within(1.0));
  }

  /**
   * The whole way from samples: a tone of 3150 Hz whose speed swings by 0.05 % once per turn of a
   * reel of 22 mm that fills with tape of 18 µm at 4.76 cm/s. The phase is summed sample by sample
   * (trapezoids, 1e-9 of a turn off).
   */
  @Test
  void aReelIsRecognisedInARecordedTone() {
    double tape = 0.0476;
    double rate = 12_000;
    double[] samples = new double[(int) (90 * rate)];
    Random random = new Random(3);
    double turns = 0;
    double before = 1;
    for (int i = 0; i < samples.length; i++) {
      double t = i / rate - 45;
      // squared turn: (2 pi r / v)^2 at the middle, 4 pi d / v a second more
      double squared = Math.pow(2 * Math.PI * 0.022 / tape, 2) + 4 * Math.PI * 18e-6 / tape * t;
      double reelTurns = 2 * t / (Math.sqrt(squared) + 2 * Math.PI * 0.022 / tape);
      double speed =
          1 + 0.0005 * Math.sin(2 * Math.PI * reelTurns) + 0.001 * Math.sin(2 * Math.PI * 1.7 * t);
      turns += 3150 * (speed + before) / 2 / rate;
      before = speed;
      samples[i] = 0.5 * Math.sin(2 * Math.PI * turns) + 0.0005 * random.nextGaussian();
    }
    Fluctuation f =
        Tones.measured(samples, rate, MeasureSettings.tone(3150)).figures().fluctuation();

    List<MovingLine> moving = MovingLines.of(f);

    assertThat(moving).hasSize(1);
    Reel reel = Reel.of(moving.get(0), tape).orElseThrow();
    assertThat(reel.emptying()).isFalse();
    assertThat(reel.radiusMm()).isCloseTo(22, within(0.1));
    assertThat(reel.thicknessUm()).isCloseTo(18, within(1.5 * reel.thicknessU() + 0.2));
    assertThat(reel.thicknessU()).isLessThan(3);
    assertThat(moving.get(0).peakPercent()).isCloseTo(0.05, within(0.001));
  }
}
