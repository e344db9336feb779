package turnsheet.reading.web;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.parts.ExpectedRate;
import turnsheet.core.diagnose.parts.Explanation;
import turnsheet.core.diagnose.parts.LineFinding;
import turnsheet.core.diagnose.parts.LockVerdict;
import turnsheet.core.diagnose.parts.RankedSuspect;
import turnsheet.core.diagnose.parts.Turning;
import turnsheet.core.measure.Reading;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** Says in words what was found behind lines. */
final class CauseWords {

  private static final Numbers.Sign PLAIN = Numbers.Sign.PLAIN;
  private static final int PLACES = 3;
  private static final double VERY_LIKELY = 0.95;
  private static final double LIKELY = 0.5;
  private static final double WORTH_SAYING = 0.05;
  private static final int MOST_ROWS = 6;

  private final Wording words;

  CauseWords(Wording words) {
    this.words = words;
  }

  /** A suspect of the contract, in one line of the table of lines. */
  String shortly(Reading.Suspect suspect) {
    String rate = words.numbers().fixed(suspect.rateHz(), 2);
    String cause = suspect.cause();
    if (cause != null && !cause.equals("turn")) {
      Integer side = suspect.sideband();
      String what = what(cause, suspect.harmonic(), side == null ? 0 : side);
      return words.text("causes.suspect.other", name(suspect.part(), cause), what, rate);
    }
    return suspect.harmonic() == 1
        ? words.text("reading.suspect.own", suspect.part(), rate)
        : words.text(
            "reading.suspect.harmonic", suspect.part(), Integer.toString(suspect.harmonic()), rate);
  }

  CausePage.Line line(LineFinding finding) {
    return new CausePage.Line(
        summary(finding),
        finding.suspects().stream().limit(MOST_ROWS).map(this::row).toList(),
        sentences(finding),
        words.text("causes.advice." + finding.advice().name()));
  }

  private String summary(LineFinding finding) {
    String rate = words.numbers().fixed(finding.rateHz(), 2);
    if (finding.suspects().isEmpty()) {
      return words.text("causes.summary.none", rate);
    }
    String first = name(finding.suspects().get(0));
    if (finding.ambiguous()) {
      return words.text("causes.summary.several", rate, first, others(finding));
    }
    double p = finding.firstProbability();
    String percent = percent(p);
    if (p >= VERY_LIKELY) {
      return words.text("causes.summary.veryLikely", rate, first, percent);
    }
    return p >= LIKELY
        ? words.text("causes.summary.likely", rate, first, percent)
        : words.text("causes.summary.possible", rate, first, percent);
  }

  private CausePage.Row row(RankedSuspect suspect) {
    Numbers numbers = words.numbers();
    ExpectedRate expected = suspect.expected();
    Turning rate = expected.rate();
    String range =
        rate.isRange()
            ? hertz(rate.lowHertz()) + " \u2013 " + hertz(rate.highHertz())
            : hertz(rate.hertz());
    double mismatch = suspect.mismatchHz();
    return new CausePage.Row(
        name(suspect),
        what(expected.cause().word(), expected.harmonic(), expected.sideband()),
        range,
        hertz(rate.limitHertz()),
        (mismatch > 0 ? "+" : "") + numbers.fixed(mismatch, PLACES),
        hertz(suspect.toleranceHz()),
        percent(suspect.probability()));
  }

  private List<String> sentences(LineFinding finding) {
    List<String> said = new ArrayList<>();
    if (finding.ambiguous()) {
      said.add(doubt(finding));
    }
    if (finding.lock() != LockVerdict.NEITHER) {
      said.add(words.text("causes.lock." + finding.lock().name()));
    }
    if (!finding.suspects().isEmpty() && finding.unknownProbability() > WORTH_SAYING) {
      said.add(words.text("causes.unknown", percent(finding.unknownProbability())));
    }
    Explanation explanation = finding.explanation();
    if (explanation != null) {
      said.addAll(explained(explanation));
    }
    return said;
  }

  private String doubt(LineFinding finding) {
    String first = name(finding.suspects().get(0));
    double rate = finding.suspects().get(0).expected().rate().hertz();
    boolean oneRate =
        finding.suspects().stream()
            .filter(s -> finding.rivals().contains(s.part()))
            .allMatch(s -> Math.abs(s.expected().rate().hertz() - rate) < 1e-9 * rate);
    return oneRate
        ? words.text("causes.doubt.oneRate", first, others(finding))
        : words.text("causes.doubt", hertz(finding.resolutionHz()), first, others(finding));
  }

  private List<String> explained(Explanation e) {
    List<String> said = new ArrayList<>();
    Double diameter = e.diameterMm();
    if (diameter != null) {
      said.add(
          words.text("causes.explain.diameter", amount(diameter, e.diameterUncertaintyMm(), "mm")));
    }
    Double ratio = e.ratio();
    String reference = e.reference();
    if (ratio != null && reference != null) {
      said.add(
          words.text("causes.explain.ratio", amount(ratio, e.ratioUncertainty(), ""), reference));
      OptionalInt whole = e.wholeNumber();
      if (whole.isPresent()) {
        said.add(words.text("causes.explain.whole", Integer.toString(whole.getAsInt()), reference));
      }
    }
    return said;
  }

  private String amount(double value, @Nullable Double uncertainty, String unit) {
    return words.numbers().show(value, uncertainty, unit, PLAIN).text();
  }

  private String others(LineFinding finding) {
    return String.join(
        ", ",
        finding.rivals().stream()
            .map(
                rival ->
                    finding.suspects().stream()
                        .filter(s -> s.part().equals(rival))
                        .findFirst()
                        .map(this::name)
                        .orElse(rival))
            .toList());
  }

  private String name(RankedSuspect suspect) {
    return name(suspect.part(), suspect.expected().cause().word());
  }

  /** Hum has no name of the bench's. */
  private String name(String part, String cause) {
    return cause.equals("hum") ? words.text("causes.hum") : part;
  }

  private String what(String cause, int harmonic, int sideband) {
    String times = Integer.toString(harmonic);
    if (sideband != 0) {
      String beside = (sideband > 0 ? "+" : "\u2212") + Math.abs(sideband);
      return words.text("causes.side." + cause, times, beside);
    }
    return words.text("causes.what." + cause, times);
  }

  private String hertz(double value) {
    return words.numbers().fixed(value, PLACES);
  }

  /** Never all or nothing: the list of parts may lack one. */
  private String percent(double probability) {
    long percent = Math.round(100 * probability);
    return Long.toString(Math.min(99, Math.max(1, percent)));
  }
}
