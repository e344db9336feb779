package turnsheet.reading;

import java.time.Instant;
import turnsheet.core.stats.TrendLine;

/** What the readings of a unit say about the change of one figure over the years. */
public sealed interface Trend {

  /** With three readings a line has one degree of freedom, and Student's t is 12.7. */
  int LEAST_VISITS = 4;

  /** How many visits have a reading with the figure. */
  int visits();

  /** Fewer than {@link #LEAST_VISITS}. */
  record TooFew(int visits) implements Trend {}

  /**
   * First and last reading lie less than a year apart, so that a rate per year would be guessed.
   */
  record TooShort(int visits) implements Trend {}

  /** The slope cannot be told from none at 95 %. */
  record Unshown(int visits, TrendLine line) implements Trend {}

  /**
   * The figure changes.
   *
   * @param line in the unit of the figure over years after {@code first}
   * @param first reading
   * @param last reading
   */
  record Shown(int visits, TrendLine line, Instant first, Instant last, Outlook outlook)
      implements Trend {}
}
