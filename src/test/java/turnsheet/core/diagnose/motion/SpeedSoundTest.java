package turnsheet.core.diagnose.motion;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import turnsheet.core.signal.Fluctuation;

class SpeedSoundTest {

  private static final double RATE = 500;

  private static Fluctuation lines(double... hertzAndPeak) {
    double[] x = new double[(int) (60 * RATE)];
    for (int i = 0; i < x.length; i++) {
      for (int k = 0; k < hertzAndPeak.length; k += 2) {
        x[i] += hertzAndPeak[k + 1] * Math.sin(2 * Math.PI * hertzAndPeak[k] * i / RATE);
      }
    }
    return Fluctuation.of(0, RATE, x);
  }

  /** Amplitude of a tone in the sound. */
  private static double tone(SpeedSound sound, double hertz) {
    double re = 0;
    double im = 0;
    double weights = 0;
    for (int i = 0; i < sound.length(); i++) {
      double w = 0.5 - 0.5 * Math.cos(2 * Math.PI * i / sound.length());
      double angle = 2 * Math.PI * hertz * i / sound.rateHertz();
      re += w * sound.sample(i) * Math.cos(angle);
      im += w * sound.sample(i) * Math.sin(angle);
      weights += w;
    }
    return 2 * Math.hypot(re, im) / weights;
  }

  @Test
  void aLineBecomesAToneSoManyTimesHigher() {
    SpeedSound sound = SpeedSound.whole(lines(4, 0.05), 50);

    assertThat(sound.rateHertz()).isEqualTo(25_000);
    assertThat(sound.seconds()).isCloseTo(60.0 / 50, within(1e-9));
    // the crest of the sine is half of full scale; the first and last turn ring a little higher
    assertThat(tone(sound, 200)).isCloseTo(0.5, within(0.05));
    assertThat(tone(sound, 200) * sound.fullScalePercent()).isCloseTo(0.05, within(0.001));
    assertThat(tone(sound, 300)).isLessThan(1e-3);
  }

  @Test
  void oneLinesBandLeavesTheOthersOut() {
    SpeedSound sound = SpeedSound.line(lines(1, 0.2, 10, 0.01, 30, 0.1), 50, 10);

    double kept = tone(sound, 500);
    assertThat(kept * sound.fullScalePercent()).isCloseTo(0.01, within(0.0005));
    assertThat(tone(sound, 50)).isLessThan(0.01 * kept);
    assertThat(tone(sound, 1500)).isLessThan(0.01 * kept);
  }

  @Test
  void silenceStaysSilent() {
    SpeedSound sound = SpeedSound.whole(Fluctuation.of(0, RATE, new double[5000]), 20);

    assertThat(sound.sample(1234)).isZero();
  }
}
