package turnsheet.core.stats;

import java.util.Arrays;

/**
 * Counts values in equal classes that grow with the range: where a value falls outside, classes are
 * joined two by two until it has room. Memory does not grow with the number of values.
 */
public final class PeriodHistogram {

  private static final int CLASSES = 8192;

  private final long[] counts = new long[CLASSES];
  private double width;
  private double from;
  private boolean any;

  /**
   * @param width of the finest class; values that sit on a grid of this step fall on the middles
   * @param centre a typical value, the middle of a class
   */
  public PeriodHistogram(double width, double centre) {
    if (!(width > 0 && Double.isFinite(width))) {
      throw new IllegalArgumentException("width " + width);
    }
    this.width = width;
    this.from = centre - (CLASSES / 2 + 0.5) * width;
  }

  public void add(double value) {
    while (value < from || value >= from + CLASSES * width) {
      join(value < from);
    }
    counts[Math.min(CLASSES - 1, (int) ((value - from) / width))]++;
    any = true;
  }

  private void join(boolean downwards) {
    long[] half = new long[CLASSES / 2];
    for (int i = 0; i < CLASSES; i++) {
      half[i / 2] += counts[i];
    }
    Arrays.fill(counts, 0);
    System.arraycopy(half, 0, counts, downwards ? CLASSES / 2 : 0, CLASSES / 2);
    if (downwards) {
      from -= CLASSES * width;
    }
    width *= 2;
  }

  /**
   * The counts in few classes, from the lowest value to the highest.
   *
   * @param most how many classes at most
   */
  public Classes classes(int most) {
    if (!any) {
      return new Classes(from, width, new long[0]);
    }
    int first = 0;
    while (counts[first] == 0) {
      first++;
    }
    int last = CLASSES - 1;
    while (counts[last] == 0) {
      last--;
    }
    int group = (last - first) / most + 1;
    long[] joined = new long[(last - first) / group + 1];
    for (int i = first; i <= last; i++) {
      joined[(i - first) / group] += counts[i];
    }
    return new Classes(from + first * width, group * width, joined);
  }

  /** Class k spans {@code from + k * width} to {@code + width}. */
  public static final class Classes {
    private final double from;
    private final double width;
    private final long[] counts;

    private Classes(double from, double width, long[] counts) {
      this.from = from;
      this.width = width;
      this.counts = counts;
    }

    public double from() {
      return from;
    }

    public double width() {
      return width;
    }

    public long[] counts() {
      return counts.clone();
    }
  }
}
