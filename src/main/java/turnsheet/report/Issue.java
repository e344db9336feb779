package turnsheet.report;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * Under what a report was issued.
 *
 * @param number runs without a gap through all reports of the shop
 * @param language {@code en} or {@code de}
 * @param paper that it is printed on, as CSS names it: {@code A4} or {@code letter}
 * @param measuredBy who did the work
 * @param releasedBy who answers for the report
 * @param conditions of the test: mains, room, warming up; may be empty
 * @param remarks anything added, departed from or left out; may be empty
 * @param revises number of the report that this one takes the place of; null for a first one
 * @param reason why it was revised; empty for a first one
 */
public record Issue(
    long number,
    Instant issuedAt,
    String language,
    String paper,
    String measuredBy,
    String releasedBy,
    String conditions,
    String remarks,
    @Nullable Long revises,
    String reason) {

  /** As it is printed: five digits or more. */
  public String printedNumber() {
    return printed(number);
  }

  /** A report's number as it is printed. */
  public static String printed(long number) {
    return "%05d".formatted(number);
  }
}
