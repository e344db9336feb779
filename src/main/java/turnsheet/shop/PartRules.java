package turnsheet.shop;

import java.util.List;
import java.util.Objects;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.parts.PartKind;

/** Which kinds of part follow from what, and which of their numbers go together. */
public final class PartRules {

  private static final List<PartBasis> USUAL =
      List.of(PartBasis.DIAMETER_MM, PartBasis.TURNS_PER_TURN, PartBasis.FIXED_PER_MINUTE);
  private static final double MOST_PERCENT = 50;
  private static final double STEEPEST_DEGREES = 80;
  private static final double LARGEST_MM = 100_000;

  private PartRules() {}

  /** What the rate of a kind can follow from, the usual first. */
  public static List<PartBasis> bases(PartKind kind) {
    return switch (kind) {
      case CAPSTAN, ROLLER, IDLER, OTHER -> USUAL;
      case PULLEY, PLATTER, GEAR, SENSOR ->
          List.of(PartBasis.TURNS_PER_TURN, PartBasis.DIAMETER_MM, PartBasis.FIXED_PER_MINUTE);
      case BEARING -> List.of(PartBasis.TURNS_PER_TURN, PartBasis.FIXED_PER_MINUTE);
      case REEL -> List.of(PartBasis.DIAMETER_MM);
      case BELT ->
          List.of(PartBasis.LENGTH_MM, PartBasis.TURNS_PER_TURN, PartBasis.FIXED_PER_MINUTE);
      case MOTOR ->
          List.of(PartBasis.MAINS_POLE_PAIRS, PartBasis.TURNS_PER_TURN, PartBasis.FIXED_PER_MINUTE);
      case MAINS -> List.of();
    };
  }

  static void check(
      String name,
      PartKind kind,
      PartBasis basis,
      double amount,
      @Nullable String referencePart,
      PartDetails d) {
    require(bases(kind).contains(basis), "partBasis", name);
    Double tolerance = d.tolerancePercent();
    require(
        tolerance == null || (tolerance >= 0 && tolerance <= MOST_PERCENT), "partTolerance", name);
    Integer count = d.count();
    require(count == null || count > 0, "partCount", name);
    if (kind == PartKind.REEL) {
      Double empty = d.emptyMm();
      require(empty == null || (sound(empty) && empty < amount), "partPack", name);
    }
    if (basis == PartBasis.LENGTH_MM) {
      Double rim = d.rimMm();
      require((rim == null) == (referencePart == null), "partBelt", name);
      require(rim == null || sound(rim), "partBelt", name);
    }
    if (basis == PartBasis.MAINS_POLE_PAIRS) {
      require(amount == Math.rint(amount) && amount <= 100, "partPoles", name);
      slip(name, d);
    }
    if (kind == PartKind.BEARING) {
      balls(name, d);
    }
  }

  private static void slip(String name, PartDetails d) {
    Double low = d.slipLowPercent();
    Double high = d.slipHighPercent();
    require((low == null) == (high == null), "partSlip", name);
    require(
        low == null || high == null || (low >= 0 && low <= high && high <= MOST_PERCENT),
        "partSlip",
        name);
  }

  private static void balls(String name, PartDetails d) {
    long said = Stream.of(d.count(), d.ballMm(), d.pitchMm()).filter(Objects::nonNull).count();
    Double ball = d.ballMm();
    Double pitch = d.pitchMm();
    Double angle = d.contactDegrees();
    boolean whole =
        said == 0
            || (ball != null
                && pitch != null
                && said == 3
                && sound(ball)
                && sound(pitch)
                && pitch > ball);
    require(whole, "partBalls", name);
    require(angle == null || (angle >= 0 && angle <= STEEPEST_DEGREES), "partBalls", name);
  }

  private static boolean sound(double millimetres) {
    return millimetres > 0 && millimetres <= LARGEST_MM;
  }

  private static void require(boolean kept, String code, String name) {
    if (!kept) {
      throw new RefusedChangeException(code, name);
    }
  }
}
