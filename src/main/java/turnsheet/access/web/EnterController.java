package turnsheet.access.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import turnsheet.access.Account;
import turnsheet.access.Accounts;
import turnsheet.access.OneTimeAddresses;
import turnsheet.access.OneTimeAddresses.Open;
import turnsheet.access.OneTimeAddresses.Purpose;
import turnsheet.web.NotFoundException;

/**
 * Signs an account in once. Opening the address only shows a button, so that a program that looks
 * at links beforehand does not use it up.
 */
@Controller
class EnterController {

  /** A password for the account; stays empty where the address only signs in. */
  record PasswordForm(String password, String again) implements PasswordPair {
    PasswordForm {
      password = password == null ? "" : password;
      again = again == null ? "" : again;
    }
  }

  private static final String PAGE = "access/enter";

  private final OneTimeAddresses addresses;
  private final Accounts accounts;
  private final SignIn signIn;

  EnterController(OneTimeAddresses addresses, Accounts accounts, SignIn signIn) {
    this.addresses = addresses;
    this.accounts = accounts;
    this.signIn = signIn;
  }

  @GetMapping("/enter/{token}")
  String show(@PathVariable String token, Model model) {
    model.addAttribute("form", new PasswordForm("", ""));
    return page(open(token), model);
  }

  @PostMapping("/enter/{token}")
  String enter(
      @PathVariable String token,
      @ModelAttribute("form") PasswordForm form,
      BindingResult errors,
      Model model,
      HttpServletRequest request,
      HttpServletResponse response) {
    Open open = open(token);
    boolean choosing = open.purpose() == Purpose.PASSWORD;
    if (choosing) {
      form.check(errors);
    }
    if (errors.hasErrors()) {
      return page(open, model);
    }
    Account account = account(addresses.use(token).orElseThrow(EnterController::gone));
    if (choosing) {
      accounts.setPassword(account.id(), form.password());
    }
    signIn.as(account, request, response);
    return "redirect:/";
  }

  private String page(Open open, Model model) {
    Account account = account(open);
    model.addAttribute("name", account.displayName());
    model.addAttribute("signInName", account.signInName());
    model.addAttribute("choosing", open.purpose() == Purpose.PASSWORD);
    return PAGE;
  }

  private Open open(String token) {
    return addresses
        .look(token)
        .filter(o -> o.purpose() != Purpose.FIRST_RUN)
        .orElseThrow(EnterController::gone);
  }

  private Account account(Open open) {
    UUID id = open.accountId();
    if (id == null) {
      throw gone();
    }
    return accounts.byId(id).filter(Account::enabled).orElseThrow(EnterController::gone);
  }

  private static NotFoundException gone() {
    return new NotFoundException("address, or it has been used or has expired");
  }
}
