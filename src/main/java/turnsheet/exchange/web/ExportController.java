package turnsheet.exchange.web;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.util.Locale;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestParam;
import turnsheet.access.CurrentUser;
import turnsheet.exchange.Scope;
import turnsheet.web.Wording;

/** The page that offers exports, and its files. */
@Controller
class ExportController {

  private final ExportFiles files;
  private final CurrentUser user;
  private final MessageSource messages;

  ExportController(ExportFiles files, CurrentUser user, MessageSource messages) {
    this.files = files;
    this.user = user;
    this.messages = messages;
  }

  /**
   * The page.
   *
   * @param extent word of what is exported
   * @param back address of what is exported
   * @param of its name
   * @param mayImport whether a document may be brought back here
   */
  record ExportPage(
      String extent, String back, String of, String json, String csv, boolean mayImport) {}

  @GetMapping("/export")
  String page(
      @RequestParam(required = false) @Nullable UUID unit,
      @RequestParam(required = false) @Nullable UUID visit,
      Model model,
      Locale locale) {
    Scope scope = files.scope(unit, visit);
    Wording words = new Wording(messages, locale);
    UUID id = scope.id();
    String query = id == null ? "" : "?" + word(scope) + "=" + id;
    boolean everything = scope.extent() == Scope.Extent.EVERYTHING;
    model.addAttribute(
        "page",
        new ExportPage(
            word(scope),
            everything ? "/shop" : "/" + word(scope) + "s/" + id,
            words.text(
                switch (scope.extent()) {
                  case EVERYTHING -> "web.layout.shop";
                  case UNIT -> "exchange.back.unit";
                  case VISIT -> "exchange.back.visit";
                }),
            "/export.json" + query,
            "/export.csv" + query,
            everything && user.isOwner()));
    return "exchange/export";
  }

  @GetMapping("/export.json")
  void json(
      @RequestParam(required = false) @Nullable UUID unit,
      @RequestParam(required = false) @Nullable UUID visit,
      HttpServletResponse response)
      throws IOException {
    files.json(files.scope(unit, visit), response);
  }

  @GetMapping("/export.csv")
  void csv(
      @RequestParam(required = false) @Nullable UUID unit,
      @RequestParam(required = false) @Nullable UUID visit,
      HttpServletResponse response)
      throws IOException {
    files.csv(files.scope(unit, visit), response);
  }

  private static String word(Scope scope) {
    return scope.extent().name().toLowerCase(Locale.ROOT);
  }
}
