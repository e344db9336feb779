package turnsheet.access.web;

import jakarta.validation.Valid;
import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Pattern;
import jakarta.validation.constraints.Size;
import java.time.Duration;
import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;
import org.springframework.web.servlet.support.ServletUriComponentsBuilder;
import turnsheet.access.Account;
import turnsheet.access.Accounts;
import turnsheet.access.AuditTrail;
import turnsheet.access.OneTimeAddresses;
import turnsheet.access.OneTimeAddresses.Purpose;
import turnsheet.access.Role;
import turnsheet.web.Bound;
import turnsheet.web.NotFoundException;
import turnsheet.web.PlainText;
import turnsheet.web.RefusedRequestException;

/** Adds people, bars them, lets them in again; for owners. */
@Controller
class PeopleController {

  private static final Duration LIFETIME = Duration.ofDays(7);
  private static final String PAGE = "access/person";
  private static final String SHOP = "redirect:" + ShopController.PATH;

  /** A new account as typed. */
  record PersonForm(
      @NotNull @Pattern(regexp = FirstRunForm.SIGN_IN_NAME, message = "{access.name.pattern}")
          String name,
      @NotBlank @Size(max = 120) String displayName,
      @NotNull Role role) {

    PersonForm {
      displayName = PlainText.typed(displayName);
    }
  }

  private final Accounts accounts;
  private final OneTimeAddresses addresses;
  private final AuditTrail audit;

  PeopleController(Accounts accounts, OneTimeAddresses addresses, AuditTrail audit) {
    this.accounts = accounts;
    this.addresses = addresses;
    this.audit = audit;
  }

  @GetMapping("/shop/people/new")
  String form(Model model) {
    model.addAttribute("form", new PersonForm("", "", Role.TECHNICIAN));
    return PAGE;
  }

  @PostMapping("/shop/people")
  String add(
      @Valid @ModelAttribute("form") PersonForm form,
      BindingResult errors,
      RedirectAttributes flash) {
    Bound.require(errors);
    if (errors.hasErrors()) {
      return PAGE;
    }
    Account made;
    try {
      made = accounts.create(form.name(), form.displayName(), form.role(), null);
    } catch (RefusedRequestException e) {
      errors.rejectValue("name", "access.name.taken");
      return PAGE;
    }
    audit.record("access.audit.personAdded", made.signInName());
    handOver(made, flash);
    return SHOP;
  }

  @PostMapping("/shop/people/{id}/address")
  String address(@PathVariable UUID id, RedirectAttributes flash) {
    Account account = account(id);
    audit.record("access.audit.passwordAddress", account.signInName());
    handOver(account, flash);
    return SHOP;
  }

  @PostMapping("/shop/people/{id}/disable")
  String disable(@PathVariable UUID id) {
    accounts.setEnabled(id, false);
    audit.record("access.audit.personDisabled", account(id).signInName());
    return SHOP;
  }

  @PostMapping("/shop/people/{id}/enable")
  String enable(@PathVariable UUID id) {
    accounts.setEnabled(id, true);
    audit.record("access.audit.personEnabled", account(id).signInName());
    return SHOP;
  }

  private void handOver(Account account, RedirectAttributes flash) {
    String path = addresses.issue(Purpose.PASSWORD, account.id(), LIFETIME);
    flash.addFlashAttribute("handOverName", account.displayName());
    flash.addFlashAttribute(
        "handOver", ServletUriComponentsBuilder.fromCurrentContextPath().path(path).toUriString());
  }

  private Account account(UUID id) {
    return accounts.byId(id).orElseThrow(() -> new NotFoundException("account"));
  }
}
