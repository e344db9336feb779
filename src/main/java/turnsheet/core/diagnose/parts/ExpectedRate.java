package turnsheet.core.diagnose.parts;

/**
 * A rate at which a part can leave a line.
 *
 * @param harmonic multiple of the cause's own rate, from 1
 * @param sideband how many turns of the part (of the cage, for a ball) lie between the harmonic and
 *     this rate, negative below; zero for the harmonic itself
 * @param rate where the line is expected
 * @param prior how probable such a line is against the part's own rate, which counts 1: 1 / h for a
 *     harmonic, half as much again over n for a side line (common practice, no source)
 */
public record ExpectedRate(
    MachinePart part, Cause cause, int harmonic, int sideband, Turning rate, double prior) {

  static ExpectedRate harmonic(MachinePart part, Cause cause, int harmonic, Turning own) {
    return new ExpectedRate(part, cause, harmonic, 0, own.times(harmonic), 1.0 / harmonic);
  }
}
