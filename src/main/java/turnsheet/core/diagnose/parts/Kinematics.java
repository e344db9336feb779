package turnsheet.core.diagnose.parts;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/**
 * How often each part of a machine turns.
 *
 * <p>Counts are exact, and so is a part that turns once per turn of another, for it sits on the
 * same shaft. A diameter, a length, any other ratio and a rate off a name plate are good to one
 * percent where the part does not say (common practice, no source).
 */
public final class Kinematics {

  static final double USUAL_TOLERANCE = 0.01;

  private final Map<String, MachinePart> named = new HashMap<>();
  private final Running running;

  /**
   * @throws IllegalArgumentException where two parts have one name
   */
  public Kinematics(List<MachinePart> parts, Running running) {
    this.running = running;
    for (MachinePart part : parts) {
      if (named.put(part.name(), part) != null) {
        throw new IllegalArgumentException("two parts named " + part.name());
      }
    }
  }

  /**
   * The turning rate of a part; empty where it follows from something that the speed setting or the
   * machine does not have.
   *
   * @throws IllegalArgumentException where parts refer to each other in a circle
   */
  public Optional<Turning> of(MachinePart part) {
    return of(part, named.size() + 1);
  }

  private Optional<Turning> of(MachinePart part, int depth) {
    if (depth == 0) {
      throw new IllegalArgumentException(part.name() + " follows from itself");
    }
    return driven(part.drive(), depth, tolerance(part));
  }

  private Optional<Turning> driven(Drive drive, int depth, double tolerance) {
    if (drive instanceof Drive.Rim rim) {
      return tape().map(v -> v.times(1 / (Math.PI * rim.diameterMm())).within(tolerance));
    }
    if (drive instanceof Drive.Pack pack) {
      return tape().map(v -> over(pack, v).within(tolerance));
    }
    if (drive instanceof Drive.Loop loop) {
      return surface(loop, depth, tolerance)
          .map(v -> v.times(1 / loop.lengthMm()).within(tolerance));
    }
    if (drive instanceof Drive.Geared geared) {
      return reference(geared.of(), depth).map(r -> r.times(geared.ratio()).within(tolerance));
    }
    if (drive instanceof Drive.Supply supply) {
      return Optional.of(onMains(supply).within(tolerance));
    }
    return Optional.of(own(((Drive.Own) drive).perMinute() / 60).within(tolerance));
  }

  /** Nobody has said whether what it hangs on moves with the unit: between still and moved. */
  private Turning own(double hertz) {
    double moved = hertz * running.speedFactor();
    return new Turning(Math.min(hertz, moved), Math.max(hertz, moved), 0, 0, Lock.FREE);
  }

  private static Turning over(Drive.Pack pack, Turning tape) {
    return new Turning(
        tape.lowHertz() / (Math.PI * pack.fullMm()),
        tape.highHertz() / (Math.PI * pack.emptyMm()),
        tape.limit(),
        tape.variance(),
        Lock.SHAFT);
  }

  /** The mains as the capture had it. */
  Turning mains() {
    return Turning.exact(running.mainsHertz(), Lock.MAINS)
        .within(running.mainsLimitHertz() / running.mainsHertz());
  }

  /** The relative half width that a part's own number adds. */
  static double tolerance(MachinePart part) {
    Double said = part.tolerancePercent();
    if (said != null) {
      return said / 100;
    }
    boolean exact =
        part.drive() instanceof Drive.Supply
            || (part.drive() instanceof Drive.Geared geared && geared.ratio() == 1);
    return exact ? 0 : USUAL_TOLERANCE;
  }

  private Turning onMains(Drive.Supply supply) {
    Turning field = mains().times(1.0 / supply.polePairs());
    return supply.slipHigh() == 0
        ? field
        : new Turning(
            field.lowHertz() * (1 - supply.slipHigh()),
            field.highHertz() * (1 - supply.slipLow()),
            field.limit(),
            field.variance(),
            Lock.FREE);
  }

  /** Speed of the rim under a belt, mm/s. */
  private Optional<Turning> surface(Drive.Loop loop, int depth, double tolerance) {
    Double rim = loop.rimMm();
    return rim == null
        ? tape()
        : reference(loop.on(), depth).map(r -> r.times(Math.PI * rim).within(tolerance));
  }

  private Optional<Turning> reference(@Nullable String name, int depth) {
    if (name == null) {
      return scaled(running.turnsPerSecond());
    }
    MachinePart part = named.get(name);
    return part == null ? Optional.empty() : of(part, depth - 1);
  }

  /** Tape speed, mm/s. */
  private Optional<Turning> tape() {
    return scaled(running.tapeMmPerS());
  }

  private Optional<Turning> scaled(@Nullable Double nominal) {
    return Optional.ofNullable(nominal)
        .map(
            n ->
                Turning.exact(n * running.speedFactor(), Lock.SHAFT)
                    .within(running.deviationLimitPercent() / 100 / running.speedFactor()));
  }
}
