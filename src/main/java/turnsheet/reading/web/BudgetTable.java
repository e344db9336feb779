package turnsheet.reading.web;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Reading;
import turnsheet.core.stats.Budget;
import turnsheet.web.Wording;

/**
 * What the uncertainties of one reading are made of: figures down, causes across.
 *
 * <p>Source: JCGM 100:2008 (GUM), 7.1.4 and 7.2.7, which ask that each component of the standard
 * uncertainty be listed with how the whole was worked out.
 *
 * @param causes in the order in which the figures name them
 * @param rows empty for a reading of the time before budgets were kept
 */
record BudgetTable(List<String> causes, List<Row> rows) {

  /**
   * One figure.
   *
   * @param cells one for each cause: standard uncertainty in the unit of the figure
   * @param combined root of the sum of their squares
   * @param expanded that, times two
   */
  record Row(String name, String unit, List<Cell> cells, String combined, String expanded) {}

  /**
   * One contribution.
   *
   * @param text empty where the cause takes no part
   * @param largest whether no other cause of the figure weighs more
   */
  record Cell(String text, boolean largest) {}

  static BudgetTable of(Wording words, Reading reading) {
    List<FigureName> named =
        Stream.of(FigureName.values()).filter(n -> !n.of(reading).budget().isEmpty()).toList();
    List<String> causes =
        named.stream()
            .flatMap(name -> name.of(reading).budget().stream())
            .map(Budget.Contribution::cause)
            .distinct()
            .toList();
    return new BudgetTable(
        causes.stream().map(words::said).toList(),
        named.stream().map(name -> row(words, name, name.of(reading), causes)).toList());
  }

  private static Row row(Wording words, FigureName name, Figure figure, List<String> causes) {
    Budget budget = new Budget(figure.budget());
    Map<String, Double> parts =
        budget.contributions().stream()
            .collect(
                Collectors.toMap(
                    Budget.Contribution::cause,
                    Budget.Contribution::standardUncertainty,
                    Math::hypot));
    double largest = parts.values().stream().mapToDouble(Double::doubleValue).max().orElse(0);
    List<Cell> cells = new ArrayList<>();
    for (String cause : causes) {
      Double part = parts.get(cause);
      cells.add(
          part == null
              ? new Cell("", false)
              : new Cell(shortly(words, part), part > 0 && part == largest));
    }
    return new Row(
        words.nameOf(name),
        name.unit(),
        cells,
        shortly(words, budget.combined()),
        shortly(words, budget.expanded()));
  }

  /** Two significant digits are all that an uncertainty can bear (GUM 7.2.6). */
  private static String shortly(Wording words, double uncertainty) {
    if (uncertainty == 0) {
      return "0";
    }
    int places = new BigDecimal(uncertainty).round(new MathContext(2)).scale();
    return words.numbers().fixed(uncertainty, Math.max(0, places));
  }
}
