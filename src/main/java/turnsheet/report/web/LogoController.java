package turnsheet.report.web;

import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import javax.imageio.ImageIO;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.multipart.MultipartFile;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;
import turnsheet.access.AuditTrail;
import turnsheet.access.ShopProfiles;
import turnsheet.capture.PhotoCleaner;
import turnsheet.web.RefusedRequestException;

/** The mark of the shop at the head of its sheets. */
@Controller
class LogoController {

  private static final String PATH = "/shop/logo";
  private static final int LONGEST_SIDE_PX = 600;

  private final ShopProfiles profiles;
  private final AuditTrail audit;

  LogoController(ShopProfiles profiles, AuditTrail audit) {
    this.profiles = profiles;
    this.audit = audit;
  }

  @GetMapping(PATH)
  String show(Model model) {
    model.addAttribute("logo", profiles.logo().orElse(""));
    return "report/logo";
  }

  /** Written anew, so that nothing but the picture is kept. */
  @PostMapping(PATH)
  String put(@RequestParam MultipartFile picture, RedirectAttributes flash) throws IOException {
    if (picture.isEmpty()) {
      throw new RefusedRequestException("noFile", "No file came with the form: choose one.");
    }
    ByteArrayOutputStream png = new ByteArrayOutputStream();
    try (InputStream in = picture.getInputStream()) {
      BufferedImage mark = PhotoCleaner.upright(in, LONGEST_SIDE_PX);
      ImageIO.write(mark, "png", png);
    }
    if (png.size() > ShopProfiles.LOGO_BYTES) {
      throw new RefusedRequestException(
          "logoTooRich",
          "The picture has too much detail for a mark: it must fit into 200 kB as PNG.");
    }
    profiles.putLogo("image/png", png.toByteArray());
    return changed(flash);
  }

  @PostMapping(PATH + "/remove")
  String remove(RedirectAttributes flash) {
    profiles.removeLogo();
    return changed(flash);
  }

  private String changed(RedirectAttributes flash) {
    audit.record("report.audit.logo", "");
    flash.addFlashAttribute("done", "report.logo.changed");
    return "redirect:/shop";
  }
}
