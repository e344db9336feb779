package turnsheet.shop;

import com.fasterxml.jackson.annotation.JsonInclude;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.parts.Drive;

/**
 * The numbers that a part has beside the one that its rate follows from; null where its kind has
 * none or nobody knows.
 *
 * @param tolerancePercent half width within which diameter, length, ratio or rate is surely right
 * @param count teeth of a gear, marks of a sensor wheel, pole pairs of a motor with a supply of its
 *     own, balls of a bearing
 * @param rimMm diameter at which a belt lies on the part it is driven by
 * @param emptyMm diameter of the bare hub of a reel
 * @param winding which way the pack of a reel changes
 * @param ballMm diameter of a ball or roller of a bearing
 * @param pitchMm diameter of the circle of their middles
 * @param contactDegrees contact angle of a bearing
 * @param slipLowPercent least slip of an induction motor
 * @param slipHighPercent largest slip of an induction motor
 */
@JsonInclude(JsonInclude.Include.NON_NULL)
public record PartDetails(
    @Nullable Double tolerancePercent,
    @Nullable Integer count,
    @Nullable Double rimMm,
    @Nullable Double emptyMm,
    Drive.@Nullable Winding winding,
    @Nullable Double ballMm,
    @Nullable Double pitchMm,
    @Nullable Double contactDegrees,
    @Nullable Double slipLowPercent,
    @Nullable Double slipHighPercent) {

  public static final PartDetails NONE =
      new PartDetails(null, null, null, null, null, null, null, null, null, null);

  public static PartDetails ofCount(int count) {
    return new PartDetails(null, count, null, null, null, null, null, null, null, null);
  }

  /** A belt on a rim of another part. */
  public static PartDetails ofRim(double rimMm) {
    return new PartDetails(null, null, rimMm, null, null, null, null, null, null, null);
  }

  /** A reel whose pack goes down to its bare hub. */
  public static PartDetails ofPack(double emptyMm, Drive.Winding winding) {
    return new PartDetails(null, null, null, emptyMm, winding, null, null, null, null, null);
  }

  /** A rolling bearing with balls in straight contact. */
  public static PartDetails ofBalls(int count, double ballMm, double pitchMm) {
    return new PartDetails(null, count, null, null, null, ballMm, pitchMm, 0.0, null, null);
  }
}
