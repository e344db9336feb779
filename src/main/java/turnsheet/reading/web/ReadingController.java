package turnsheet.reading.web;

import java.util.Locale;
import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import turnsheet.capture.CaptureId;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.web.NotFoundException;

/** The page of a reading. */
@Controller
class ReadingController {

  private final ReadingView pages;
  private final Readings readings;

  ReadingController(ReadingView pages, Readings readings) {
    this.pages = pages;
    this.readings = readings;
  }

  @GetMapping("/readings/{id}")
  String reading(@PathVariable UUID id, Locale locale, Model model) {
    model.addAttribute(
        "page",
        pages.find(new ReadingId(id), locale).orElseThrow(() -> new NotFoundException("reading")));
    return "reading/reading";
  }

  /** The reading that stands for the capture. */
  @GetMapping("/captures/{id}/reading")
  String newest(@PathVariable UUID id) {
    return readings.versionsOf(new CaptureId(id)).stream()
        .filter(Readings.Version::main)
        .findFirst()
        .map(version -> "redirect:/readings/" + version.id())
        .orElseThrow(() -> new NotFoundException("reading"));
  }
}
