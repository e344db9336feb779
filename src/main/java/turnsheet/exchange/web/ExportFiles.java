package turnsheet.exchange.web;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.http.ContentDisposition;
import org.springframework.http.HttpHeaders;
import org.springframework.stereotype.Component;
import turnsheet.exchange.Export;
import turnsheet.exchange.Scope;
import turnsheet.exchange.Spool;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Exports as downloads: whole on the disk before the first byte is sent. */
@Component
class ExportFiles {

  private final Export export;
  private final Spool spool;

  ExportFiles(Export export, Spool spool) {
    this.export = export;
    this.spool = spool;
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
    spool.send(
        out -> export.writeJson(scope, out),
        length -> open(response, "application/json", scope, "json", length));
  }

  void csv(Scope scope, HttpServletResponse response) throws IOException {
    spool.send(
        out -> export.writeCsv(scope, out),
        length -> open(response, "text/csv", scope, "csv", length));
  }

  private static OutputStream open(
      HttpServletResponse response, String type, Scope scope, String ending, long lengthBytes)
      throws IOException {
    UUID id = scope.id();
    String of = id == null ? "all" : id.toString();
    response.setContentType(type);
    response.setCharacterEncoding(StandardCharsets.UTF_8);
    response.setContentLengthLong(lengthBytes);
    response.setHeader(
        HttpHeaders.CONTENT_DISPOSITION,
        ContentDisposition.attachment()
            .filename("turnsheet-" + of + "." + ending)
            .build()
            .toString());
    return response.getOutputStream();
  }
}
