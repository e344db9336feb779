package turnsheet.report.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestParam;
import turnsheet.access.Secrets;
import turnsheet.report.Issue;
import turnsheet.report.Report;
import turnsheet.report.Reports;
import turnsheet.web.PageLanguage;
import turnsheet.web.Times;

/**
 * Whether a report that somebody holds was issued here, and whether it is current. It tells the
 * number, the day and the unit, which stand on the paper that bears the code, and no figure.
 */
@Controller
class CheckController {

  static final String PATH = "/check";

  private final Reports reports;
  private final Times times;

  CheckController(Reports reports, Times times) {
    this.reports = reports;
    this.times = times;
  }

  /**
   * What a code has shown.
   *
   * @param intact whether the content is still that of the printed code
   * @param replacedBy printed number; empty while the report is current
   */
  record Outcome(String number, String issued, String unit, boolean intact, String replacedBy) {}

  @GetMapping(PATH)
  String check(
      @RequestParam(required = false) @Nullable String code,
      Model model,
      HttpServletRequest request,
      HttpServletResponse response) {
    PageLanguage.useBrowsers(request.getLocale());
    response.setHeader("X-Robots-Tag", "noindex, nofollow");
    response.setHeader("Referrer-Policy", "no-referrer");
    model.addAttribute("code", code == null ? "" : code);
    if (code != null && !code.isBlank()) {
      model.addAttribute("outcome", reports.byCheckCode(code).map(this::outcome).orElse(null));
      model.addAttribute("asked", true);
    }
    return "report/check";
  }

  private Outcome outcome(Report report) {
    Issue issue = report.content().issue();
    return new Outcome(
        issue.printedNumber(),
        times.day(issue.issuedAt()),
        report.content().sheet().item().modelName()
            + ", "
            + report.content().sheet().item().serialNumber(),
        Secrets.sha256(report.contentJson()).equals(report.contentSha256()),
        report.replacedBy() == null ? "" : Issue.printed(report.replacedBy()));
  }
}
