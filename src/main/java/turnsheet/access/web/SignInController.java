package turnsheet.access.web;

import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.RequestParam;
import turnsheet.access.Accounts;

/** The sign-in page; the security filter takes what it posts. */
@Controller
class SignInController {

  static final String PATH = "/sign-in";
  static final String NAME = "name";

  private final Accounts accounts;

  SignInController(Accounts accounts) {
    this.accounts = accounts;
  }

  @GetMapping(PATH)
  String signIn(
      @RequestParam(required = false) @Nullable String wrong,
      @RequestParam(required = false) @Nullable String out,
      @RequestParam(required = false) @Nullable Integer wait,
      Model model) {
    if (accounts.none()) {
      return "redirect:" + FirstRunController.NOT_SET_UP;
    }
    model.addAttribute("wrong", wrong != null);
    model.addAttribute("out", out != null);
    model.addAttribute("wait", wait);
    return "access/sign-in";
  }
}
