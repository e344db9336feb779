package turnsheet.report.web;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.Difference;
import turnsheet.core.diagnose.LineChange;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.report.SheetPair;
import turnsheet.report.SheetPair.Comparison;
import turnsheet.report.SheetSide;
import turnsheet.report.SheetSingle;
import turnsheet.report.StatedFigure;
import turnsheet.web.Numbers;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Puts the pairs and singles of a sheet into words. */
final class SheetParts {

  private static final int SHORT_HASH = 12;
  private static final int MOST_LINES = 8;
  private static final String NO_VALUE = "–";

  private final Wording words;
  private final Times times;
  private final Locale locale;

  SheetParts(Wording words, Times times, Locale locale) {
    this.words = words;
    this.times = times;
    this.locale = locale;
  }

  SheetPage.Pair pair(SheetPair pair) {
    List<SheetPage.Recording> recordings = new ArrayList<>(recordings(pair.before()));
    recordings.addAll(recordings(pair.after()));
    return new SheetPage.Pair(
        pair.setting(),
        kind(pair.kind()),
        sentence(pair),
        remarks(pair),
        times.day(pair.before().newest().receivedAt(), locale),
        times.day(pair.after().newest().receivedAt(), locale),
        pair.figures().stream().map(this::row).toList(),
        new OverlaidSpectra(words).draw(pair.before().spectrum(), pair.after().spectrum()),
        pair.lines().stream().limit(MOST_LINES).map(this::line).toList(),
        recordings);
  }

  SheetPage.Single single(SheetSingle single) {
    return new SheetPage.Single(
        single.setting(),
        kind(single.kind()),
        condition(single.side().condition()),
        single.figures().stream()
            .map(
                f ->
                    new SheetPage.SingleRow(
                        words.nameOf(f.name()),
                        cell(f.name(), f.stated()),
                        limit(f.name(), f.stated().limit()),
                        origin(f.stated().limit())))
            .toList(),
        recordings(single.side()));
  }

  /** The flutter figure that has a limit, else the two-sigma figure, decides the sentence. */
  private String sentence(SheetPair pair) {
    List<Comparison> steady =
        pair.figures().stream()
            .filter(c -> c.name() != FigureName.DEVIATION && c.name() != FigureName.DRIFT)
            .toList();
    Comparison headline =
        steady.stream()
            .filter(c -> c.after().limit() != null)
            .findFirst()
            .or(
                () ->
                    steady.stream()
                        .filter(c -> c.name() == FigureName.WEIGHTED_TWO_SIGMA)
                        .findFirst())
            .orElse(pair.figures().get(0));
    return words.text(
        "report.sentence." + change(headline.difference()),
        words.nameOf(headline.name()),
        shown(headline.name(), headline.before().figure()),
        shown(headline.name(), headline.after().figure()));
  }

  private List<String> remarks(SheetPair pair) {
    List<String> remarks = new ArrayList<>();
    pair.cautions()
        .forEach(
            c -> remarks.add(words.text("report.caution." + c.name().toLowerCase(Locale.ROOT))));
    boolean betweenRuns = pair.figures().stream().anyMatch(c -> c.difference().betweenRuns());
    remarks.add(
        betweenRuns
            ? words.text(
                "report.runs.included",
                Integer.toString(pair.before().runs().size()),
                Integer.toString(pair.after().runs().size()))
            : words.text("report.runs.left"));
    return remarks;
  }

  private SheetPage.Row row(Comparison c) {
    StatedFigure.Limit limit = c.after().limit() != null ? c.after().limit() : c.before().limit();
    return new SheetPage.Row(
        words.nameOf(c.name()),
        cell(c.name(), c.before()),
        cell(c.name(), c.after()),
        limit(c.name(), limit),
        origin(limit),
        breakable(
            words
                .numbers()
                .show(c.difference().difference(), c.name().unit(), Numbers.Sign.SHOWN)
                .text()),
        change(c.difference()));
  }

