package turnsheet.reading.chart;

import java.util.function.IntUnaryOperator;
import turnsheet.reading.chart.SvgChart.Mark;

/**
 * A field of cells that are the darker the more they hold, in a few steps. Classes for a style
 * sheet: {@code drawn-cells}.
 */
public final class Cells {

  /** Steps of darkness; 0 is empty. */
  public static final int LEVELS = 5;

  private Cells() {}

  /** Level of a cell, 0 to {@value #LEVELS}. */
  @FunctionalInterface
  public interface Levels {
    int at(int column, int row);
  }

  /** Where a column or row begins, the one after the last included. */
  @FunctionalInterface
  public interface Edges {
    double at(int index);
  }

  /** The field; cells of one level that lie side by side make one shape. */
  public static Mark of(int columns, int rows, Edges x, Edges y, Levels levels) {
    return place -> {
      StringBuilder drawn = new StringBuilder();
      for (int level = 1; level <= LEVELS; level++) {
        StringBuilder path = new StringBuilder();
        for (int r = 0; r < rows; r++) {
          double bottom = place.top().applyAsDouble(y.at(r));
          double top = place.top().applyAsDouble(y.at(r + 1));
          int row = r;
          run(
              columns,
              level,
              c -> levels.at(c, row),
              (from, to) -> {
                double left = place.left().applyAsDouble(x.at(from));
                double right = place.left().applyAsDouble(x.at(to));
                path.append('M').append(Svg.number(left)).append(' ').append(Svg.number(top));
                path.append('H').append(Svg.number(right)).append('V').append(Svg.number(bottom));
                path.append('H').append(Svg.number(left)).append('z');
              });
        }
        if (!path.isEmpty()) {
          drawn.append(Svg.cells(path.toString(), (double) level / LEVELS));
        }
      }
      return drawn.toString();
    };
  }

  private interface Run {
    void from(int first, int end);
  }

  private static void run(int columns, int level, IntUnaryOperator levels, Run each) {
    int from = -1;
    for (int c = 0; c <= columns; c++) {
      boolean in = c < columns && levels.applyAsInt(c) == level;
      if (in && from < 0) {
        from = c;
      } else if (!in && from >= 0) {
        each.from(from, c);
        from = -1;
      }
    }
  }
}
