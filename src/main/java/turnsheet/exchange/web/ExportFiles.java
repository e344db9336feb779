package turnsheet.exchange.web;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.io.OutputStreamWriter;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.http.ContentDisposition;
import org.springframework.http.HttpHeaders;
import org.springframework.stereotype.Component;
import turnsheet.exchange.Export;
import turnsheet.exchange.Scope;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Exports as downloads: written row by row, so that their length does not matter. */
@Component
class ExportFiles {

  private final Export export;

  ExportFiles(Export export) {
    this.export = export;
  }

  /**
   * What a request asks for: everything where it names nothing.
   *
   * @throws NotFoundException if there is no such unit or visit
   * @throws RefusedRequestException if it names both
   */
  Scope scope(@Nullable UUID unit, @Nullable UUID visit) {
    if (unit != null && visit != null) {
      throw new RefusedRequestException(
          "unitOrVisit", "Name a unit or a visit, not both: a visit brings its unit with it.");
    }
    Scope scope =
        unit != null ? Scope.unit(unit) : visit != null ? Scope.visit(visit) : Scope.everything();
    if (!export.holds(scope)) {
      throw new NotFoundException(unit != null ? "unit" : "visit");
    }
    return scope;
  }

  void json(Scope scope, HttpServletResponse response) throws IOException {
    try (Writer out = open(response, "application/json", scope, "json")) {
      export.writeJson(scope, out);
    }
  }

  void csv(Scope scope, HttpServletResponse response) throws IOException {
    try (Writer out = open(response, "text/csv", scope, "csv")) {
      export.writeCsv(scope, out);
    }
  }

  private static Writer open(HttpServletResponse response, String type, Scope scope, String ending)
      throws IOException {
    UUID id = scope.id();
    String of = id == null ? "all" : id.toString();
    response.setContentType(type);
    response.setCharacterEncoding(StandardCharsets.UTF_8);
    response.setHeader(
        HttpHeaders.CONTENT_DISPOSITION,
        ContentDisposition.attachment()
            .filename("turnsheet-" + of + "." + ending)
            .build()
            .toString());
    return new OutputStreamWriter(response.getOutputStream(), StandardCharsets.UTF_8);
  }
}
