package turnsheet.report.web;

import java.util.UUID;
import turnsheet.report.Issue;
import turnsheet.report.Reports;
import turnsheet.web.Times;

/**
 * A report as lists show it.
 *
 * @param replacedBy printed number of the report that took its place; empty while it is current
 */
public record ReportRow(
    long number, String printed, String issued, UUID visitId, String unit, String replacedBy) {

  static ReportRow of(Reports.Entry entry, Times times) {
    return new ReportRow(
        entry.number(),
        Issue.printed(entry.number()),
        times.day(entry.issuedAt()),
        entry.visitId().value(),
        entry.modelName() + ", " + entry.serialNumber(),
        entry.replacedBy() == null ? "" : Issue.printed(entry.replacedBy()));
  }
}
