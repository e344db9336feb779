package turnsheet.capture.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.validation.Valid;
import java.io.IOException;
import java.io.InputStream;
import java.security.Principal;
import java.util.List;
import java.util.Locale;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.context.i18n.LocaleContextHolder;
import org.springframework.http.HttpStatus;
import org.springframework.http.MediaType;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.ResponseBody;
import org.springframework.web.bind.annotation.ResponseStatus;
import org.springframework.web.multipart.MultipartFile;
import turnsheet.capture.Capture;
import turnsheet.capture.Looked;
import turnsheet.core.signal.Rejection;
import turnsheet.shop.RefusedChangeException;
import turnsheet.shop.UnitId;
import turnsheet.shop.Units;
import turnsheet.shop.Visit;
import turnsheet.shop.Visits;
import turnsheet.web.CoreWords;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Takes files from the pages of a visit. */
@Controller
class UploadController {

  private final CaptureDesk desk;
  private final Units units;
  private final Visits visits;

  UploadController(CaptureDesk desk, Units units, Visits visits) {
    this.desk = desk;
    this.units = units;
    this.visits = visits;
  }

  /** The same for a unit: goes to its open visit, and opens one where there is none. */
  @PostMapping(path = "/units/{unit}/captures", consumes = MediaType.MULTIPART_FORM_DATA_VALUE)
  String formOfUnit(
      @PathVariable UUID unit,
      @Valid @ModelAttribute CaptureRequest request,
      @RequestParam(name = "file") List<MultipartFile> files,
      Principal visitor)
      throws IOException {
    if (files.stream().noneMatch(UploadController::isChosen)) {
      throw noFile();
    }
    return form(visitOf(unit), request, files, visitor);
  }

  @PostMapping(path = "/units/{unit}/captures", consumes = MediaType.APPLICATION_OCTET_STREAM_VALUE)
  @ResponseStatus(HttpStatus.CREATED)
  @ResponseBody
  Uploaded rawOfUnit(
      @PathVariable UUID unit,
      @Valid @ModelAttribute CaptureRequest request,
      @RequestParam String fileName,
      Principal visitor,
      HttpServletRequest body)
      throws IOException {
    return raw(visitOf(unit), request, fileName, visitor, body);
  }

  /** The form as a browser without scripts sends it. */
  @PostMapping(path = "/visits/{visit}/captures", consumes = MediaType.MULTIPART_FORM_DATA_VALUE)
  String form(
      @PathVariable UUID visit,
      @Valid @ModelAttribute CaptureRequest request,
      @RequestParam(name = "file") List<MultipartFile> files,
      Principal visitor)
      throws IOException {
    List<MultipartFile> chosen = files.stream().filter(UploadController::isChosen).toList();
    if (chosen.isEmpty()) {
      throw noFile();
    }
    Capture last = null;
    for (MultipartFile file : chosen) {
      try (InputStream in = file.getInputStream()) {
        String name = String.valueOf(file.getOriginalFilename());
        last = desk.receive(request.arrival(visit), name, visitor, in);
      }
    }
    return last != null && chosen.size() == 1 && last.fit() == null
        ? "redirect:/captures/" + last.id()
        : "redirect:/visits/" + visit;
  }

  /** One file as the page's script sends it, with the CSRF token in a header. */
  @PostMapping(
      path = "/visits/{visit}/captures",
      consumes = MediaType.APPLICATION_OCTET_STREAM_VALUE)
  @ResponseStatus(HttpStatus.CREATED)
  @ResponseBody
  Uploaded raw(
      @PathVariable UUID visit,
      @Valid @ModelAttribute CaptureRequest request,
      @RequestParam String fileName,
      Principal visitor,
      HttpServletRequest body)
      throws IOException {
    Capture capture =
        desk.receive(request.arrival(visit), fileName, visitor, body.getInputStream());
    String root = body.getContextPath();
    Looked looked = capture.looked();
    Rejection refusal = capture.refusal();
    Locale locale = LocaleContextHolder.getLocale();
    return new Uploaded(
        root + "/captures/" + capture.id(),
        root + "/visits/" + visit,
        looked == null ? null : CoreWords.in(locale, looked.recognised().format()),
        refusal == null ? null : CoreWords.in(locale, refusal.message()));
  }

  /**
   * Where the script goes next, and what it says about the file.
   *
   * @param format null where it was not recognised
   * @param refusal sentence; null where it was
   */
  record Uploaded(String page, String visit, @Nullable String format, @Nullable String refusal) {}

  private UUID visitOf(UUID unit) {
    UnitId id = new UnitId(unit);
    if (units.find(id).isEmpty()) {
      throw new NotFoundException("unit");
    }
    return visits.openOf(id).orElseGet(() -> opened(id)).id().value();
  }

  private Visit opened(UnitId unit) {
    try {
      return visits.open(unit, "");
    } catch (RefusedChangeException e) {
      // somebody else was faster: the recording belongs to that visit
      return visits.openOf(unit).orElseThrow(() -> e);
    }
  }

  private static RefusedRequestException noFile() {
    return new RefusedRequestException("noFile", "No file came with the form: choose one.");
  }

  private static boolean isChosen(MultipartFile file) {
    String name = file.getOriginalFilename();
    return name != null && !name.isEmpty();
  }
}
