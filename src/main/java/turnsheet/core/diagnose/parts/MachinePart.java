package turnsheet.core.diagnose.parts;

import org.jspecify.annotations.Nullable;

/**
 * One moving part as it is known.
 *
 * @param name as the bench calls it; no other part of the machine has it
 * @param feature teeth, poles or balls; null where it has none that are known
 * @param tolerancePercent half width within which its diameter, length, ratio or rate is surely
 *     right; null where nobody has said
 */
public record MachinePart(
    String name,
    PartKind kind,
    Drive drive,
    @Nullable Feature feature,
    @Nullable Double tolerancePercent) {

  public MachinePart {
    if (tolerancePercent != null && !(tolerancePercent >= 0 && tolerancePercent < 100)) {
      throw new IllegalArgumentException(name + " within " + tolerancePercent + " %");
    }
  }

  /** A part without feature, as well known as is usual. */
  public static MachinePart of(String name, PartKind kind, Drive drive) {
    return new MachinePart(name, kind, drive, null, null);
  }
}
