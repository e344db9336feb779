package turnsheet.exchange.web;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.io.InputStream;
import java.util.List;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.multipart.MultipartFile;
import turnsheet.exchange.ImportResult;
import turnsheet.web.RefusedRequestException;

/** The page that takes a document in and says what came of it. */
@Controller
class ImportController {

  private static final int MOST_LISTED = 200;

  private final ImportDesk desk;

  ImportController(ImportDesk desk) {
    this.desk = desk;
  }

  /** A row of the list of what was left alone. */
  record Row(String kind, String id, String label, int line, String reason, String members) {

    static Row of(String kind, ImportResult.Left left) {
      return new Row(
          kind,
          left.id(),
          left.label(),
          left.line(),
          left.reason().word(),
          String.join(", ", left.members()));
    }
  }

  /** Where the answer to the form is asked for again. */
  @GetMapping("/import")
  String form() {
    return "exchange/import";
  }

  /** Answers with the page itself: to send the same file again does no harm. */
  @PostMapping("/import")
  String take(
      @RequestParam(name = "file") MultipartFile file,
      @RequestParam(required = false) @Nullable String shop,
      Model model,
      HttpServletResponse response)
      throws IOException {
    if (file.isEmpty()) {
      throw new RefusedRequestException(
          "noFile", "No file came with the form, or an empty one: choose an exported document.");
    }
    try (InputStream in = file.getInputStream()) {
      ImportResult result = desk.take(in, shop);
      List<Row> left = result.kinds().stream().flatMap(ImportController::rows).toList();
      model.addAttribute("fileName", file.getOriginalFilename());
      model.addAttribute("result", result);
      model.addAttribute("left", left.subList(0, Math.min(left.size(), MOST_LISTED)));
      model.addAttribute("more", left.size() > MOST_LISTED);
    } catch (RefusedRequestException e) {
      response.setStatus(422);
      model.addAttribute("problem", e.getMessage());
    }
    return "exchange/import";
  }

  private static Stream<Row> rows(ImportResult.OfKind kind) {
    return Stream.concat(kind.different().stream(), kind.heldBack().stream())
        .map(left -> Row.of(kind.kind(), left));
  }
}
