package turnsheet.reading.web;

import java.util.Locale;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestParam;
import turnsheet.capture.CaptureId;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.web.NotFoundException;

/** The page of a reading. */
@Controller
class ReadingController {

  private final ReadingView pages;
  private final CauseView causes;
  private final MotionView motion;
  private final Readings readings;

  ReadingController(ReadingView pages, CauseView causes, MotionView motion, Readings readings) {
    this.pages = pages;
    this.causes = causes;
    this.motion = motion;
    this.readings = readings;
  }

  /**
   * The page.
   *
   * @param line rate of the one line to listen to
   * @param faster how many times faster
   */
  @GetMapping("/readings/{id}")
  String reading(
      @PathVariable UUID id,
      @RequestParam(required = false) @Nullable Double line,
      @RequestParam(required = false) @Nullable Integer faster,
      Locale locale,
      Model model) {
    ReadingId reading = new ReadingId(id);
    model.addAttribute(
        "page", pages.find(reading, locale).orElseThrow(() -> new NotFoundException("reading")));
    model.addAttribute("causes", causes.page(reading, locale));
    model.addAttribute("overTime", motion.page(reading, line, faster, locale));
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
