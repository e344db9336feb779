package turnsheet.pair.web;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.core.diagnose.pair.PairFindings;
import turnsheet.core.signal.Warning;
import turnsheet.job.Job;
import turnsheet.job.JobState;
import turnsheet.pair.PairOrder;
import turnsheet.pair.PairSheet;
import turnsheet.pair.Pairs;
import turnsheet.pair.StoredPair;
import turnsheet.web.Crumb;
import turnsheet.web.Numbers;
import turnsheet.web.Times;
import turnsheet.web.Wording;

/** Puts the sheet of two sensors into words. */
@Component
class PairSheetView {

  private final Pairs pairs;
  private final MessageSource messages;
  private final Times times;

  PairSheetView(Pairs pairs, MessageSource messages, Times times) {
    this.pairs = pairs;
    this.messages = messages;
    this.times = times;
  }

  /**
   * The page.
   *
   * @param inside whether it is shown to who has signed in
   */
  PairSheetPage page(StoredPair pair, Locale locale, boolean inside) {
    Wording words = new Wording(messages, locale);
    PairSheet sheet = pair.sheet();
    Job job = inside && sheet == null ? pairs.job(pair.id()).orElse(null) : null;
    PairFindings findings = sheet == null ? null : sheet.findings();
    PairSheet told = sheet == null || sheet.refusal() != null ? null : sheet;
    String title =
        sheet == null
            ? words.text("sensors.sheet.untitled")
            : words.text("sensors.sheet.title", sheet.machine(), words.said(sheet.setting()));
    return new PairSheetPage(
        pair.id().toString(),
        inside
            ? List.of(
                new Crumb(words.text("sensors.sheet.recording"), "/captures/" + pair.capture()),
                new Crumb(
                    words.text("sensors.order.title"), "/captures/" + pair.capture() + "/pair"))
            : List.of(),
        title,
        words.text("sensors.sheet.made", times.minute(pair.madeAt())),
        job == null || job.state().isOver()
            ? null
            : new PairSheetPage.Underway(job.state() == JobState.RUNNING, job.progress()),
        job != null && job.state() == JobState.FAILED ? job.message() : null,
        sheet == null || sheet.refusal() == null ? null : sheet.refusal().message(),
        pair.order().together(),
        told == null ? "" : PairWords.answer(told, words),
        findings == null ? "" : PairWords.common(findings, words),
        told == null ? List.of() : PairRows.of(told, words),
        findings == null
            ? List.of()
            : findings.warnings().stream().map(Warning::message).map(words::said).toList(),
        findings == null ? null : PairPicture.of(findings, words),
        findings == null ? List.of() : lines(findings, words),
        told == null ? List.of() : facts(told, words),
        told == null ? "" : PairWords.loop(told, words),
        details(pair.order().details(), words),
        inside ? pairs.openLinks(pair.id()) : 0);
  }

  private static List<PairSheetPage.Line> lines(PairFindings findings, Wording words) {
    Numbers numbers = words.numbers();
    List<PairSheetPage.Line> lines = new ArrayList<>();
    for (PairFindings.OwnLine line : findings.ownLines()) {
      Integer multiple = line.turnMultiple();
      String cause =
          multiple != null
              ? words.text("sensors.line.turn", multiple.toString())
              : words.text(line.mains() ? "sensors.line.mains" : "sensors.line.other");
      lines.add(
          new PairSheetPage.Line(
              numbers.fixed(line.rateHz(), 2),
              numbers.show(line.originalPercent(), null, "%", Numbers.Sign.PLAIN).text(),
              numbers.show(line.replacementPercent(), null, "%", Numbers.Sign.PLAIN).text(),
              cause));
    }
    return lines;
  }

  private static List<PairSheetPage.Fact> facts(PairSheet sheet, Wording words) {
    List<PairSheetPage.Fact> facts = new ArrayList<>();
    facts.add(
        new PairSheetPage.Fact(
            words.text("sensors.fact.original"), source(sheet.original(), sheet, true, words)));
    facts.add(
        new PairSheetPage.Fact(
            words.text("sensors.fact.replacement"),
            source(sheet.replacement(), sheet, false, words)));
    PairFindings findings = sheet.findings();
    if (findings != null) {
      Numbers numbers = words.numbers();
      facts.add(
          new PairSheetPage.Fact(
              words.text("sensors.fact.used"),
              words.text(
                  "sensors.fact.used.text",
                  numbers.fixed(findings.secondsUsed(), 1),
                  Integer.toString(findings.segments()),
                  numbers.fixed(findings.stepHz(), 3))));
      facts.add(
          new PairSheetPage.Fact(
              words.text("sensors.fact.band"),
              words.text(
                  "sensors.fact.band.text",
                  numbers.fixed(findings.fromHz(), 2),
                  numbers.fixed(findings.toHz(), 1),
                  numbers.fixed(findings.noiseToHz(), 1))));
    }
    facts.add(new PairSheetPage.Fact(words.text("sensors.fact.method"), sheet.method()));
    return facts;
  }

  private static String source(
      PairSheet.Source source, PairSheet sheet, boolean original, Wording words) {
    PairOrder.Side side = original ? sheet.order().original() : sheet.order().replacement();
    return words.text(
        "sensors.fact.source",
        source.fileName(),
        Integer.toString(side.channel()),
        words.said(source.condition()),
        source.sha256().substring(0, 12));
  }

  private static List<PairSheetPage.Fact> details(PairOrder.Details typed, Wording words) {
    List<PairSheetPage.Fact> facts = new ArrayList<>();
    add(facts, words.text("sensors.order.supply"), typed.supply());
    add(facts, words.text("sensors.order.level"), typed.level());
    add(facts, words.text("sensors.order.output"), typed.output());
    add(facts, words.text("sensors.order.remarks"), typed.remarks());
    return facts;
  }

  private static void add(List<PairSheetPage.Fact> facts, String name, String value) {
    if (!value.isEmpty()) {
      facts.add(new PairSheetPage.Fact(name, value));
    }
  }
}
