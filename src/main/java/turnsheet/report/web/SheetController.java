package turnsheet.report.web;

import java.util.Locale;
import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import turnsheet.access.CurrentUser;
import turnsheet.report.Reports;
import turnsheet.report.Sheet;
import turnsheet.report.Sheets;
import turnsheet.shop.VisitId;
import turnsheet.web.NotFoundException;
import turnsheet.web.Times;

/** The before/after sheet of a visit as things stand, on screen and on paper. */
@Controller
class SheetController {

  private final Sheets sheets;
  private final SheetPages pages;
  private final Reports reports;
  private final CurrentUser user;
  private final Times times;

  SheetController(Sheets sheets, SheetPages pages, Reports reports, CurrentUser user, Times times) {
    this.sheets = sheets;
    this.pages = pages;
    this.reports = reports;
    this.user = user;
    this.times = times;
  }

  @GetMapping("/visits/{id}/sheet")
  String sheet(@PathVariable UUID id, Model model, Locale locale) {
    VisitId visit = new VisitId(id);
    Sheet sheet = sheets.of(visit).orElseThrow(() -> new NotFoundException("visit"));
    model.addAttribute("visitId", id);
    model.addAttribute("sheet", pages.of(sheet, locale));
    model.addAttribute("empty", sheet.isEmpty());
    model.addAttribute("owner", user.isOwner());
    model.addAttribute(
        "reports", reports.ofVisit(visit).stream().map(e -> ReportRow.of(e, times)).toList());
    return "report/sheet";
  }
}
