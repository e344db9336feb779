package turnsheet.reading;

import java.util.List;
import java.util.function.Function;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.core.diagnose.Judgement;
import turnsheet.core.diagnose.Verdict;
import turnsheet.core.diagnose.Verdicts;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.ServiceLimit;

/** A figure held against its service limit. */
public record Judged(ServiceLimit limit, Figure figure, Judgement judgement) {

  /** Judges each figure that has a value and a limit, in the order of the limits. */
  public static List<Judged> all(
      List<ServiceLimit> limits, Function<FigureName, Figure> figures, DecisionRule rule) {
    return limits.stream()
        .map(limit -> of(limit, figures.apply(limit.figure()), rule))
        .filter(judged -> judged.figure().value() != null)
        .toList();
  }

  public boolean is(Verdict verdict) {
    return judgement.verdict() == verdict;
  }

  public static Judged of(ServiceLimit limit, Figure figure, DecisionRule rule) {
    return new Judged(limit, figure, Verdicts.judge(figure, limit.upperBound(), rule));
  }
}
