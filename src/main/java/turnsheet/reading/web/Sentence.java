package turnsheet.reading.web;

import java.util.List;
import java.util.stream.Stream;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.reading.Judged;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** The answer of a reading in one sentence: how fast, how steady, and whether that will do. */
final class Sentence {

  private final Wording words;

  Sentence(Wording words) {
    this.words = words;
  }

  String of(java.util.function.Function<FigureName, Figure> figures, List<Judged> judged) {
    FigureName steady = headline(judged, figures);
    return words.text(
        "reading.sentence.whole",
        speed(figures.apply(FigureName.DEVIATION)) + standing(judged, FigureName.DEVIATION),
        steadiness(steady, figures.apply(steady)) + standing(judged, steady));
  }

  /** The flutter figure that has a limit; the two-sigma figure where none has. */
  static FigureName headline(
      List<Judged> judged, java.util.function.Function<FigureName, Figure> figures) {
    return Stream.of(
            FigureName.WEIGHTED_TWO_SIGMA,
            FigureName.WEIGHTED_QUASI_PEAK,
            FigureName.WEIGHTED_RMS,
            FigureName.UNWEIGHTED_RMS)
        .filter(name -> judged.stream().anyMatch(j -> j.limit().figure() == name))
        .filter(name -> figures.apply(name).value() != null)
        .findFirst()
        .orElse(FigureName.WEIGHTED_TWO_SIGMA);
  }

  private String speed(Figure deviation) {
    Double value = deviation.value();
    if (value == null) {
      return words.text("reading.sentence.noSpeed");
    }
    Double uncertainty = deviation.expandedUncertainty();
    String shown =
        words.numbers().show(Math.abs(value), uncertainty, "%", Numbers.Sign.PLAIN).text();
    if (Math.abs(value) <= (uncertainty == null ? 0 : uncertainty)) {
      return words.text(
          "reading.sentence.right", words.show(FigureName.DEVIATION, deviation).text());
    }
    return words.text(value > 0 ? "reading.sentence.fast" : "reading.sentence.slow", shown);
  }

  private String steadiness(FigureName name, Figure figure) {
    return figure.value() == null
        ? words.text("reading.sentence.noFlutter", words.inText(name))
        : words.text(
            "reading.sentence.flutter", words.inText(name), words.show(name, figure).text());
  }

  private String standing(List<Judged> judged, FigureName name) {
    return judged.stream()
        .filter(j -> j.limit().figure() == name)
        .map(
            j ->
                words.text(
                    "reading.sentence.standing",
                    words.limit(name, j.limit().upperBound()),
                    words.text("web.verdict." + FigureRow.word(j.judgement().verdict()))))
        .findFirst()
        .orElse("");
  }
}
