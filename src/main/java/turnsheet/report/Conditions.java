package turnsheet.report;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.HashSet;
import java.util.List;
import java.util.Objects;
import java.util.Set;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.Difference;
import turnsheet.core.diagnose.LineChange;
import turnsheet.core.diagnose.Run;
import turnsheet.core.diagnose.Runs;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Reading;
import turnsheet.core.measure.Series;
import turnsheet.reading.Judged;
import turnsheet.reading.ReadingId;
import turnsheet.reading.VisitReading;
import turnsheet.report.SheetPair.Caution;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.ShopRules.Rules;

/** Pools, judges and compares the captures of one speed setting and kind. */
final class Conditions {

  private static final double LENGTH_RATIO = 2;

  private final String setting;
  private final CaptureKind kind;
  private final List<ServiceLimit> limits;
  private final Rules rules;
  private final Function<ReadingId, Series.@Nullable Blocks> blocks;
  private final Function<VisitReading, List<SheetSide.CurvePart>> spectrum;

  Conditions(
      String setting,
      CaptureKind kind,
      List<ServiceLimit> limits,
      Rules rules,
      Function<ReadingId, Series.@Nullable Blocks> blocks,
      Function<VisitReading, List<SheetSide.CurvePart>> spectrum) {
    this.setting = setting;
    this.kind = kind;
    this.limits = limits;
    this.rules = rules;
    this.blocks = blocks;
    this.spectrum = spectrum;
  }

  /** A condition without a partner. */
  SheetSingle single(List<VisitReading> runs) {
    List<SheetSingle.Entry> entries = new ArrayList<>();
    for (FigureName name : FigureName.values()) {
      Runs pooled = runs(name, runs, Set.of());
      if (pooled.figure().value() != null) {
        entries.add(new SheetSingle.Entry(name, stated(name, pooled)));
      }
    }
    return new SheetSingle(setting, kind, side(runs), entries);
  }

  /** Two conditions to be compared; neither is empty. */
  SheetPair pair(List<VisitReading> before, List<VisitReading> after) {
    List<VisitReading> all = new ArrayList<>(before);
    all.addAll(after);
    Set<Run.Common> common = common(all);
    List<SheetPair.Comparison> figures = new ArrayList<>();
    for (FigureName name : FigureName.values()) {
      Runs from = runs(name, before, common);
      Runs to = runs(name, after, common);
      Double value = from.figure().value();
      if (value != null || to.figure().value() != null) {
        figures.add(
            new SheetPair.Comparison(
                name,
                stated(name, from),
                stated(name, to),
                Difference.of(from, to, leastThatMatters(name, value == null ? 0 : value))));
      }
    }
    return new SheetPair(
        setting, kind, side(before), side(after), figures, cautions(all), lines(before, after));
  }

  private Runs runs(FigureName name, List<VisitReading> readings, Set<Run.Common> common) {
    return new Runs(
        readings.stream()
            .map(
                r ->
                    Run.of(
                        name, name.of(r.stored().reading()), blocks.apply(r.stored().id()), common))
            .toList());
  }

  private StatedFigure stated(FigureName name, Runs runs) {
    Figure figure = runs.figure();
    ServiceLimit limit = limits.stream().filter(l -> l.figure() == name).findFirst().orElse(null);
    boolean several = runs.count() > 1 && figure.value() != null;
    return new StatedFigure(
        figure,
        several ? Double.valueOf(runs.spread()) : null,
        several ? Double.valueOf(runs.worst()) : null,
        limit == null || figure.value() == null
            ? null
            : new StatedFigure.Limit(
                limit.upperBound(),
                limit.origin(),
                Judged.of(limit, figure, rules.rule()).judgement()));
  }

  private double leastThatMatters(FigureName name, double before) {
    return switch (name) {
      case DEVIATION, DRIFT -> rules.leastSpeedChangePercent();
      default -> rules.leastFlutterChangePercent() / 100 * Math.abs(before);
    };
  }

  private SheetSide side(List<VisitReading> runs) {
    VisitReading newest = runs.get(runs.size() - 1);
    return new SheetSide(
        newest.condition(), runs.stream().map(Conditions::run).toList(), spectrum.apply(newest));
  }

  private static SheetSide.Run run(VisitReading r) {
    Reading reading = r.stored().reading();
    Reading.Source source = reading.source();
    return new SheetSide.Run(
        r.stored().id().value(),
        r.receivedAt(),
        r.fileName(),
        source.sha256(),
        source.format(),
        source.channel(),
        source.durationSeconds(),
        reading.method().version(),
        reading.method().settings(),
        r.instrument(),
        r.medium(),
        r.method());
  }

  /** What all captures have in common; what nobody said is not. */
  private static Set<Run.Common> common(List<VisitReading> all) {
    Set<Run.Common> common = EnumSet.noneOf(Run.Common.class);
    if (isSame(all, VisitReading::instrument)) {
      common.add(Run.Common.CLOCK);
    }
    if (isSame(all, VisitReading::medium)) {
      common.add(Run.Common.MEDIUM);
    }
    return common;
  }

  private static boolean isSame(
      List<VisitReading> all, Function<VisitReading, ? extends @Nullable Object> what) {
    Set<@Nullable Object> found = new HashSet<>();
    all.forEach(r -> found.add(what.apply(r)));
    return found.size() == 1 && !found.contains(null);
  }

  private List<Caution> cautions(List<VisitReading> all) {
    List<Caution> cautions = new ArrayList<>();
    List<Reading> readings = all.stream().map(r -> r.stored().reading()).toList();
    double longest =
        readings.stream().mapToDouble(r -> r.source().durationSeconds()).max().orElseThrow();
    double shortest =
        readings.stream().mapToDouble(r -> r.source().durationSeconds()).min().orElseThrow();
    if (longest > LENGTH_RATIO * shortest) {
      cautions.add(Caution.LENGTH);
    }
    if (readings.stream().map(r -> r.method().version()).distinct().count() > 1) {
      cautions.add(Caution.METHOD);
    }
    if (!isSame(all, VisitReading::instrument)) {
      cautions.add(Caution.INSTRUMENT);
    }
    if (kind == CaptureKind.TONE && !isSame(all, VisitReading::medium)) {
      cautions.add(Caution.MEDIUM);
    }
    if (kind == CaptureKind.TONE && !isSame(all, VisitReading::method)) {
      cautions.add(Caution.TONE_METHOD);
    }
    if (readings.stream().map(Conditions::expectation).distinct().count() > 1) {
      cautions.add(Caution.SETTINGS);
    }
    return cautions;
  }

  /** What the measuring went by, clock and medium apart, which have cautions of their own. */
  private static List<Object> expectation(Reading reading) {
    var settings = reading.method().settings();
    return List.of(
        settings.nominalHz(),
        settings.searchPercent(),
        Objects.requireNonNullElse(settings.teeth(), 0));
  }

  private static List<LineChange> lines(List<VisitReading> before, List<VisitReading> after) {
    Reading from = before.get(before.size() - 1).stored().reading();
    Reading to = after.get(after.size() - 1).stored().reading();
    Double fromHz = from.speed().meanHz().value();
    Double toHz = to.speed().meanHz().value();
    return LineChange.of(
        from.lines(),
        to.lines(),
        fromHz == null || toHz == null ? 1 : toHz / fromHz,
        Math.min(from.source().durationSeconds(), to.source().durationSeconds()));
  }
}
