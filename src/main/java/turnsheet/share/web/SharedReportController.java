package turnsheet.share.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.time.Instant;
import java.util.Locale;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import turnsheet.reading.web.HistorySheets;
import turnsheet.report.Issue;
import turnsheet.report.Report;
import turnsheet.report.Reports;
import turnsheet.report.Sheet;
import turnsheet.report.web.SheetPrinting;
import turnsheet.share.ShareDesk;
import turnsheet.share.ShareLink;
import turnsheet.share.ShareLinks;
import turnsheet.shop.UnitId;
import turnsheet.shop.Visits;
import turnsheet.web.PageLanguage;
import turnsheet.web.Times;

/**
 * What a customer sees: one report, its PDF, and the revision that took its place if there is one;
 * nothing else. An unknown, expired or withdrawn link looks the same, so that trying tokens tells
 * nothing.
 */
@Controller
class SharedReportController {

  private final ShareLinks links;
  private final Reports reports;
  private final SheetPrinting printing;
  private final Visits visits;
  private final HistorySheets histories;
  private final Times times;

  SharedReportController(
      ShareLinks links,
      Reports reports,
      SheetPrinting printing,
      Visits visits,
      HistorySheets histories,
      Times times) {
    this.links = links;
    this.reports = reports;
    this.printing = printing;
    this.visits = visits;
    this.histories = histories;
    this.times = times;
  }

  @GetMapping(ShareDesk.PATH + "{token}")
  String show(
      @PathVariable String token,
      Model model,
      HttpServletRequest request,
      HttpServletResponse response) {
    ShareLink link = links.open(token).orElse(null);
    return page(token, link, report(link), model, request, response);
  }

  /** The report that is current today, where the one that the link was made for was revised. */
  @GetMapping(ShareDesk.PATH + "{token}/current")
  String current(
      @PathVariable String token,
      Model model,
      HttpServletRequest request,
      HttpServletResponse response) {
    ShareLink link = links.peek(token).orElse(null);
    return page(token, link, report(link).map(this::newest), model, request, response);
  }

  /** The unit over the years, where the shop allows it for this link. */
  @GetMapping(ShareDesk.PATH + "{token}/history")
  String history(
      @PathVariable String token,
      Model model,
      HttpServletRequest request,
      HttpServletResponse response) {
    ShareLink link = links.peek(token).filter(ShareLink::showsHistory).orElse(null);
    Report report = report(link).orElse(null);
    if (report == null) {
      return gone(request, response);
    }
    keepPrivate(response);
    Locale locale = inLanguageOf(report);
    Sheet sheet = report.content().sheet();
    Instant issued = report.content().issue().issuedAt();
    UnitId unit = visits.find(report.visitId()).orElseThrow().unitId();
    model.addAttribute("unit", sheet.item().modelName() + ", " + sheet.item().serialNumber());
    model.addAttribute("shopName", sheet.shop().name());
    model.addAttribute("until", times.day(issued, locale));
    model.addAttribute("printedNumber", Issue.printed(report.number()));
    model.addAttribute("back", ShareDesk.PATH + token);
    model.addAttribute("drawings", histories.of(unit, issued, locale));
    return "share/history";
  }

  @GetMapping(ShareDesk.PATH + "{token}/pdf")
  Object pdf(@PathVariable String token, HttpServletRequest request, HttpServletResponse response) {
    return pdf(links.peek(token).map(ShareLink::reportNumber), request, response);
  }

  @GetMapping(ShareDesk.PATH + "{token}/current/pdf")
  Object currentPdf(
      @PathVariable String token, HttpServletRequest request, HttpServletResponse response) {
    return pdf(
        report(links.peek(token).orElse(null)).map(this::newest).map(Report::number),
        request,
        response);
  }

  private String page(
      String token,
      @Nullable ShareLink link,
      Optional<Report> found,
      Model model,
      HttpServletRequest request,
      HttpServletResponse response) {
    Report report = found.orElse(null);
    if (link == null || report == null) {
      return gone(request, response);
    }
    keepPrivate(response);
    Locale locale = inLanguageOf(report);
    String here = ShareDesk.PATH + token;
    model.addAttribute("article", printing.article(report));
    model.addAttribute("title", report.content().issue().printedNumber());
    model.addAttribute("shopName", report.content().sheet().shop().name());
    model.addAttribute("until", times.day(link.expiresAt(), locale));
    model.addAttribute(
        "pdf", report.number() == link.reportNumber() ? here + "/pdf" : here + "/current/pdf");
    model.addAttribute("current", here + "/current");
    model.addAttribute("history", link.showsHistory() ? here + "/history" : "");
    model.addAttribute(
        "replacedBy", report.replacedBy() == null ? "" : Issue.printed(report.replacedBy()));
    return "share/report";
  }

  private static String gone(HttpServletRequest request, HttpServletResponse response) {
    PageLanguage.useBrowsers(request.getLocale());
    keepPrivate(response);
    response.setStatus(HttpStatus.NOT_FOUND.value());
    return "share/gone";
  }

  /** The page around a report speaks as the report does. */
  private static Locale inLanguageOf(Report report) {
    Locale locale = PageLanguage.of(report.content().issue().language());
    PageLanguage.use(locale);
    return locale;
  }

  private static void keepPrivate(HttpServletResponse response) {
    response.setHeader("X-Robots-Tag", "noindex, nofollow");
    response.setHeader("Referrer-Policy", "no-referrer");
    response.setHeader("Cache-Control", "no-store");
  }

  /** The file, or the page that says that the link opens nothing. */
  private Object pdf(
      Optional<Long> number, HttpServletRequest request, HttpServletResponse response) {
    return number
        .flatMap(n -> reports.pdf(n, printing::pdf))
        .<Object>map(
            pdf ->
                ResponseEntity.ok()
                    .contentType(MediaType.APPLICATION_PDF)
                    .header("X-Robots-Tag", "noindex, nofollow")
                    .header("Cache-Control", "no-store")
                    .body(pdf))
        .orElseGet(() -> gone(request, response));
  }

  private Optional<Report> report(@Nullable ShareLink link) {
    return link == null ? Optional.empty() : reports.find(link.reportNumber());
  }

  private Report newest(Report report) {
    Report newest = report;
    while (newest.replacedBy() != null) {
      newest = reports.find(newest.replacedBy()).orElseThrow();
    }
    return newest;
  }
}
