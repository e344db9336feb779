package turnsheet.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.core.diagnose.Difference;
import turnsheet.core.diagnose.Run;
import turnsheet.core.diagnose.Runs;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Reading;
import turnsheet.reading.Judged;
import turnsheet.reading.VisitReading;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSetting;

/**
 * The newest reading of each condition at one speed setting and of one kind.
 *
 * @param before as received
 * @param after after the repair
 * @param figures those that at least one side has, in the order of the result contract
 * @param cautions why the two may not be comparable; empty where nothing speaks against it
 */
public record SheetPair(
    SpeedSetting setting,
    VisitReading before,
    VisitReading after,
    List<Comparison> figures,
    List<Caution> cautions) {

  /** What makes a pair less comparable than it looks. */
  public enum Caution {
    /** the two captures differ in length by more than a factor of two */
    LENGTH,
    /** the figures were made by different method versions */
    METHOD,
    /** the two were recorded by clocks or media of different standing */
    SETTINGS
  }

  private static final double LENGTH_RATIO = 2;

  public SheetPair {
    figures = List.copyOf(figures);
    cautions = List.copyOf(cautions);
  }

  static SheetPair of(
      SpeedSetting setting,
      List<ServiceLimit> limits,
      DecisionRule rule,
      VisitReading before,
      VisitReading after) {
    Reading from = before.stored().reading();
    Reading to = after.stored().reading();
    List<Judged> judgedFrom = Judged.all(limits, name -> name.of(from), rule);
    List<Judged> judgedTo = Judged.all(limits, name -> name.of(to), rule);
    List<Comparison> figures = new ArrayList<>();
    for (FigureName name : FigureName.values()) {
      Figure one = name.of(from);
      Figure other = name.of(to);
      if (one.value() != null || other.value() != null) {
        figures.add(
            new Comparison(
                name,
                one,
                other,
                judged(judgedFrom, name),
                judged(judgedTo, name),
                Difference.of(run(name, one), run(name, other), 0)));
      }
    }
    return new SheetPair(setting, before, after, figures, cautions(from, to));
  }

  private static Runs run(FigureName name, Figure figure) {
    return new Runs(List.of(Run.of(name, figure, null, Set.of())));
  }

  private static List<Caution> cautions(Reading from, Reading to) {
    List<Caution> cautions = new ArrayList<>();
    double ratio = from.source().durationSeconds() / to.source().durationSeconds();
    if (ratio > LENGTH_RATIO || ratio < 1 / LENGTH_RATIO) {
      cautions.add(Caution.LENGTH);
    }
    if (!from.method().version().equals(to.method().version())) {
      cautions.add(Caution.METHOD);
    }
    if (!from.method()
        .settings()
        .equals(to.method().settings().onChannel(from.source().channel()))) {
      cautions.add(Caution.SETTINGS);
    }
    return cautions;
  }

  private static @Nullable Judged judged(List<Judged> all, FigureName name) {
    return all.stream().filter(j -> j.limit().figure() == name).findFirst().orElse(null);
  }
}
