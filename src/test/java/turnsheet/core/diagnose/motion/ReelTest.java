package turnsheet.core.diagnose.motion;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

class ReelTest {

  private static MovingLine line(double hertz, double bend, MovingLine.Motion motion) {
    return new MovingLine(
        motion, hertz, hertz, hertz, 0.001, bend, 0.05 * Math.abs(bend), 0.03, List.of());
  }

  /**
   * A pack of 20 mm at 4.76 cm/s turns 0.3788 times a second (v / 2 pi r); tape of 18 µm bends the
   * squared turn by 4 pi d / v = 4.752 ms a second.
   */
  @Test
  void radiusAndThicknessComeBack() {
    Reel reel =
        Reel.of(line(0.0476 / (2 * Math.PI * 0.020), 4.752e-3, MovingLine.Motion.SLOWER), 0.0476)
            .orElseThrow();

    assertThat(reel.harmonic()).isEqualTo(1);
    assertThat(reel.emptying()).isFalse();
    assertThat(reel.radiusMm()).isCloseTo(20, within(1e-6));
    assertThat(reel.thicknessUm()).isCloseTo(18, within(0.01));
    assertThat(reel.thicknessU()).isCloseTo(0.9, within(0.001));
  }

  /** Three bumps a turn: three times the rate, a ninth of the bend. */
  @Test
  void theThirdHarmonicOfAReelIsReadAsOne() {
    Reel reel =
        Reel.of(
                line(
                    3 * 0.19 / (2 * Math.PI * 0.100),
                    -(4 * Math.PI * 50e-6 / 0.19) / 9,
                    MovingLine.Motion.FASTER),
                0.19)
            .orElseThrow();

    assertThat(reel.emptying()).isTrue();
    // one bump a turn would mean tape of 5.6 µm on a pack of 33 mm, which is possible too: the
    // simpler reading is given
    assertThat(reel.harmonic()).isEqualTo(1);
    assertThat(reel.radiusMm()).isCloseTo(100 / 3.0, within(1e-6));
  }

  @Test
  void motionThatNoTapeMakesIsNoReel() {
    assertThat(Reel.of(line(8, -0.5, MovingLine.Motion.FASTER), 0.0476)).isEmpty();
    assertThat(Reel.of(line(0.4, 0.001, MovingLine.Motion.WANDERING), 0.0476)).isEmpty();
  }
}
