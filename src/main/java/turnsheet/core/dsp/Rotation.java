package turnsheet.core.dsp;

/**
 * Cosine and sine of evenly spaced angles. Within a block they follow from a table by the addition
 * theorems, a tenth of the cost of asking for each; every block begins with an exact angle, so that
 * rounding does not pile up.
 *
 * <p>Error: below 5e-16 beside what the rounding of the step itself makes.
 */
public final class Rotation {

  /** Angles per block. */
  public static final int BLOCK = 256;

  private final double turnsPerBlock;
  private final double[] tableCosine = new double[BLOCK];
  private final double[] tableSine = new double[BLOCK];
  private final double[] cosine = new double[BLOCK];
  private final double[] sine = new double[BLOCK];
  private double turns;
  private int next = BLOCK;

  /**
   * @param startTurns first angle, 1 is a whole turn
   */
  public Rotation(double startTurns, double turnsPerStep) {
    turns = fraction(startTurns);
    turnsPerBlock = fraction(BLOCK * fraction(turnsPerStep));
    for (int i = 0; i < BLOCK; i++) {
      double angle = 2 * Math.PI * fraction(i * fraction(turnsPerStep));
      tableCosine[i] = StrictMath.cos(angle);
      tableSine[i] = StrictMath.sin(angle);
    }
  }

  /** Moves on to the next angle. */
  public void advance() {
    if (++next >= BLOCK) {
      begin();
    }
  }

  /** Cosine of the current angle. */
  public double cosine() {
    return cosine[next];
  }

  /** Sine of the current angle. */
  public double sine() {
    return sine[next];
  }

  private void begin() {
    double c = StrictMath.cos(2 * Math.PI * turns);
    double s = StrictMath.sin(2 * Math.PI * turns);
    for (int i = 0; i < BLOCK; i++) {
      cosine[i] = c * tableCosine[i] - s * tableSine[i];
      sine[i] = s * tableCosine[i] + c * tableSine[i];
    }
    turns = fraction(turns + turnsPerBlock);
    next = 0;
  }

  private static double fraction(double turns) {
    return turns - Math.floor(turns);
  }
}
