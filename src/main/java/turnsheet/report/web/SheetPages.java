package turnsheet.report.web;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.report.Issue;
import turnsheet.report.Report;
import turnsheet.report.Sheet;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Puts a sheet into words, issued or not. */
@Component
public class SheetPages {

  private final MessageSource messages;
  private final Times times;
  private final CheckPrint checks;

  SheetPages(MessageSource messages, Times times, CheckPrint checks) {
    this.messages = messages;
    this.times = times;
    this.checks = checks;
  }

  /** The sheet as things stand, in the language of a reader. */
  public SheetPage of(Sheet sheet, Locale locale) {
    return page(sheet, null, locale);
  }

  /** An issued report in the language that it was issued in. */
  public SheetPage of(Report report) {
    return page(report.content().sheet(), report, Locale.forLanguageTag(issue(report).language()));
  }

  private SheetPage page(Sheet sheet, @Nullable Report report, Locale locale) {
    Wording words = new Wording(messages, locale);
    SheetParts parts = new SheetParts(words, times, locale);
    String title =
        report == null
            ? words.text("report.sheet.title")
            : words.text("report.issued.title", issue(report).printedNumber());
    String identity = sheet.item().modelName() + ", " + sheet.item().serialNumber();
    return new SheetPage(
        locale.getLanguage(),
        report == null ? "" : issue(report).paper(),
        title,
        title + ", " + identity,
        sheet.shop().name(),
        lines(sheet.shop().address()),
        sheet.shop().logo(),
        facts(sheet.item(), report, words, locale),
        sheet.pairs().stream().map(parts::pair).toList(),
        sheet.singles().stream().map(parts::single).toList(),
        notes(sheet, words),
        words.text("report.sheet.care"),
        report == null
            ? words.text("report.sheet.end", identity)
            : words.text("report.issued.end", issue(report).printedNumber(), identity),
        report == null ? null : checks.of(report, words));
  }

  private List<SheetPage.Fact> facts(
      Sheet.Item item, @Nullable Report report, Wording words, Locale locale) {
    List<SheetPage.Fact> facts = new ArrayList<>();
    if (report != null) {
      Issue issue = issue(report);
      add(facts, words, "number", issue.printedNumber());
      add(facts, words, "issued", times.day(issue.issuedAt(), locale));
      if (issue.revises() != null) {
        add(facts, words, "revises", Issue.printed(issue.revises()) + ": " + issue.reason());
      }
    }
    add(
        facts,
        words,
        "unit",
        item.modelName() + "\n" + words.text("report.sheet.serial", item.serialNumber()));
    add(facts, words, "customer", item.customerName() + "\n" + item.customerContact());
    add(
        facts,
        words,
        "stay",
        item.closedAt() == null
            ? words.text("report.sheet.still", times.day(item.openedAt(), locale))
            : times.day(item.openedAt(), locale) + " – " + times.day(item.closedAt(), locale));
    add(facts, words, "complaint", item.complaint());
    add(facts, words, "work", item.workDone());
    add(facts, words, "parts", parts(item));
    if (item.sensor() != null) {
      add(facts, words, "sensor", words.text("report.fact.sensor.replaced") + "\n" + item.sensor());
    }
    if (report != null) {
      Issue issue = issue(report);
      add(facts, words, "conditions", issue.conditions());
      add(facts, words, "measuredBy", issue.measuredBy());
      add(facts, words, "releasedBy", issue.releasedBy());
      add(facts, words, "remarks", issue.remarks());
    }
    return facts;
  }

  /** What nobody wrote is left out. */
  private static void add(List<SheetPage.Fact> facts, Wording words, String key, String text) {
    List<String> lines = lines(text);
    if (!lines.isEmpty()) {
      facts.add(new SheetPage.Fact(words.text("report.fact." + key), lines));
    }
  }

  private static String parts(Sheet.Item item) {
    return item.parts().stream()
        .map(p -> p.quantity() == null ? p.name() : p.quantity() + " × " + p.name())
        .collect(Collectors.joining("\n"));
  }

  private static List<String> lines(String text) {
    return Arrays.stream(text.split("\n", -1)).filter(line -> !line.isBlank()).toList();
  }

  private static List<String> notes(Sheet sheet, Wording words) {
    List<String> notes = new ArrayList<>();
    notes.add(words.text("report.note.method"));
    notes.add(words.text("report.note.uncertainty"));
    if (isJudged(sheet)) {
      notes.add(words.rule(sheet.terms().rule()));
    }
    if (!sheet.pairs().isEmpty()) {
      notes.add(
          words.text(
              "report.note.change",
              words.numbers().plain(sheet.terms().leastFlutterChangePercent()),
              words.numbers().plain(sheet.terms().leastSpeedChangePercent())));
    }
    for (Sheet.LeftOut left : sheet.leftOut()) {
      notes.add(
          words.text(
              "report.note.leftOut",
              left.setting(),
              SheetParts.condition(words, left.condition()),
              left.fileName(),
              left.reason()));
    }
    notes.add(words.text("report.note.customer"));
    notes.add(words.text("report.note.scope"));
    return notes;
  }

  private static boolean isJudged(Sheet sheet) {
    return sheet.pairs().stream()
            .flatMap(p -> p.figures().stream())
            .anyMatch(c -> c.before().limit() != null || c.after().limit() != null)
        || sheet.singles().stream()
            .flatMap(s -> s.figures().stream())
            .anyMatch(f -> f.stated().limit() != null);
  }

  private static Issue issue(Report report) {
    return report.content().issue();
  }
}
