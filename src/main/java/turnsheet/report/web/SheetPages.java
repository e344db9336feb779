package turnsheet.report.web;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.core.diagnose.Difference;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Reading;
import turnsheet.reading.Judged;
import turnsheet.reading.Readings;
import turnsheet.reading.VisitReading;
import turnsheet.report.Comparison;
import turnsheet.report.Sheet;
import turnsheet.report.SheetPair;
import turnsheet.report.SheetSingle;
import turnsheet.shop.ShopRules;
import turnsheet.shop.Visit;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Puts a sheet into words. */
@Component
public class SheetPages {

  private static final int SHORT_HASH = 12;

  private final MessageSource messages;
  private final Times times;
  private final Readings readings;
  private final ShopRules rules;

  SheetPages(MessageSource messages, Times times, Readings readings, ShopRules rules) {
    this.messages = messages;
    this.times = times;
    this.readings = readings;
    this.rules = rules;
  }

  /** The sheet in the language of a reader. */
  public SheetPage of(Sheet sheet, Locale locale) {
    Wording words = new Wording(messages, locale);
    Visit visit = sheet.visit().visit();
    return new SheetPage(
        sheet.shop().name(),
        Arrays.stream(sheet.shop().address().split("\n", -1)).filter(s -> !s.isBlank()).toList(),
        sheet.visit().modelName(),
        sheet.visit().serialNumber(),
        sheet.visit().customerName(),
        times.day(visit.openedAt()),
        visit.closedAt() == null ? "" : times.day(visit.closedAt()),
        visit.complaint(),
        visit.workDone(),
        times.minute(sheet.madeAt()),
        sheet.pairs().stream().map(pair -> pair(words, pair)).toList(),
        sheet.singles().stream().map(single -> single(words, single)).toList(),
        words.rule(rules.get().rule()));
  }

  private SheetPage.Pair pair(Wording words, SheetPair pair) {
    return new SheetPage.Pair(
        pair.setting().label(),
        kind(words, pair.before()),
        sentence(words, pair),
        pair.cautions().stream()
            .map(c -> words.text("report.caution." + c.name().toLowerCase(Locale.ROOT)))
            .toList(),
        side(pair.before()),
        side(pair.after()),
        pair.figures().stream().map(c -> row(words, c)).toList(),
        new OverlaidSpectra(words, readings).draw(pair));
  }

  /** The flutter figure that has a limit, else the two-sigma figure, decides the sentence. */
  private static String sentence(Wording words, SheetPair pair) {
    Comparison headline =
        pair.figures().stream()
            .filter(c -> c.name() != FigureName.DEVIATION && c.name() != FigureName.DRIFT)
            .filter(c -> c.judgedAfter() != null)
            .findFirst()
            .or(
                () ->
                    pair.figures().stream()
                        .filter(c -> c.name() == FigureName.WEIGHTED_TWO_SIGMA)
                        .findFirst())
            .orElse(pair.figures().get(0));
    return words.text(
        "report.sentence." + change(headline.difference()),
        words.nameOf(headline.name()),
        words.show(headline.name(), headline.before()).text(),
        words.show(headline.name(), headline.after()).text());
  }

  private static SheetPage.Row row(Wording words, Comparison c) {
    Judged judged = c.judgedAfter() != null ? c.judgedAfter() : c.judgedBefore();
    return new SheetPage.Row(
        words.nameOf(c.name()),
        words.show(c.name(), c.before()),
        verdict(c.judgedBefore()),
        words.show(c.name(), c.after()),
        verdict(c.judgedAfter()),
        limit(words, judged),
        origin(judged),
        words
            .numbers()
            .show(c.difference().difference(), c.name().unit(), turnsheet.web.Numbers.Sign.SHOWN),
        change(c.difference()));
  }

  private SheetPage.Single single(Wording words, SheetSingle single) {
    Reading reading = single.reading().stored().reading();
    List<SheetPage.SingleRow> rows =
        Arrays.stream(FigureName.values())
            .filter(name -> name.of(reading).value() != null)
            .map(name -> singleRow(words, name, name.of(reading), single.judged()))
            .toList();
    return new SheetPage.Single(
        single.setting().label(),
        kind(words, single.reading()),
        single.reading().condition(),
        side(single.reading()),
        rows);
  }

  private static SheetPage.SingleRow singleRow(
      Wording words, FigureName name, Figure figure, List<Judged> judged) {
    Judged here = judged.stream().filter(j -> j.limit().figure() == name).findFirst().orElse(null);
    return new SheetPage.SingleRow(
        words.nameOf(name),
        words.show(name, figure),
        limit(words, here),
        origin(here),
        verdict(here));
  }

  private SheetPage.Side side(VisitReading reading) {
    Reading measured = reading.stored().reading();
    return new SheetPage.Side(
        times.day(reading.receivedAt()),
        reading.fileName(),
        measured.source().sha256().substring(0, SHORT_HASH),
        measured.method().version(),
        "/readings/" + reading.stored().id().value());
  }

  private static String kind(Wording words, VisitReading reading) {
    return words.text(
        "report.kind."
            + reading.stored().reading().source().kind().name().toLowerCase(Locale.ROOT));
  }

  private static String change(Difference difference) {
    return switch (difference.change()) {
      case IMPROVED -> "improved";
      case WORSE -> "worse";
      case TOO_SMALL_TO_MATTER -> "small";
      case NO_CHANGE_SHOWN -> "same";
    };
  }

  private static String limit(Wording words, @Nullable Judged judged) {
    return judged == null ? "" : words.limit(judged.limit().figure(), judged.limit().upperBound());
  }

  private static String origin(@Nullable Judged judged) {
    return judged == null ? "" : judged.limit().origin();
  }

  private static @Nullable String verdict(@Nullable Judged judged) {
    return judged == null ? null : judged.judgement().verdict().name().toLowerCase(Locale.ROOT);
  }
}
