package turnsheet.reading.web;

import java.util.Locale;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestParam;
import turnsheet.shop.UnitId;
import turnsheet.web.NotFoundException;

/** The page of a unit. */
@Controller
class UnitController {

  private final UnitView pages;

  UnitController(UnitView pages) {
    this.pages = pages;
  }

  @GetMapping("/units/{id}")
  String unit(
      @PathVariable UUID id,
      @RequestParam(required = false) @Nullable String setting,
      @RequestParam(required = false) @Nullable String figure,
      Locale locale,
      Model model) {
    model.addAttribute(
        "page",
        pages
            .find(new UnitId(id), setting, figure, locale)
            .orElseThrow(() -> new NotFoundException("unit")));
    return "reading/unit";
  }
}
