package turnsheet.pair.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.util.Locale;
import java.util.UUID;
import org.springframework.http.HttpStatus;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseBody;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;
import turnsheet.capture.CaptureId;
import turnsheet.capture.Captures;
import turnsheet.job.Job;
import turnsheet.pair.PairOrder;
import turnsheet.pair.Pairs;
import turnsheet.pair.StoredPair;
import turnsheet.web.CoreWords;
import turnsheet.web.NotFoundException;
import turnsheet.web.PageLanguage;
import turnsheet.web.PublicAddress;
import turnsheet.web.RefusedRequestException;

/** Two sensors of one shaft: the form that orders the comparison, and its sheet. */
@Controller
class PairController {

  /** Below the path that is open without an account. */
  private static final String SHARED = "/s/pair/";

  private final Captures captures;
  private final Pairs pairs;
  private final PairOrderView orders;
  private final PairSheetView sheets;
  private final PublicAddress address;

  PairController(
      Captures captures,
      Pairs pairs,
      PairOrderView orders,
      PairSheetView sheets,
      PublicAddress address) {
    this.captures = captures;
    this.pairs = pairs;
    this.orders = orders;
    this.sheets = sheets;
    this.address = address;
  }

  @GetMapping("/captures/{id}/pair")
  String form(@PathVariable UUID id, Locale locale, Model model) {
    model.addAttribute(
        "page",
        captures
            .find(new CaptureId(id))
            .filter(Pairs::hasPulses)
            .map(capture -> orders.page(capture, locale))
            .orElseThrow(() -> new NotFoundException("reading")));
    return "pair/order";
  }

  @PostMapping("/captures/{id}/pair")
  String order(
      @PathVariable UUID id,
      @RequestParam String original,
      @RequestParam int originalTeeth,
      @RequestParam String replacement,
      @RequestParam int replacementTeeth,
      @RequestParam(defaultValue = "") String supply,
      @RequestParam(defaultValue = "") String level,
      @RequestParam(defaultValue = "") String output,
      @RequestParam(defaultValue = "") String remarks) {
    PairOrder.Details details =
        new PairOrder.Details(text(supply), text(level), text(output), text(remarks));
    UUID made =
        pairs.order(
            new PairOrder(
                side(original, originalTeeth), side(replacement, replacementTeeth), details));
    return "redirect:/pairs/" + made;
  }

  @GetMapping("/pairs/{id}")
  String sheet(@PathVariable UUID id, Locale locale, Model model) {
    model.addAttribute("page", sheets.page(existing(id), locale, true));
    return "pair/sheet";
  }

  @GetMapping("/pairs/{id}/progress")
  @ResponseBody
  Progress progress(@PathVariable UUID id, Locale locale) {
    Job job = pairs.job(existing(id).id()).orElse(null);
    return job == null
        ? new Progress(null, 0, "", true)
        : new Progress(
            job.state().name().toLowerCase(Locale.ROOT),
            job.progress(),
            CoreWords.in(locale, job.message()),
            job.state().isOver());
  }

  /** How the work stands. */
  record Progress(
      @org.jspecify.annotations.Nullable String jobState,
      double progress,
      String message,
      boolean over) {}

  @PostMapping("/pairs/{id}/links")
  String share(
      @PathVariable UUID id,
      @RequestParam(defaultValue = "90") int days,
      RedirectAttributes flash) {
    flash.addFlashAttribute("address", address.of(SHARED + pairs.share(id, days)));
    return "redirect:/pairs/" + id;
  }

  @PostMapping("/pairs/{id}/links/withdraw")
  String withdraw(@PathVariable UUID id) {
    pairs.withdraw(id);
    return "redirect:/pairs/" + id;
  }

  /** What whoever has the link sees: the sheet and nothing else. */
  @GetMapping(SHARED + "{token}")
  String shared(
      @PathVariable String token,
      Model model,
      Locale locale,
      HttpServletRequest request,
      HttpServletResponse response) {
    response.setHeader("X-Robots-Tag", "noindex, nofollow");
    response.setHeader("Referrer-Policy", "no-referrer");
    response.setHeader("Cache-Control", "no-store");
    StoredPair pair = pairs.shared(token).orElse(null);
    if (pair == null) {
      PageLanguage.useBrowsers(request.getLocale());
      response.setStatus(HttpStatus.NOT_FOUND.value());
      return "share/gone";
    }
    model.addAttribute("page", sheets.page(pair, locale, false));
    return "pair/shared";
  }

  private StoredPair existing(UUID id) {
    return pairs.find(id).orElseThrow(() -> new NotFoundException("comparison"));
  }

  private static PairOrder.Side side(String choice, int teeth) {
    String[] parts = choice.split(":", -1);
    try {
      return new PairOrder.Side(UUID.fromString(parts[0]), Integer.parseInt(parts[1]), teeth);
    } catch (IllegalArgumentException | ArrayIndexOutOfBoundsException e) {
      throw new RefusedRequestException(
          "pairChoice", "The channel is none of those on offer: choose one from the list.");
    }
  }

  private static String text(String typed) {
    String text = typed.strip();
    if (text.length() > Pairs.LONGEST_TEXT) {
      throw new RefusedRequestException(
          "pairText", "A field holds up to 400 characters: shorten what was typed.");
    }
    return text;
  }
}
