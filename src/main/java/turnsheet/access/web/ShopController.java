package turnsheet.access.web;

import jakarta.validation.Valid;
import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Size;
import java.util.Locale;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;
import turnsheet.access.AuditTrail;
import turnsheet.access.ShopProfiles;
import turnsheet.access.ShopProfiles.ShopProfile;
import turnsheet.web.PlainText;

/** The shop page and its letterhead. */
@Controller
class ShopController {

  static final String PATH = "/shop";

  /** The letterhead as typed. */
  record ProfileForm(
      @NotBlank @Size(max = 200) String shopName, @NotNull @Size(max = 1000) String shopAddress) {

    ProfileForm {
      shopName = PlainText.typed(shopName);
      shopAddress = PlainText.typed(shopAddress);
    }
  }

  private final ShopPages pages;
  private final ShopProfiles profiles;
  private final AuditTrail audit;

  ShopController(ShopPages pages, ShopProfiles profiles, AuditTrail audit) {
    this.pages = pages;
    this.profiles = profiles;
    this.audit = audit;
  }

  @GetMapping(PATH)
  String show(Model model, Locale locale) {
    model.addAttribute("page", pages.page(locale));
    return "access/shop";
  }

  @GetMapping("/shop/profile")
  String profile(Model model) {
    ShopProfile profile = profiles.get().orElse(new ShopProfile("", ""));
    model.addAttribute("form", new ProfileForm(profile.name(), profile.address()));
    return "access/profile";
  }

  @PostMapping("/shop/profile")
  String change(
      @Valid @ModelAttribute("form") ProfileForm form,
      BindingResult errors,
      RedirectAttributes flash) {
    if (errors.hasErrors()) {
      return "access/profile";
    }
    profiles.put(new ShopProfile(form.shopName(), form.shopAddress()));
    audit.record("access.audit.profileChanged", form.shopName());
    flash.addFlashAttribute("done", "access.shop.profileChanged");
    return "redirect:" + PATH;
  }
}
