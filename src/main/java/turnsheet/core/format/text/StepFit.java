package turnsheet.core.format.text;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * The step of evenly spaced times whose last digit was rounded or cut off.
 *
 * <p>Every time k says that the step lies within one last digit of (t[k] - t[0]) / k; the step that
 * all allow with the fewest digits, as step or as rate, is taken: times are exported from clocks
 * with round rates. Where no step satisfies all, the mean is taken.
 *
 * @param step in the unit of the times
 * @param rate its reciprocal, exact where either of them is a round number
 * @param relativeUncertainty half the range that the digits allow, relative to the step
 */
record StepFit(double step, double rate, double relativeUncertainty) {

  static StepFit of(double[] times, Digits digits) {
    int last = times.length - 1;
    while (last > 1 && Double.isNaN(times[last])) {
      last--;
    }
    double mean = (times[last] - times[0]) / last;
    double low = Double.NEGATIVE_INFINITY;
    double high = Double.POSITIVE_INFINITY;
    for (int k = 1; k <= last; k++) {
      double slack =
          Math.max(digits.resolution(times[k]), digits.resolution(times[0]))
              + 4 * Math.ulp(Math.max(Math.abs(times[k]), Math.abs(times[0])));
      low = Math.max(low, (times[k] - times[0] - slack) / k);
      high = Math.min(high, (times[k] - times[0] + slack) / k);
    }
    if (!(low > 0 && low <= high)) {
      double range = 2 * digits.resolution(times[last]) / last;
      return ofStep(mean, range / Math.abs(mean));
    }
    return roundest(low, high);
  }

  static StepFit ofStep(double step, double relativeUncertainty) {
    return new StepFit(step, reciprocal(step), relativeUncertainty);
  }

  /** 50000 of 2e-5: the reciprocal of the decimal that a double is printed as. */
  static double reciprocal(double value) {
    if (value == 0 || !Double.isFinite(value)) {
      return 1 / value;
    }
    return BigDecimal.ONE
        .divide(BigDecimal.valueOf(value), new MathContext(30, RoundingMode.HALF_EVEN))
        .doubleValue();
  }

  private static StepFit roundest(double low, double high) {
    double middle = low + (high - low) / 2;
    double uncertainty = (high - low) / (low + high);
    for (int digits = 1; digits <= 17; digits++) {
      double step = rounded(middle, digits);
      if (step >= low && step <= high) {
        return ofStep(step, uncertainty);
      }
      double rate = rounded(1 / middle, digits);
      if (1 / rate >= low && 1 / rate <= high) {
        return new StepFit(1 / rate, rate, uncertainty);
      }
    }
    return ofStep(middle, uncertainty);
  }

  private static double rounded(double value, int digits) {
    return new BigDecimal(value)
        .round(new MathContext(digits, RoundingMode.HALF_EVEN))
        .doubleValue();
  }
}
