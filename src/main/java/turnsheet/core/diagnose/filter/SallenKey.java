package turnsheet.core.diagnose.filter;

/**
 * One stage built as a Sallen-Key circuit around a follower.
 *
 * <p>High-pass: C1 and C2 in series, R1 from between them to the output, R2 from the follower's
 * input to ground. Low-pass: R1 and R2 in series, C1 from between them to the output, C2 from the
 * follower's input to ground.
 *
 * <p>Source: R. P. Sallen and E. L. Key, "A practical method of designing RC active filters", IRE
 * Trans. Circuit Theory 2 (1955) 74-85; the algebra is worked out anew and tested on the circuit's
 * node equations.
 */
public record SallenKey(
    Section wanted, double r1Ohm, double r2Ohm, double c1Farad, double c2Farad) {

  /**
   * The circuit for a stage.
   *
   * <p>High-pass: both capacitors equal. Low-pass: C2 as given, C1 the smallest value of E24 that
   * is at least 4 Q^2 times as large, so that both resistors are about equal and real.
   *
   * @param capacitorFarad both capacitors of a high-pass, the smaller one of a low-pass
   * @param series of the resistors; capacitors come from E24, as few are made in finer steps
   */
  public static SallenKey of(Section section, double capacitorFarad, ESeries series) {
    double w = 2 * Math.PI * section.f0Hz();
    double q = section.q();
    double c = capacitorFarad;
    if (section.highPass()) {
      return new SallenKey(
          section, series.nearest(1 / (2 * q * w * c)), series.nearest(2 * q / (w * c)), c, c);
    }
    double c1 = ESeries.E24.atLeast(4 * q * q * c);
    double product = 1 / (w * w * c1 * c);
    double sum = Math.sqrt(c1 / c * product) / q;
    double root = Math.sqrt(Math.max(0, sum * sum - 4 * product));
    return new SallenKey(
        section, series.nearest((sum + root) / 2), series.nearest((sum - root) / 2), c1, c);
  }

  /** What these parts make. */
  public Section built() {
    double f0 = 1 / (2 * Math.PI * Math.sqrt(r1Ohm * r2Ohm * c1Farad * c2Farad));
    double q =
        wanted.highPass()
            ? Math.sqrt(r2Ohm / r1Ohm) * Math.sqrt(c1Farad * c2Farad) / (c1Farad + c2Farad)
            : Math.sqrt(c1Farad / c2Farad) * Math.sqrt(r1Ohm * r2Ohm) / (r1Ohm + r2Ohm);
    return new Section(wanted.highPass(), f0, q);
  }

  /** The same with parts off their value by these shares. */
  SallenKey off(double r1, double r2, double c1, double c2) {
    return new SallenKey(
        wanted, r1Ohm * (1 + r1), r2Ohm * (1 + r2), c1Farad * (1 + c1), c2Farad * (1 + c2));
  }
}
