package turnsheet.report.web;

import jakarta.servlet.http.HttpServletResponse;
import jakarta.validation.Valid;
import java.util.Locale;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.http.ContentDisposition;
import org.springframework.http.HttpHeaders;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import turnsheet.access.CurrentUser;
import turnsheet.report.Issue;
import turnsheet.report.Report;
import turnsheet.report.Reports;
import turnsheet.shop.VisitId;
import turnsheet.shop.Visits;
import turnsheet.web.NotFoundException;
import turnsheet.web.OvertakenException;
import turnsheet.web.Times;

/** Issued reports: the list, one of them, its PDF, issuing and revising. */
@Controller
class ReportController {

  private static final int LATEST = 200;

  private final Reports reports;
  private final Visits visits;
  private final ReportDesk desk;
  private final SheetPrinting printing;
  private final CurrentUser user;
  private final Times times;

  ReportController(
      Reports reports,
      Visits visits,
      ReportDesk desk,
      SheetPrinting printing,
      CurrentUser user,
      Times times) {
    this.reports = reports;
    this.visits = visits;
    this.desk = desk;
    this.printing = printing;
    this.user = user;
    this.times = times;
  }

  @GetMapping("/reports")
  String list(Model model) {
    model.addAttribute(
        "reports", reports.latest(LATEST).stream().map(e -> ReportRow.of(e, times)).toList());
    return "report/reports";
  }

  @GetMapping("/reports/{number}")
  String show(@PathVariable long number, Model model) {
    Report report = found(number);
    Issue issue = report.content().issue();
    model.addAttribute("number", number);
    model.addAttribute("printedNumber", issue.printedNumber());
    model.addAttribute("visitId", report.visitId().value());
    model.addAttribute("owner", user.isOwner());
    model.addAttribute(
        "replacedBy", report.replacedBy() == null ? "" : Issue.printed(report.replacedBy()));
    model.addAttribute("replacement", report.replacedBy());
    model.addAttribute("language", issue.language());
    model.addAttribute("article", printing.article(report));
    return "report/report";
  }

  @GetMapping("/reports/{number}/pdf")
  ResponseEntity<byte[]> pdf(@PathVariable long number) {
    byte[] pdf =
        reports.pdf(number, printing::pdf).orElseThrow(() -> new NotFoundException("report"));
    return ResponseEntity.ok()
        .contentType(MediaType.APPLICATION_PDF)
        .header(
            HttpHeaders.CONTENT_DISPOSITION,
            ContentDisposition.inline()
                .filename("report-" + Issue.printed(number) + ".pdf")
                .build()
                .toString())
        .body(pdf);
  }

  @GetMapping("/visits/{id}/report")
  String ask(@PathVariable UUID id, Model model, Locale locale) {
    if (visits.find(new VisitId(id)).isEmpty()) {
      throw new NotFoundException("visit");
    }
    String name = user.account().displayName();
    model.addAttribute("form", new ReportForm(locale.getLanguage(), name, name, "", "", ""));
    return form(id, null, model);
  }

  @PostMapping("/visits/{id}/report")
  String issue(
      @PathVariable UUID id,
      @Valid @ModelAttribute("form") ReportForm form,
      BindingResult errors,
      Model model,
      HttpServletResponse response) {
    if (errors.hasErrors()) {
      return form(id, null, model);
    }
    try {
      return "redirect:/reports/" + desk.issue(new VisitId(id), wish(form)).number();
    } catch (OvertakenException e) {
      return overtaken(new VisitId(id), model, response);
    }
  }

  @GetMapping("/reports/{number}/revise")
  String askRevision(@PathVariable long number, Model model) {
    Report report = found(number);
    Issue old = report.content().issue();
    model.addAttribute(
        "form",
        new ReportForm(
            old.language(),
            old.measuredBy(),
            old.releasedBy(),
            old.conditions(),
            old.remarks(),
            ""));
    return form(report.visitId().value(), number, model);
  }

  @PostMapping("/reports/{number}/revise")
  String revise(
      @PathVariable long number,
      @Valid @ModelAttribute("form") ReportForm form,
      BindingResult errors,
      Model model,
      HttpServletResponse response) {
    Report report = found(number);
    if (form.reason().isBlank()) {
      errors.rejectValue("reason", "report.form.reason.missing");
    }
    if (errors.hasErrors()) {
      return form(report.visitId().value(), number, model);
    }
    try {
      return "redirect:/reports/" + desk.revise(number, wish(form), form.reason()).number();
    } catch (OvertakenException e) {
      return overtaken(report.visitId(), model, response);
    }
  }

  /** The form as it was typed, now for the report that somebody else has issued meanwhile. */
  private String overtaken(VisitId visit, Model model, HttpServletResponse response) {
    long current =
        reports.ofVisit(visit).stream()
            .filter(e -> e.replacedBy() == null)
            .findFirst()
            .orElseThrow()
            .number();
    response.setStatus(HttpStatus.CONFLICT.value());
    model.addAttribute("overtaken", true);
    return form(visit.value(), current, model);
  }

  private Report found(long number) {
    return reports.find(number).orElseThrow(() -> new NotFoundException("report"));
  }

  private static String form(UUID visit, @Nullable Long revises, Model model) {
    model.addAttribute("visitId", visit);
    model.addAttribute("revises", revises);
    model.addAttribute("revisesPrinted", revises == null ? "" : Issue.printed(revises));
    return "report/issue";
  }

  private static ReportDesk.Wish wish(ReportForm form) {
    return new ReportDesk.Wish(
        form.language(), form.measuredBy(), form.releasedBy(), form.conditions(), form.remarks());
  }
}
