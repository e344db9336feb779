package turnsheet.access.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import jakarta.validation.Valid;
import java.util.Locale;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import turnsheet.access.Account;
import turnsheet.access.Accounts;
import turnsheet.access.FirstRun;
import turnsheet.access.ShopLanguage;
import turnsheet.access.ShopProfiles.ShopProfile;
import turnsheet.web.NotFoundException;

/** Sets up the owner's account, once. */
@Controller
class FirstRunController {

  static final String NOT_SET_UP = "/not-set-up";
  private static final String PAGE = "access/first-run";

  private final FirstRun firstRun;
  private final Accounts accounts;
  private final SignIn signIn;
  private final ShopLanguage language;

  FirstRunController(FirstRun firstRun, Accounts accounts, SignIn signIn, ShopLanguage language) {
    this.firstRun = firstRun;
    this.accounts = accounts;
    this.signIn = signIn;
    this.language = language;
  }

  @GetMapping(NOT_SET_UP)
  String notSetUp() {
    return accounts.none() ? "access/not-set-up" : "redirect:/";
  }

  @GetMapping("/first-run/{token}")
  String show(@PathVariable String token, Model model) {
    requireOpen(token);
    model.addAttribute("form", FirstRunForm.empty());
    return PAGE;
  }

  @PostMapping("/first-run/{token}")
  String setUp(
      @PathVariable String token,
      @Valid @ModelAttribute("form") FirstRunForm form,
      BindingResult errors,
      Locale locale,
      HttpServletRequest request,
      HttpServletResponse response) {
    requireOpen(token);
    if (!errors.hasErrors()) {
      form.check(errors);
    }
    if (errors.hasErrors()) {
      return PAGE;
    }
    Account owner =
        firstRun.complete(
            token,
            form.name(),
            form.displayName().strip(),
            form.password(),
            new ShopProfile(form.shopName().strip(), form.shopAddress().strip()));
    language.put(locale); // as this page was read
    signIn.as(owner, request, response);
    return "redirect:/";
  }

  private void requireOpen(String token) {
    if (!firstRun.open(token)) {
      throw new NotFoundException("address, or it has been used or has expired");
    }
  }
}
