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
import turnsheet.share.ShareDesk;
import turnsheet.share.ShareLink;
import turnsheet.share.ShareLinkId;
import turnsheet.share.ShareLinks;
import turnsheet.shop.VisitId;
import turnsheet.shop.VisitSummary;
import turnsheet.shop.Visits;
import turnsheet.web.NotFoundException;
import turnsheet.web.Times;

/** The links to the sheet of one visit: make one, see whether it is read, withdraw it. */
@Controller
class LinksController {

  private final ShareDesk desk;
  private final ShareLinks links;
  private final Visits visits;
  private final Times times;

  LinksController(ShareDesk desk, ShareLinks links, Visits visits, Times times) {
    this.desk = desk;
    this.links = links;
    this.visits = visits;
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
      int views,
      String lastView) {}

  @GetMapping("/visits/{id}/links")
  String list(@PathVariable UUID id, Model model) {
    VisitSummary visit = visit(id);
    model.addAttribute("visitId", id);
    model.addAttribute("unitName", visit.modelName() + " " + visit.serialNumber());
    model.addAttribute("usualDays", ShareLinks.USUAL_DAYS);
    model.addAttribute("longestDays", ShareLinks.LONGEST_DAYS);
    model.addAttribute("links", rows(links.ofVisit(new VisitId(id))));
    return "share/links";
  }

  @PostMapping("/visits/{id}/links")
  String make(
      @PathVariable UUID id,
      @RequestParam(defaultValue = "" + ShareLinks.USUAL_DAYS) int days,
      RedirectAttributes flash) {
    flash.addFlashAttribute("address", desk.make(new VisitId(id), days).address());
    return "redirect:/visits/" + id + "/links";
  }

  @PostMapping("/visits/{visit}/links/{id}/withdraw")
  String withdraw(@PathVariable UUID visit, @PathVariable UUID id) {
    desk.withdraw(new ShareLinkId(id));
    return "redirect:/visits/" + visit + "/links";
  }

  private VisitSummary visit(UUID id) {
    return visits.summary(new VisitId(id)).orElseThrow(() -> new NotFoundException("visit"));
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
                    link.views(),
                    link.lastViewAt() == null ? "" : times.minute(link.lastViewAt())))
        .toList();
  }
}
