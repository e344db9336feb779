package turnsheet.core.format.text;

import java.util.Arrays;

/** Numbers of one column in the head of a table. */
final class Column {

  /** Share of rising steps that makes a column one of times, a slip of the clock allowed. */
  private static final double MOSTLY = 0.85;

  private final double[] values;

  Column(double[] values) {
    this.values = values;
  }

  int length() {
    return values.length;
  }

  double value(int row) {
    return values[row];
  }

  double[] values() {
    return values.clone();
  }

  /** Whether half of the cells at least hold a number; what is missing is found when reading. */
  boolean isFilled() {
    long filled = Arrays.stream(values).filter(v -> !Double.isNaN(v)).count();
    return filled > 0 && 2 * filled >= values.length;
  }

  boolean mostlyRises() {
    int rising = 0;
    for (int i = 1; i < values.length; i++) {
      rising += values[i] > values[i - 1] ? 1 : 0;
    }
    return rising >= MOSTLY * (values.length - 1);
  }

  boolean isPositive() {
    return Arrays.stream(values).allMatch(v -> v > 0 || Double.isNaN(v));
  }

  boolean isLevel() {
    return Arrays.stream(values).allMatch(v -> v == 0 || v == 1 || Double.isNaN(v));
  }

  boolean alternates() {
    int changes = 0;
    for (int i = 1; i < values.length; i++) {
      changes += values[i] != values[i - 1] ? 1 : 0;
    }
    return changes >= MOSTLY * (values.length - 1);
  }

  boolean isWhole() {
    return Arrays.stream(values).allMatch(v -> v == Math.rint(v) || Double.isNaN(v));
  }

  /** Whether whole numbers count up by one. */
  boolean counts() {
    for (int i = 1; i < values.length; i++) {
      if (values[i] - values[i - 1] != 1) {
        return false;
      }
    }
    return isWhole();
  }

  /** Median difference of successive values; 0 where there is none. */
  double medianStep() {
    double[] steps = new double[Math.max(0, values.length - 1)];
    for (int i = 0; i < steps.length; i++) {
      steps[i] = values[i + 1] - values[i];
    }
    return median(steps);
  }

  double median() {
    return median(values.clone());
  }

  private static double median(double[] of) {
    double[] sorted = Arrays.stream(of).filter(v -> !Double.isNaN(v)).sorted().toArray();
    return sorted.length == 0 ? 0 : sorted[sorted.length / 2];
  }
}
