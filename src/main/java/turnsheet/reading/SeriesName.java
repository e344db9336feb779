package turnsheet.reading;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;

/** The curves kept beside a reading. */
public enum SeriesName {
  /** speed in percent of nominal over seconds */
  TRACE("s", "%"),
  /** peak in percent of the mean speed over hertz */
  SPECTRUM("Hz", "%"),
  /** periods counted in classes of microseconds; tachometers and edges only */
  HISTOGRAM("µs", "");

  private final String xUnit;
  private final String yUnit;

  SeriesName(String xUnit, String yUnit) {
    this.xUnit = xUnit;
    this.yUnit = yUnit;
  }

  /** Its word in addresses and in the database. */
  public String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  public String xUnit() {
    return xUnit;
  }

  public String yUnit() {
    return yUnit;
  }

  public static Optional<SeriesName> of(String word) {
    return Arrays.stream(values()).filter(n -> n.word().equals(word)).findFirst();
  }
}
