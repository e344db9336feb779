package turnsheet.pair.web;

import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.Difference;
import turnsheet.core.diagnose.pair.PairFindings;
import turnsheet.core.measure.Figure;
import turnsheet.pair.PairSheet;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** The sentences of the sheet of two sensors. */
final class PairWords {

  private PairWords() {}

  /** Which sensor is quieter, and by how much. */
  static String answer(PairSheet sheet, Wording words) {
    PairFindings findings = sheet.findings();
    return findings == null ? afterwards(sheet, words) : together(findings, words);
  }

  private static String together(PairFindings findings, Wording words) {
    PairFindings.Sensor original = findings.original();
    PairFindings.Sensor replacement = findings.replacement();
    String one = noise(original, words);
    String other = noise(replacement, words);
    Figure ratio = findings.noiseRatio();
    Double value = ratio.value();
    Double u = ratio.expandedUncertainty();
    if (value == null || u == null) {
      Double first = original.edgeNoiseMicroseconds().value();
      Double second = replacement.edgeNoiseMicroseconds().value();
      if (first != null && isBelow(replacement.atMostMicroseconds(), first)) {
        return words.text("sensors.answer.replacementFar", one, other);
      }
      if (second != null && isBelow(original.atMostMicroseconds(), second)) {
        return words.text("sensors.answer.originalFar", one, other);
      }
      return words.text("sensors.answer.untold", one, other);
    }
    if (value - u > 1) {
      return words.text("sensors.answer.replacement", one, other, times(value, u, words));
    }
    if (value + u < 1) {
      double less = 1 / value;
      return words.text("sensors.answer.original", one, other, times(less, u * less * less, words));
    }
    return words.text("sensors.answer.neither", one, other);
  }

  private static boolean isBelow(@Nullable Double limit, double value) {
    return limit != null && limit < value;
  }

  static String times(double value, double uncertainty, Wording words) {
    return words.numbers().show(value, uncertainty, "", Numbers.Sign.PLAIN).text();
  }

  /** The noise of one edge, or what it is below. */
  static String noise(PairFindings.Sensor sensor, Wording words) {
    Double most = sensor.atMostMicroseconds();
    return most == null
        ? words.numbers().show(sensor.edgeNoiseMicroseconds(), "µs", Numbers.Sign.PLAIN).text()
        : words.text(
            "sensors.below", words.numbers().show(most, null, "µs", Numbers.Sign.PLAIN).text());
  }

  private static String afterwards(PairSheet sheet, Wording words) {
    PairSheet.Compared noise = sheet.compared().get(0);
    String one = words.numbers().show(noise.original(), noise.unit(), Numbers.Sign.PLAIN).text();
    String other =
        words.numbers().show(noise.replacement(), noise.unit(), Numbers.Sign.PLAIN).text();
    Difference.Change change = noise.difference().change();
    String said =
        switch (change) {
          case IMPROVED -> words.text("sensors.after.replacement", one, other);
          case WORSE -> words.text("sensors.after.original", one, other);
          case TOO_SMALL_TO_MATTER, NO_CHANGE_SHOWN ->
              words.text("sensors.after.neither", one, other);
        };
    return said
        + " "
        + words.text(
            noise.difference().betweenRuns() ? "sensors.after.runs" : "sensors.after.singleRuns");
  }

  /** What both show. */
  static String common(PairFindings findings, Wording words) {
    Figure plain = findings.commonUnweightedRmsPercent();
    if (plain.value() == null) {
      String why = plain.why();
      return words.text("sensors.common.none", why == null ? "" : words.said(why));
    }
    String unweighted = words.numbers().show(plain, "%", Numbers.Sign.PLAIN).text();
    Figure weighted = findings.commonWeightedRmsPercent();
    return weighted.value() == null
        ? words.text("sensors.common.unweighted", unweighted)
        : words.text(
            "sensors.common.both",
            unweighted,
            words.numbers().show(weighted, "%", Numbers.Sign.PLAIN).text());
  }

  /** What the pulses per turn mean for a loop that holds the speed. */
  static String loop(PairSheet sheet, Wording words) {
    Numbers numbers = words.numbers();
    double one = sheet.original().pulseRateHz();
    double other = sheet.replacement().pulseRateHz();
    return words.text(
        "sensors.loop",
        Integer.toString(sheet.order().original().teeth()),
        Integer.toString(sheet.order().replacement().teeth()),
        rounded(numbers, sheet.original().turnsPerSecond()),
        rounded(numbers, one),
        rounded(numbers, other),
        rounded(numbers, 1000 / one),
        rounded(numbers, 1000 / other));
  }

  private static String rounded(Numbers numbers, double value) {
    return numbers.show(value, null, "", Numbers.Sign.PLAIN).text();
  }
}
