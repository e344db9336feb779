package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

class KindGuessTest {

  private static final double RATE = 48000;

  @Test
  void aSineIsATone() {
    KindGuess guess = KindGuess.of(sine(3150, 40), RATE, null, null);
    assertThat(guess.kind()).isEqualTo(CaptureKind.TONE);
    // one rise more or less at the ends of two seconds
    assertThat(guess.rateHertz()).isCloseTo(3150, within(1.0));
  }

  @Test
  void aToneInNoiseIsStillATone() {
    KindGuess guess = KindGuess.of(sine(3150, 20), RATE, null, null);
    assertThat(guess.kind()).isEqualTo(CaptureKind.TONE);
    assertThat(guess.rateHertz()).isCloseTo(3150, within(1.0));
  }

  @Test
  void aSquareIsATachometer() {
    KindGuess guess = KindGuess.of(pulses(400, 0.5), RATE, null, null);
    assertThat(guess.kind()).isEqualTo(CaptureKind.TACHOMETER);
    assertThat(guess.rateHertz()).isCloseTo(400, within(1.0));
  }

  @Test
  void narrowPulsesAreATachometer() {
    assertThat(KindGuess.of(pulses(100, 0.1), RATE, null, null).kind())
        .isEqualTo(CaptureKind.TACHOMETER);
  }

  @Test
  void aSineNearTheTachometerRateIsATachometer() {
    assertThat(KindGuess.of(sine(400, 60), RATE, 3150.0, 410.0).kind())
        .isEqualTo(CaptureKind.TACHOMETER);
  }

  @Test
  void aSquareNearTheToneIsATone() {
    assertThat(KindGuess.of(pulses(3000, 0.5), RATE, 3150.0, 400.0).kind())
        .isEqualTo(CaptureKind.TONE);
  }

  @Test
  void silenceHasNoRate() {
    KindGuess guess = KindGuess.of(new double[1000], RATE, 3150.0, null);
    assertThat(guess.rateHertz()).isNull();
  }

  @Test
  void nothingIsAnAnswerToo() {
    assertThat(KindGuess.of(new double[0], RATE, null, null).rateHertz()).isNull();
  }

  private static double[] sine(double hertz, double snrDb) {
    return SignalSynth.tone(SpeedFunction.constant(0), hertz, RATE, 2, 0.5, snrDb, 1);
  }

  private static double[] pulses(double hertz, double duty) {
    double[] samples = new double[(int) (2 * RATE)];
    Random noise = new Random(2);
    for (int i = 0; i < samples.length; i++) {
      double turn = i / RATE * hertz;
      samples[i] = (turn - Math.floor(turn) < duty ? 5 : 0) + 0.05 * noise.nextGaussian();
    }
    return samples;
  }
}
