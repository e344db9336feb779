package turnsheet.share.web;

import jakarta.servlet.http.HttpServletResponse;
import java.util.Locale;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import turnsheet.report.Sheet;
import turnsheet.report.Sheets;
import turnsheet.report.web.SheetPages;
import turnsheet.share.ShareDesk;
import turnsheet.share.ShareLink;
import turnsheet.share.ShareLinks;
import turnsheet.web.Times;

/**
 * What a customer sees: the sheet of one visit and nothing else. An unknown, expired or withdrawn
 * link looks the same, so that trying tokens tells nothing.
 */
@Controller
class SharedSheetController {

  private final ShareLinks links;
  private final Sheets sheets;
  private final SheetPages pages;
  private final Times times;

  SharedSheetController(ShareLinks links, Sheets sheets, SheetPages pages, Times times) {
    this.links = links;
    this.sheets = sheets;
    this.pages = pages;
    this.times = times;
  }

  @GetMapping(ShareDesk.PATH + "{token}")
  String show(
      @PathVariable String token, Model model, Locale locale, HttpServletResponse response) {
    response.setHeader("X-Robots-Tag", "noindex, nofollow");
    response.setHeader("Referrer-Policy", "no-referrer");
    response.setHeader("Cache-Control", "no-store");
    ShareLink link = links.open(token).orElse(null);
    Sheet sheet = link == null ? null : sheets.of(link.visitId()).orElse(null);
    if (link == null || sheet == null) {
      response.setStatus(HttpStatus.NOT_FOUND.value());
      return "share/gone";
    }
    model.addAttribute("sheet", pages.of(sheet, locale));
    model.addAttribute("until", times.day(link.expiresAt()));
    return "share/sheet";
  }
}
