package turnsheet.report.web;

import java.util.Locale;
import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import turnsheet.report.Sheets;
import turnsheet.shop.VisitId;
import turnsheet.web.NotFoundException;

/** The before/after sheet of a visit, on screen and on paper. */
@Controller
class SheetController {

  private final Sheets sheets;
  private final SheetPages pages;

  SheetController(Sheets sheets, SheetPages pages) {
    this.sheets = sheets;
    this.pages = pages;
  }

  @GetMapping("/visits/{id}/sheet")
  String sheet(@PathVariable UUID id, Model model, Locale locale) {
    model.addAttribute("visitId", id);
    model.addAttribute(
        "sheet",
        pages.of(
            sheets.of(new VisitId(id)).orElseThrow(() -> new NotFoundException("visit")), locale));
    return "report/sheet";
  }
}
