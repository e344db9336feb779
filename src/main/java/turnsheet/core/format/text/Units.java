package turnsheet.core.format.text;

import java.util.Locale;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** Units as table headers write them. */
final class Units {

  private static final Map<String, Double> SECONDS =
      Map.ofEntries(
          Map.entry("s", 1.0),
          Map.entry("sec", 1.0),
          Map.entry("secs", 1.0),
          Map.entry("second", 1.0),
          Map.entry("seconds", 1.0),
          Map.entry("ms", 1e-3),
          Map.entry("msec", 1e-3),
          Map.entry("millis", 1e-3),
          Map.entry("millisecond", 1e-3),
          Map.entry("milliseconds", 1e-3),
          Map.entry("us", 1e-6),
          Map.entry("usec", 1e-6),
          Map.entry("micros", 1e-6),
          Map.entry("microsecond", 1e-6),
          Map.entry("microseconds", 1e-6),
          Map.entry("ns", 1e-9),
          Map.entry("nsec", 1e-9),
          Map.entry("nanos", 1e-9),
          Map.entry("nanosecond", 1e-9),
          Map.entry("nanoseconds", 1e-9),
          Map.entry("ps", 1e-12));

  private static final Map<String, Double> HERTZ =
      Map.ofEntries(
          Map.entry("hz", 1.0),
          Map.entry("khz", 1e3),
          Map.entry("mhz", 1e6),
          Map.entry("ghz", 1e9),
          Map.entry("s/s", 1.0),
          Map.entry("sps", 1.0),
          Map.entry("sa/s", 1.0),
          Map.entry("samples/s", 1.0),
          Map.entry("ksps", 1e3),
          Map.entry("ks/s", 1e3),
          Map.entry("ksa/s", 1e3),
          Map.entry("ms/s", 1e6),
          Map.entry("msa/s", 1e6),
          Map.entry("gsa/s", 1e9));

  private Units() {}

  /** Seconds in one unit of time; null for other words. */
  static @Nullable Double seconds(String word) {
    return SECONDS.get(plain(word));
  }

  /** Hertz in one unit of rate; null for other words. */
  static @Nullable Double hertz(String word) {
    return HERTZ.get(plain(word));
  }

  /** Whether a cell is a unit of its own, as units rows have them. */
  static boolean isUnit(String cell) {
    String word = plain(bare(cell));
    return SECONDS.containsKey(word)
        || HERTZ.containsKey(word)
        || word.matches("[muk]?(v|volts?|a|amps?|amperes?|w|watts?|pa|g|rpm|%|db|lsb|counts?|deg)");
  }

  /** A word without brackets around it. */
  static String bare(String cell) {
    String word = cell.strip();
    boolean bracketed =
        word.length() > 2
            && ((word.startsWith("[") && word.endsWith("]"))
                || (word.startsWith("(") && word.endsWith(")")));
    return bracketed ? word.substring(1, word.length() - 1).strip() : word;
  }

  /** A unit of time as people write it. */
  static String name(double seconds) {
    if (seconds == 1) {
      return "s";
    } else if (seconds == 1e-3) {
      return "ms";
    } else if (seconds == 1e-6) {
      return "µs";
    } else if (seconds == 1e-9) {
      return "ns";
    }
    return seconds + " s";
  }

  private static String plain(String word) {
    return word.strip().replace('µ', 'u').replace('\u03bc', 'u').toLowerCase(Locale.ROOT);
  }
}
