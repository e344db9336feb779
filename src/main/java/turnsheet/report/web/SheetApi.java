package turnsheet.report.web;

import java.util.List;
import java.util.UUID;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.document.CoreJson;
import turnsheet.report.Report;
import turnsheet.report.Reports;
import turnsheet.report.Sheets;
import turnsheet.shop.VisitId;
import turnsheet.web.NotFoundException;

/** Sheets and reports for programs. */
@RestController
class SheetApi {

  private final Sheets sheets;
  private final Reports reports;
  private final ReportDesk desk;
  private final SheetPrinting printing;

  SheetApi(Sheets sheets, Reports reports, ReportDesk desk, SheetPrinting printing) {
    this.sheets = sheets;
    this.reports = reports;
    this.desk = desk;
    this.printing = printing;
  }

  /** The sheet of a visit as things stand: what a report would say. */
  @GetMapping(value = "/api/v1/visits/{id}/sheet", produces = MediaType.APPLICATION_JSON_VALUE)
  String sheet(@PathVariable UUID id) {
    return CoreJson.toPrettyJson(
        sheets.of(new VisitId(id)).orElseThrow(() -> new NotFoundException("visit")));
  }

  /** The reports of a visit, newest first. */
  @GetMapping("/api/v1/visits/{id}/reports")
  List<Reports.Entry> list(@PathVariable UUID id) {
    return reports.ofVisit(new VisitId(id));
  }

  /** Issues a report. */
  @PostMapping(value = "/api/v1/visits/{id}/reports", produces = MediaType.APPLICATION_JSON_VALUE)
  @ResponseStatus(HttpStatus.CREATED)
  IssuedDocument issue(@PathVariable UUID id, @RequestBody ReportDesk.Wish wish) {
    return IssuedDocument.of(desk.issue(new VisitId(id), wish));
  }

  /** The content of a report, byte for byte what its check code was made from. */
  @GetMapping(value = "/api/v1/reports/{number}", produces = MediaType.APPLICATION_JSON_VALUE)
  ResponseEntity<String> report(@PathVariable long number) {
    Report report = reports.find(number).orElseThrow(() -> new NotFoundException("report"));
    return ResponseEntity.ok()
        .header("ETag", "\"" + report.contentSha256() + "\"")
        .body(report.contentJson());
  }

  /** The same as it was printed. */
  @GetMapping(value = "/api/v1/reports/{number}/pdf", produces = MediaType.APPLICATION_PDF_VALUE)
  byte[] pdf(@PathVariable long number) {
    return reports.pdf(number, printing::pdf).orElseThrow(() -> new NotFoundException("report"));
  }

  /** Issues the sheet of the same visit afresh in place of a report. */
  @PostMapping("/api/v1/reports/{number}/revisions")
  @ResponseStatus(HttpStatus.CREATED)
  IssuedDocument revise(
      @PathVariable long number, @RequestParam String reason, @RequestBody ReportDesk.Wish wish) {
    return IssuedDocument.of(desk.revise(number, wish, reason));
  }

  /** What was issued. */
  record IssuedDocument(long number, String checkCode, String contentSha256) {

    static IssuedDocument of(Report report) {
      return new IssuedDocument(report.number(), report.checkCode(), report.contentSha256());
    }
  }
}
