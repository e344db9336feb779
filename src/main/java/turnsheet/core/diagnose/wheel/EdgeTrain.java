package turnsheet.core.diagnose.wheel;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import turnsheet.core.stats.EdgeRepair;

/**
 * Edges with their places: a repaired train in which the number of an edge is an angle. Arrays are
 * handed out as they are and not to be changed.
 */
final class EdgeTrain {

  private final double[] seconds;
  private final boolean[] real;
  private final int[] extraAfter;
  private final List<Gap> gaps;

  private EdgeTrain(double[] seconds, boolean[] real, int[] extraAfter, List<Gap> gaps) {
    this.seconds = seconds;
    this.real = real;
    this.extraAfter = extraAfter;
    this.gaps = List.copyOf(gaps);
  }

  /**
   * Places without edges.
   *
   * @param from the first of them
   */
  record Gap(int from, int count) {}

  /**
   * Repairs a train.
   *
   * @param rises times of the rising edges, in order
   * @param periodSeconds expected at the beginning
   */
  static EdgeTrain of(double[] rises, double periodSeconds) {
    Filler filler = new Filler(rises.length);
    EdgeRepair repair = new EdgeRepair(periodSeconds, filler::edge, filler::gap);
    for (double rise : rises) {
      repair.edge(rise);
    }
    repair.finish();
    double[] seconds = Arrays.copyOf(filler.seconds, filler.count);
    boolean[] real = Arrays.copyOf(filler.real, filler.count);
    return new EdgeTrain(seconds, real, leftOut(rises, seconds, real), filler.gaps);
  }

  /** Of every place, in rising order; where an edge is missing, evenly between its neighbours. */
  double[] seconds() {
    return seconds;
  }

  /** Whether there was an edge. */
  boolean[] real() {
    return real;
  }

  /** For every edge that was left out the place of the one before it. */
  int[] extraAfter() {
    return extraAfter;
  }

  /** Stretches without edges, in order. */
  List<Gap> gaps() {
    return gaps;
  }

  int size() {
    return seconds.length;
  }

  double meanPeriodSeconds() {
    return (seconds[size() - 1] - seconds[0]) / (size() - 1);
  }

  /** Places without edges, in all. */
  long missing() {
    return gaps.stream().mapToLong(Gap::count).sum();
  }

  private static int[] leftOut(double[] rises, double[] seconds, boolean[] real) {
    int[] after = new int[rises.length];
    int found = 0;
    int k = 0;
    for (double rise : rises) {
      while (k < seconds.length && (!real[k] || seconds[k] < rise)) {
        k++;
      }
      if (k < seconds.length && seconds[k] == rise) {
        k++;
      } else {
        int before = k - 1;
        while (before > 0 && !real[before]) {
          before--;
        }
        after[found++] = Math.max(0, before);
      }
    }
    return Arrays.copyOf(after, found);
  }

  /** Takes what the repair hands out. */
  private static final class Filler {
    private double[] seconds;
    private boolean[] real;
    private int count;
    private final List<Gap> gaps = new ArrayList<>();

    Filler(int expected) {
      seconds = new double[Math.max(16, expected)];
      real = new boolean[seconds.length];
    }

    void edge(double at, boolean isReal) {
      if (count == seconds.length) {
        seconds = Arrays.copyOf(seconds, count + count / 2);
        real = Arrays.copyOf(real, seconds.length);
      }
      seconds[count] = at;
      real[count++] = isReal;
    }

    void gap(double fromSeconds, double toSeconds, long missing) {
      gaps.add(new Gap(count, (int) missing));
    }
  }
}
