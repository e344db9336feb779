package turnsheet.core.format.text;

/** Unit of times that state none, by how long a step would be. */
final class TimeUnitGuess {

  /** Longer than this between two pulses is no turning machine. */
  private static final double LONGEST_SECONDS = 20;

  private static final double LONGEST_MICROSECONDS = 200_000;

  private TimeUnitGuess() {}

  /** Unit in seconds of edges or periods that are typically so many units apart. */
  static double ofPeriods(double typical) {
    if (typical < LONGEST_SECONDS) {
      return 1;
    }
    return typical < LONGEST_MICROSECONDS ? 1e-6 : 1e-9;
  }

  /** Unit in seconds of a waveform's time column. */
  static double ofSamples(double step, boolean whole) {
    return whole && step >= 1 ? 1e-6 : 1;
  }

  static String sentence(double unit, String what, double typical) {
    String shown = Units.name(unit);
    return unit == 1
        ? shown + ": no unit is stated"
        : shown + ": no unit is stated, and " + what + " of " + typical + " s would be too long";
  }
}
