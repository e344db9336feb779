package turnsheet.exchange.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.http.MediaType;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.exchange.ImportResult;

/** Export and import for programs. */
@RestController
@RequestMapping("/api/v1")
class ExchangeApi {

  private final ExportFiles files;
  private final ImportDesk desk;

  ExchangeApi(ExportFiles files, ImportDesk desk) {
    this.files = files;
    this.desk = desk;
  }

  /** The document of everything, or of one unit or visit. */
  @GetMapping("/export")
  void json(
      @RequestParam(required = false) @Nullable UUID unit,
      @RequestParam(required = false) @Nullable UUID visit,
      HttpServletResponse response)
      throws IOException {
    files.json(files.scope(unit, visit), response);
  }

  /** The table of the figures of everything, or of one unit or visit. */
  @GetMapping("/export.csv")
  void csv(
      @RequestParam(required = false) @Nullable UUID unit,
      @RequestParam(required = false) @Nullable UUID visit,
      HttpServletResponse response)
      throws IOException {
    files.csv(files.scope(unit, visit), response);
  }

  /**
   * Takes a document in, for an owner; answers 422 where nothing of it could be taken.
   *
   * @param shop {@code take} to replace letterhead, logo, preferences and rules by those of the
   *     file
   */
  @PostMapping(path = "/import", consumes = MediaType.APPLICATION_JSON_VALUE)
  ImportDocument take(
      @RequestParam(required = false) @Nullable String shop, HttpServletRequest body)
      throws IOException {
    ImportResult result = desk.take(body.getInputStream(), shop);
    return ImportDocument.of(result);
  }
}
