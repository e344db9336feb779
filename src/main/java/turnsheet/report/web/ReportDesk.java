package turnsheet.report.web;

import java.time.Clock;
import java.time.temporal.ChronoUnit;
import org.jspecify.annotations.Nullable;
import org.springframework.security.access.AccessDeniedException;
import org.springframework.stereotype.Service;
import org.springframework.transaction.annotation.Transactional;
import turnsheet.access.AuditTrail;
import turnsheet.access.CurrentUser;
import turnsheet.access.ShopPreferences;
import turnsheet.report.Issue;
import turnsheet.report.Report;
import turnsheet.report.Reports;
import turnsheet.report.Sheet;
import turnsheet.report.Sheets;
import turnsheet.shop.VisitId;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Issues and revises reports in the name of an owner, and keeps a record of it. */
@Service
public class ReportDesk {

  private final Sheets sheets;
  private final Reports reports;
  private final SheetPrinting printing;
  private final ShopPreferences preferences;
  private final CurrentUser user;
  private final AuditTrail audit;
  private final Clock clock;

  ReportDesk(
      Sheets sheets,
      Reports reports,
      SheetPrinting printing,
      ShopPreferences preferences,
      CurrentUser user,
      AuditTrail audit,
      Clock clock) {
    this.sheets = sheets;
    this.reports = reports;
    this.printing = printing;
    this.preferences = preferences;
    this.user = user;
    this.audit = audit;
    this.clock = clock;
  }

  /**
   * What the issuer adds to the sheet.
   *
   * @param language {@code en} or {@code de}
   */
  public record Wish(
      String language, String measuredBy, String releasedBy, String conditions, String remarks) {}

  /**
   * Issues the sheet of a visit as it stands now.
   *
   * @throws RefusedRequestException {@code nothingMeasured} where the sheet is empty, {@code
   *     reportStands} where the visit has a report already, which is to be revised instead
   * @throws AccessDeniedException if whoever asks is not an owner
   */
  @Transactional
  public Report issue(VisitId visit, Wish wish) {
    Reports.Entry standing =
        reports.ofVisit(visit).stream()
            .filter(e -> e.replacedBy() == null)
            .findFirst()
            .orElse(null);
    if (standing != null) {
      throw new RefusedRequestException(
          "reportStands",
          "Report "
              + Issue.printed(standing.number())
              + " was issued for this visit: revise it, so that both refer to each other.");
    }
    return issue(visit, wish, null, "");
  }

  /**
   * Issues the sheet of the same visit afresh in place of a report.
   *
   * @param reason not blank
   * @throws RefusedRequestException {@code reportReplaced} where a revision of it was issued
   *     before, {@code reasonMissing} without a reason
   */
  @Transactional
  public Report revise(long number, Wish wish, String reason) {
    Report old = reports.find(number).orElseThrow(() -> new NotFoundException("report"));
    if (old.replacedBy() != null) {
      throw new RefusedRequestException(
          "reportReplaced",
          "Report "
              + Issue.printed(old.replacedBy())
              + " has taken the place of this one: revise that.");
    }
    if (reason.isBlank()) {
      throw new RefusedRequestException(
          "reasonMissing", "Say why the report is revised: the reason is printed on the new one.");
    }
    return issue(old.visitId(), wish, number, reason.strip());
  }

  private Report issue(VisitId visit, Wish wish, @Nullable Long revises, String reason) {
    if (!user.isOwner() && !user.signInName().equals(CurrentUser.SERVICE)) {
      throw new AccessDeniedException("reports are issued by an owner");
    }
    Sheet sheet = sheets.of(visit).orElseThrow(() -> new NotFoundException("visit"));
    if (sheet.isEmpty()) {
      throw new RefusedRequestException(
          "nothingMeasured",
          "Nothing has been measured in this visit yet: there is nothing to report.");
    }
    Report report =
        reports.add(
            visit,
            number ->
                new Report.Content(
                    new Issue(
                        number,
                        clock.instant().truncatedTo(ChronoUnit.MICROS),
                        wish.language(),
                        preferences.get().paper().css(),
                        wish.measuredBy().strip(),
                        wish.releasedBy().strip(),
                        wish.conditions().strip(),
                        wish.remarks().strip(),
                        revises,
                        reason),
                    sheet),
            printing::pdf);
    audit.record("report.audit.issued", report.content().issue().printedNumber());
    return report;
  }
}
