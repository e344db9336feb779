package turnsheet.reading.web;

import java.util.Locale;
import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import turnsheet.shop.VisitId;
import turnsheet.web.NotFoundException;

/** The page of a visit. */
@Controller
class VisitController {

  private final VisitView pages;

  VisitController(VisitView pages) {
    this.pages = pages;
  }

  @GetMapping("/visits/{id}")
  String visit(@PathVariable UUID id, Locale locale, Model model) {
    model.addAttribute(
        "page",
        pages.find(new VisitId(id), locale).orElseThrow(() -> new NotFoundException("visit")));
    return "reading/visit";
  }
}
