package turnsheet.core.format.text;

/**
 * Turns counts of a file's time unit into seconds.
 *
 * <p>Decimal fractions of a second divide by a power of ten, which is exact in binary, where
 * multiplying by 1e-6 would round twice.
 */
final class TickScale {

  private static final double[] POWERS = {1e3, 1e6, 1e9, 1e12, 1e15};

  private final double unitSeconds;
  private final double factor;
  private final double divisor;

  TickScale(double unitSeconds) {
    if (!(unitSeconds > 0 && Double.isFinite(unitSeconds))) {
      throw new IllegalArgumentException("time unit " + unitSeconds + " s");
    }
    this.unitSeconds = unitSeconds;
    double bestFactor = unitSeconds;
    double bestDivisor = 1;
    for (double power : POWERS) {
      for (int mantissa = 1; mantissa <= 100; mantissa *= 10) {
        if (unitSeconds == mantissa / power) {
          bestFactor = mantissa;
          bestDivisor = power;
        }
      }
    }
    factor = bestFactor;
    divisor = bestDivisor;
  }

  double unitSeconds() {
    return unitSeconds;
  }

  /** Hertz of a rate per unit. */
  double hertz(double perTick) {
    return perTick * divisor / factor;
  }

  double seconds(double ticks) {
    return ticks * factor / divisor;
  }
}
