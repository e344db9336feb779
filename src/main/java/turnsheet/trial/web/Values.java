package turnsheet.trial.web;

import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** Numbers of circuits and trials as people write them. */
final class Values {

  private static final String SPACE = "\u202f";
  private static final String[] PREFIXES = {"p", "n", "µ", "m", "", "k", "M"};

  /** Of the prefix "p". */
  private static final int LOWEST = -12;

  private final Wording words;

  Values(Wording words) {
    this.words = words;
  }

  /** Three significant digits. */
  String three(double value) {
    return words.numbers().show(value, null, "", Numbers.Sign.PLAIN).value();
  }

  String hertz(double value) {
    return three(value);
  }

  /** Decibels to a tenth. */
  String decibels(double value) {
    return words.numbers().fixed(value, 1);
  }

  String ohms(double value) {
    return engineering(value, "Ω");
  }

  String farads(double value) {
    return engineering(value, "F");
  }

  String frequency(double value) {
    return engineering(value, "Hz");
  }

  private String engineering(double value, String unit) {
    // a value just below a step, such as 9.999999e-7, belongs to the step
    int power = (int) Math.floor(Math.log10(value * (1 + 1e-9)) / 3) * 3;
    int at = Math.max(0, Math.min(PREFIXES.length - 1, (power - LOWEST) / 3));
    double scaled = value / Math.pow(10, LOWEST + 3 * at);
    double rounded = Double.parseDouble(String.format(java.util.Locale.ROOT, "%.3g", scaled));
    return words.numbers().plain(rounded) + SPACE + PREFIXES[at] + unit;
  }
}
