package turnsheet.core.dsp;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;

/** Angles by table and series against the platform's exact functions. */
class RotationTest {

  @Test
  void rotationFollowsEveryAngle() {
    double step = 1.0 / 1_000_003;
    Rotation rotation = new Rotation(0.3, step);
    for (int i = 0; i < 1_000_003; i++) {
      rotation.advance();
      if (i % 997 == 0) {
        double angle = 2 * Math.PI * (0.3 + i * step);
        // 4000 blocks, each of which rounds its beginning by up to 1e-16 turns
        assertThat(rotation.cosine()).isCloseTo(StrictMath.cos(angle), within(2.5e-12));
        assertThat(rotation.sine()).isCloseTo(StrictMath.sin(angle), within(2.5e-12));
      }
    }
  }

  @Test
  void rotationStaysOnTheCircle() {
    Rotation rotation = new Rotation(0, 0.46128);
    for (int i = 0; i < 100_000; i++) {
      rotation.advance();
      assertThat(Math.hypot(rotation.cosine(), rotation.sine())).isCloseTo(1, within(1e-15));
    }
  }

  @Test
  void angleIsThatOfThePlatform() {
    Random random = new Random(5);
    for (int i = 0; i < 200_000; i++) {
      double x = random.nextGaussian();
      double y = random.nextGaussian() * Math.pow(10, -6 * random.nextDouble());
      double exact = StrictMath.atan2(y, x);
      assertThat(Angle.of(y, x)).isCloseTo(exact, within(2 * Math.ulp(exact)));
    }
  }

  @Test
  void angleOfTheAxes() {
    assertThat(Angle.of(0, 0)).isZero();
    assertThat(Angle.of(0, 1)).isZero();
    assertThat(Angle.of(0, -1)).isEqualTo(Math.PI);
    assertThat(Angle.of(-1, 0)).isEqualTo(-Math.PI / 2);
    assertThat(Angle.of(Double.NaN, 1)).isNaN();
  }
}
