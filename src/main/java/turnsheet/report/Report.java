package turnsheet.report;

import org.jspecify.annotations.Nullable;
import turnsheet.shop.VisitId;

/**
 * An issued report: never to be changed.
 *
 * @param content what it says
 * @param contentJson the same as it was stored, byte for byte
 * @param checkCode short form of the content's hash, printed on the report
 * @param replacedBy number of the report that took its place; null while it is current
 */
public record Report(
    VisitId visitId,
    Content content,
    String contentJson,
    String contentSha256,
    String checkCode,
    @Nullable Long replacedBy) {

  /** What stands in a report. */
  public record Content(Issue issue, Sheet sheet) {}

  public long number() {
    return content.issue().number();
  }

  public boolean isCurrent() {
    return replacedBy == null;
  }
}
