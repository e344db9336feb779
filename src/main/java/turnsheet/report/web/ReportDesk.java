package turnsheet.report.web;

import java.time.Clock;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.Set;
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
import turnsheet.web.OvertakenException;
import turnsheet.web.PlainText;
import turnsheet.web.RefusedRequestException;

/** Issues and revises reports in the name of an owner, and keeps a record of it. */
@Service
public class ReportDesk {

  static final int NAME_LENGTH = 120;
  static final int CONDITIONS_LENGTH = 1000;
  static final int REMARKS_LENGTH = 2000;
  static final int REASON_LENGTH = 1000;

  private static final Set<String> LANGUAGES = Set.of("en", "de");

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
      @Nullable String language,
      @Nullable String measuredBy,
      @Nullable String releasedBy,
      @Nullable String conditions,
      @Nullable String remarks) {

    /** Whichever way a wish came: what is issued cannot be mended. */
    private Issue issue(
        long number, Instant at, String paper, @Nullable Long revises, String reason) {
      if (language == null || !LANGUAGES.contains(language)) {
        throw incomplete("language is en or de");
      }
      return new Issue(
          number,
          at,
          language,
          paper,
          required("measuredBy", measuredBy),
          required("releasedBy", releasedBy),
          text("conditions", conditions, CONDITIONS_LENGTH),
          text("remarks", remarks, REMARKS_LENGTH),
          revises,
          text("reason", reason, REASON_LENGTH));
    }

    private static String required(String name, @Nullable String given) {
      String text = text(name, given, NAME_LENGTH);
      if (text.isEmpty()) {
        throw incomplete(name + " must not be empty");
      }
      return text;
    }

    private static String text(String name, @Nullable String given, int longest) {
      String text = PlainText.typed(given);
      if (text.length() > longest) {
        throw incomplete(name + " has more than " + longest + " characters");
      }
      return text;
    }

    private static RefusedRequestException incomplete(String what) {
      return new RefusedRequestException(
          "reportIncomplete", "The report cannot be issued like this: " + what + ".");
    }
  }

  /**
   * Issues the sheet of a visit as it stands now.
   *
   * @throws RefusedRequestException {@code nothingMeasured} where the sheet is empty
   * @throws OvertakenException {@code reportStands} where the visit has a report already, which is
   *     to be revised instead
   * @throws AccessDeniedException if whoever asks is not an owner
   */
  @Transactional
  public Report issue(VisitId visit, Wish wish) {
    reports.awaitTurn();
    Reports.Entry standing =
        reports.ofVisit(visit).stream()
            .filter(e -> e.replacedBy() == null)
            .findFirst()
            .orElse(null);
    if (standing != null) {
      throw new OvertakenException(
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
   * @throws OvertakenException {@code reportReplaced} where a revision of it was issued before
   * @throws RefusedRequestException {@code reasonMissing} without a reason
   */
  @Transactional
  public Report revise(long number, Wish wish, String reason) {
    reports.awaitTurn();
    Report old = reports.find(number).orElseThrow(() -> new NotFoundException("report"));
    if (old.replacedBy() != null) {
      throw new OvertakenException(
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
    if (!user.isOwner() && !user.isService()) {
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
                    wish.issue(
                        number,
                        clock.instant().truncatedTo(ChronoUnit.MICROS),
                        preferences.get().paper().css(),
                        revises,
                        reason),
                    sheet),
            printing::pdf);
    audit.record("report.audit.issued", report.content().issue().printedNumber());
    return report;
  }
}