  private SheetPage.Cell cell(FigureName name, StatedFigure stated) {
    StatedFigure.Limit limit = stated.limit();
    Double spread = stated.spread();
    Double worst = stated.worst();
    String more =
        spread == null || worst == null
            ? ""
            : words.text(
                "report.runs.pooled", plain(name, spread, false), plain(name, worst, true));
    return new SheetPage.Cell(
        shown(name, stated.figure()),
        more,
        limit == null ? null : limit.judgement().verdict().name().toLowerCase(Locale.ROOT),
        limit == null ? "" : words.probability(limit.judgement()),
        limit == null || limit.judgement().why() == null ? null : undecided(limit));
  }

  /** The figure's own reason is the bench's business and in its words; a customer is told less. */
  private @Nullable String undecided(StatedFigure.Limit limit) {
    return limit.judgement().detail() != null
        ? words.text("report.undecided.uncertainty")
        : words.undecided(limit.judgement());
  }

  private String shown(FigureName name, Figure figure) {
    return figure.value() == null ? NO_VALUE : breakable(words.show(name, figure).text());
  }

  /** A narrow column may break before the sign of the uncertainty. */
  private static String breakable(String text) {
    return text.replace("\u202f±", " ±");
  }

  private String plain(FigureName name, double value, boolean signed) {
    return words
        .numbers()
        .show(value, null, name.unit(), signed ? Wording.signOf(name) : Numbers.Sign.PLAIN)
        .text();
  }

  private SheetPage.Line line(LineChange line) {
    return new SheetPage.Line(
        words.numbers().fixed(line.rateHz(), 2) + "\u202fHz",
        peak(line.before()),
        peak(line.after()),
        line.fate().name().toLowerCase(Locale.ROOT),
        line.part() == null ? "" : line.part());
  }

  private String peak(@Nullable Figure figure) {
    return figure == null || figure.value() == null
        ? NO_VALUE
        : words.numbers().show(figure, "%", Numbers.Sign.PLAIN).text();
  }

  private List<SheetPage.Recording> recordings(SheetSide side) {
    return side.runs().stream()
        .map(
            run ->
                new SheetPage.Recording(
                    condition(side.condition()), recording(run), "/readings/" + run.readingId()))
        .toList();
  }

  private String recording(SheetSide.Run run) {
    String unknown = words.text("report.recording.unknown");
    // practice names beside a tone's figures how it came onto what was played
    String tone =
        run.settings().kind() == CaptureKind.TONE
            ? words.text(
                "report.recording.tone",
                run.method() == null
                    ? unknown
                    : words.text("report.recording.tone." + run.method().word()))
            : "";
    return words.text(
        "report.recording",
        run.fileName(),
        run.sha256().substring(0, SHORT_HASH),
        times.day(run.receivedAt(), locale),
        words.numbers().fixed(run.durationSeconds(), 1),
        Objects.requireNonNullElse(run.instrument(), unknown),
        Objects.requireNonNullElse(run.medium(), unknown),
        tone,
        run.methodVersion());
  }

  private String condition(String condition) {
    return condition(words, condition);
  }

  /** The two usual conditions in the language of the sheet, a free label as it is. */
  static String condition(Wording words, String condition) {
    return switch (condition) {
      case "as received" -> words.text("report.column.before");
      case "after repair" -> words.text("report.column.after");
      default -> condition;
    };
  }

  private String kind(CaptureKind kind) {
    return words.text("report.kind." + kind.name().toLowerCase(Locale.ROOT));
  }

  private String limit(FigureName name, StatedFigure.@Nullable Limit limit) {
    return limit == null ? "" : words.limit(name, limit.upperBound());
  }

  private static String origin(StatedFigure.@Nullable Limit limit) {
    return limit == null ? "" : limit.origin();
  }

  private static String change(Difference difference) {
    return switch (difference.change()) {
      case IMPROVED -> "improved";
      case WORSE -> "worse";
      case TOO_SMALL_TO_MATTER -> "small";
      case NO_CHANGE_SHOWN -> "same";
    };
  }
}
