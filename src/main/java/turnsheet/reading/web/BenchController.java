package turnsheet.reading.web;

import java.util.Locale;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;

/** The first page: what is on the bench. */
@Controller
class BenchController {

  private final BenchView pages;

  BenchController(BenchView pages) {
    this.pages = pages;
  }

  @GetMapping("/")
  String bench(Locale locale, Model model) {
    model.addAttribute("page", pages.page(locale));
    return "reading/bench";
  }
}
