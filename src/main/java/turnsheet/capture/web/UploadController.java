package turnsheet.capture.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.validation.Valid;
import java.io.IOException;
import java.io.InputStream;
import java.security.Principal;
import java.util.List;
import java.util.UUID;
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
import turnsheet.web.RefusedRequestException;

/** Takes files from the pages of a visit. */
@Controller
class UploadController {

  private final CaptureDesk desk;

  UploadController(CaptureDesk desk) {
    this.desk = desk;
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
      throw new RefusedRequestException("noFile", "No file came with the form: choose one.");
    }
    Capture last = null;
    for (MultipartFile file : chosen) {
      try (InputStream in = file.getInputStream()) {
        String name = String.valueOf(file.getOriginalFilename());
        last = desk.receive(request.key(visit), name, visitor, in);
      }
    }
    return last != null && chosen.size() == 1
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
    Capture capture = desk.receive(request.key(visit), fileName, visitor, body.getInputStream());
    return new Uploaded(body.getContextPath() + "/captures/" + capture.id());
  }

  /** Where the script goes next. */
  record Uploaded(String page) {}

  private static boolean isChosen(MultipartFile file) {
    String name = file.getOriginalFilename();
    return name != null && !name.isEmpty();
  }
}
