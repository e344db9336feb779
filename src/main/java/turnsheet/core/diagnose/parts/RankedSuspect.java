package turnsheet.core.diagnose.parts;

/**
 * A part that can stand behind a line.
 *
 * @param mismatchHz line minus expected rate, or minus the near end of its range; zero within
 * @param toleranceHz how large the mismatch may be: what the capture resolves plus all limits of
 *     the numbers that the rate follows from
 * @param probability that this is the cause, given that the list of parts is complete but for one
 *     unknown part
 */
public record RankedSuspect(
    ExpectedRate expected, double mismatchHz, double toleranceHz, double probability) {

  public String part() {
    return expected.part().name();
  }
}
