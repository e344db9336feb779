package turnsheet.reading.web;

import turnsheet.core.measure.FigureName;
import turnsheet.reading.Population;
import turnsheet.web.Numbers;
import turnsheet.web.Shown;
import turnsheet.web.Wording;

/** What is typical for a model, in words and numbers. */
final class TypicalText {

  private final Wording words;

  TypicalText(Wording words) {
    this.words = words;
  }

  /** Where the newest value of a unit lies among those of all. */
  String sentence(Population population, double newest) {
    String units = Integer.toString(population.units());
    if (!population.hasQuartiles()) {
      return words.text("history.typical.tooFew", units);
    }
    String place =
        newest < population.lowerQuartile()
            ? "below"
            : newest > population.upperQuartile() ? "above" : "among";
    FigureName figure = population.figure();
    return words.text(
        "history.typical." + place,
        units,
        show(figure, population.lowerQuartile()).value(),
        show(figure, population.upperQuartile()).valueAndUnit(),
        show(figure, population.median()).valueAndUnit(),
        show(figure, newest).valueAndUnit());
  }

  /** The middle half for a table; empty where there are too few units. */
  String middleHalf(Population population) {
    return population.hasQuartiles()
        ? words.text(
            "history.typical.range",
            show(population.figure(), population.lowerQuartile()).value(),
            show(population.figure(), population.upperQuartile()).value())
        : "";
  }

  Shown median(Population population) {
    return show(population.figure(), population.median());
  }

  /** A dash where there are too few units, as for the upper one. */
  Shown lower(Population population) {
    return population.hasQuartiles()
        ? show(population.figure(), population.lowerQuartile())
        : none(population);
  }

  Shown upper(Population population) {
    return population.hasQuartiles()
        ? show(population.figure(), population.upperQuartile())
        : none(population);
  }

  private static Shown none(Population population) {
    return new Shown("\u2013", "", "", population.figure().unit(), null);
  }

  private Shown show(FigureName figure, double value) {
    Numbers.Sign sign = Wording.signOf(figure);
    return words.numbers().show(value, null, figure.unit(), sign);
  }
}
