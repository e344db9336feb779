package turnsheet.share.web;

import java.util.List;
import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;
import turnsheet.report.Issue;
import turnsheet.report.Report;
import turnsheet.report.Reports;
import turnsheet.share.ShareDesk;
import turnsheet.share.ShareLink;
import turnsheet.share.ShareLinkId;
import turnsheet.share.ShareLinks;
import turnsheet.web.NotFoundException;
import turnsheet.web.QrDrawing;
import turnsheet.web.Times;

/** The links to one report: make one, see whether it is read, withdraw it. */
@Controller
class LinksController {

  private final ShareDesk desk;
  private final ShareLinks links;
  private final Reports reports;
  private final Times times;

  LinksController(ShareDesk desk, ShareLinks links, Reports reports, Times times) {
    this.desk = desk;
    this.links = links;
    this.reports = reports;
    this.times = times;
  }

  /** One link as the list shows it. */
  record Row(
      UUID id,
      String made,
      String madeBy,
      String until,
      boolean open,
      boolean withdrawn,
      boolean history,
      int views,
      String lastView) {}

  @GetMapping("/reports/{number}/links")
  String list(@PathVariable long number, Model model) {
    Report report = reports.find(number).orElseThrow(() -> new NotFoundException("report"));
    model.addAttribute("number", number);
    model.addAttribute("printedNumber", Issue.printed(number));
    model.addAttribute("unitName", report.content().sheet().item().modelName());
    model.addAttribute("usualDays", ShareLinks.USUAL_DAYS);
    model.addAttribute("longestDays", ShareLinks.LONGEST_DAYS);
    model.addAttribute("links", rows(links.ofReport(number)));
    return "share/links";
  }

  @PostMapping("/reports/{number}/links")
  String make(
      @PathVariable long number,
      @RequestParam(defaultValue = "" + ShareLinks.USUAL_DAYS) int days,
      @RequestParam(defaultValue = "false") boolean history,
      RedirectAttributes flash) {
    String address = desk.make(number, history, days).address();
    flash.addFlashAttribute("address", address);
    flash.addFlashAttribute("code", QrDrawing.of(address));
    return "redirect:/reports/" + number + "/links";
  }

  @PostMapping("/reports/{number}/links/{id}/withdraw")
  String withdraw(@PathVariable long number, @PathVariable UUID id) {
    desk.withdraw(new ShareLinkId(id));
    return "redirect:/reports/" + number + "/links";
  }

  private List<Row> rows(List<ShareLink> all) {
    return all.stream()
        .map(
            link ->
                new Row(
                    link.id().value(),
                    times.minute(link.createdAt()),
                    link.createdBy(),
                    times.day(link.expiresAt()),
                    desk.isOpen(link),
                    link.withdrawnAt() != null,
                    link.showsHistory(),
                    link.views(),
                    link.lastViewAt() == null ? "" : times.minute(link.lastViewAt())))
        .toList();
  }
}
