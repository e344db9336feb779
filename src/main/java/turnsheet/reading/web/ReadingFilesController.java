package turnsheet.reading.web;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.util.UUID;
import org.springframework.http.ContentDisposition;
import org.springframework.http.HttpHeaders;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import turnsheet.core.measure.Reading;
import turnsheet.document.ReadingDocument;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.reading.SeriesName;
import turnsheet.web.NotFoundException;

/** A reading and its curves as files to take away. */
@Controller
class ReadingFilesController {

  private final Readings readings;

  ReadingFilesController(Readings readings) {
    this.readings = readings;
  }

  @GetMapping("/readings/{id}.json")
  void document(@PathVariable UUID id, HttpServletResponse response) throws IOException {
    Reading reading = reading(id);
    try (Writer out = open(response, "application/json", "reading-" + id + ".json")) {
      out.write(ReadingDocument.toPrettyJson(reading));
    }
  }

  @GetMapping("/readings/{id}.csv")
  void figures(@PathVariable UUID id, HttpServletResponse response) throws IOException {
    Reading reading = reading(id);
    try (Writer out = open(response, "text/csv", "reading-" + id + ".csv")) {
      CsvExport.figures(reading, out);
    }
  }

  @GetMapping("/readings/{id}/series/{name}.csv")
  void series(@PathVariable UUID id, @PathVariable String name, HttpServletResponse response)
      throws IOException {
    ReadingId reading = new ReadingId(id);
    SeriesName series = SeriesName.of(name).orElseThrow(() -> new NotFoundException("series"));
    String file = name + "-" + id + ".csv";
    if (series == SeriesName.HISTOGRAM) {
      var histogram =
          readings.histogram(reading).orElseThrow(() -> new NotFoundException("series"));
      try (Writer out = open(response, "text/csv", file)) {
        CsvExport.histogram(histogram, out);
      }
    } else {
      var curve =
          readings.curve(reading, series).orElseThrow(() -> new NotFoundException("series"));
      try (Writer out = open(response, "text/csv", file)) {
        CsvExport.curve(series, curve, out);
      }
    }
  }

  private Reading reading(UUID id) {
    return readings
        .find(new ReadingId(id))
        .orElseThrow(() -> new NotFoundException("reading"))
        .reading();
  }

  private static Writer open(HttpServletResponse response, String type, String file)
      throws IOException {
    response.setContentType(type);
    response.setCharacterEncoding(StandardCharsets.UTF_8);
    response.setHeader(
        HttpHeaders.CONTENT_DISPOSITION,
        ContentDisposition.attachment().filename(file).build().toString());
    return response.getWriter();
  }
}
