package turnsheet.core.diagnose.motion;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import turnsheet.core.signal.Fluctuation;

/** Fluctuation whose lines are known in closed form. */
class MovingLinesTest {

  private static final double RATE = 500;

  /** Tape of 18 µm at 4.76 cm/s (IEC 60094-1): bend = 4 pi d / v. */
  private static final double BEND = 4 * Math.PI * 18e-6 / 0.0476;

  private final Random random = new Random(5);

  private Fluctuation capture(double seconds, double noisePercent, Adder... adders) {
    double[] x = new double[(int) (seconds * RATE)];
    for (int i = 0; i < x.length; i++) {
      double t = (i - (x.length - 1) / 2.0) / RATE;
      x[i] = noisePercent * random.nextGaussian();
      for (Adder a : adders) {
        x[i] += a.at(t);
      }
    }
    return Fluctuation.of(0, RATE, x);
  }

  private interface Adder {
    double at(double secondsFromMiddle);
  }

  private Adder line(double hertz, double peak) {
    double phase = 2 * Math.PI * random.nextDouble();
    return t -> peak * Math.sin(2 * Math.PI * hertz * t + phase);
  }

  private static Adder reel(double hertz, double bend, double peak) {
    PackLaw law = new PackLaw(hertz, bend);
    return t -> peak * Math.sin(2 * Math.PI * law.turns(t));
  }

  @Test
  void aReelThatRunsEmptyIsFollowedAmongSteadyLines() {
    List<MovingLine> found =
        MovingLines.of(
            capture(60, 0.05, reel(0.62, -BEND, 0.03), line(1.31, 0.06), line(9.98, 0.04)));

    assertThat(found).hasSize(1);
    MovingLine reel = found.get(0);
    assertThat(reel.motion()).isEqualTo(MovingLine.Motion.FASTER);
    // k = 2 of what the noise leaves; a factor of two in the law would be off by twenty times that
    assertThat(reel.bendSeconds()).isCloseTo(-BEND, within(1.5 * reel.bendU()));
    assertThat(reel.bendU()).isLessThan(0.2 * BEND);
    assertThat(reel.middleHertz()).isCloseTo(0.62, within(1.5 * reel.hertzU()));
    assertThat(reel.peakPercent()).isCloseTo(0.03, within(0.002));
    assertThat(reel.endHertz()).isGreaterThan(reel.startHertz());
  }

  @Test
  void aReelThatFillsTurnsEverSlower() {
    List<MovingLine> found = MovingLines.of(capture(120, 0.05, reel(0.45, BEND, 0.05)));

    assertThat(found)
        .singleElement()
        .extracting(MovingLine::motion)
        .isEqualTo(MovingLine.Motion.SLOWER);
    assertThat(found.get(0).endHertz()).isLessThan(found.get(0).startHertz());
  }

  @Test
  void bothReelsOfATransportAreToldApart() {
    List<MovingLine> found =
        MovingLines.of(
            capture(120, 0.05, reel(0.40, BEND, 0.04), reel(0.85, -BEND, 0.03), line(2.0, 0.1)));

    assertThat(found)
        .extracting(MovingLine::motion)
        .containsExactly(MovingLine.Motion.SLOWER, MovingLine.Motion.FASTER);
    for (MovingLine line : found) {
      assertThat(Math.abs(line.bendSeconds())).isCloseTo(BEND, within(1.5 * line.bendU()));
    }
  }

  /** The law's uncertainty is worth its name: over many draws its error has unit variance. */
  @Test
  void theStatedUncertaintyIsTheScatter() {
    double squares = 0;
    int draws = 20;
    for (int i = 0; i < draws; i++) {
      MovingLine reel = MovingLines.of(capture(60, 0.1, reel(0.7, -BEND, 0.05))).get(0);
      double error = (reel.bendSeconds() + BEND) / (reel.bendU() / 2);
      squares += error * error;
    }
    // chi-square with 20 degrees of freedom over 20: 99.9 % lie between 0.28 and 2.3
    assertThat(squares / draws).isBetween(0.28, 2.3);
  }

  @Test
  void steadyLinesInNoiseDoNotMove() {
    int moving = 0;
    for (int i = 0; i < 20; i++) {
      moving +=
          MovingLines.of(
                  capture(
                      60,
                      0.1,
                      line(0.4 + random.nextDouble(), 0.03),
                      line(2 + 5 * random.nextDouble(), 0.05),
                      line(10 * random.nextDouble() + 8, 0.05)))
              .size();
    }
    // chance passes four standard deviations once in 16 000 lines
    assertThat(moving).isZero();
  }

  @Test
  void whatWandersToAndFroIsNoReel() {
    // rate 3 Hz and 0.15 Hz to and fro every 80 s
    Adder slipping =
        t ->
            0.05
                * Math.sin(
                    2
                        * Math.PI
                        * (3 * t - 0.15 * 80 / (2 * Math.PI) * Math.cos(2 * Math.PI * t / 80)));
    List<MovingLine> found = MovingLines.of(capture(120, 0.02, slipping));

    assertThat(found).isNotEmpty();
    assertThat(found.get(0).motion()).isEqualTo(MovingLine.Motion.WANDERING);
  }

  @Test
  void aShortCaptureHasNoMotionToShow() {
    assertThat(MovingLines.of(capture(10, 0.01, reel(0.7, -BEND, 0.05)))).isEmpty();
  }
}
