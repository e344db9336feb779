package turnsheet.access.web;

import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;
import turnsheet.access.ApiKeys;
import turnsheet.access.ApiKeys.ApiKey;
import turnsheet.access.AuditTrail;
import turnsheet.access.CurrentUser;
import turnsheet.web.NotFoundException;

/** Makes and withdraws API keys: everybody his own, an owner anyone's. */
@Controller
class KeysController {

  private static final int LABEL_MAX_LENGTH = 120;
  private static final String SHOP = "redirect:" + ShopController.PATH;

  private final ApiKeys keys;
  private final CurrentUser user;
  private final AuditTrail audit;

  KeysController(ApiKeys keys, CurrentUser user, AuditTrail audit) {
    this.keys = keys;
    this.user = user;
    this.audit = audit;
  }

  @PostMapping("/shop/keys")
  String make(@RequestParam String label, RedirectAttributes flash) {
    String name = label.strip();
    if (name.isEmpty() || name.length() > LABEL_MAX_LENGTH) {
      flash.addFlashAttribute("refused", "access.shop.keyLabelNeeded");
      return SHOP;
    }
    flash.addFlashAttribute("newKey", keys.make(user.account().id(), name));
    audit.record("access.audit.keyMade", name);
    return SHOP;
  }

  @GetMapping("/shop/keys/{id}/withdraw")
  String confirm(@PathVariable UUID id, Model model) {
    model.addAttribute("id", id);
    model.addAttribute("label", key(id).label());
    return "access/withdraw-key";
  }

  @PostMapping("/shop/keys/{id}/withdraw")
  String withdraw(@PathVariable UUID id, RedirectAttributes flash) {
    ApiKey key = key(id);
    keys.withdraw(id);
    audit.record("access.audit.keyWithdrawn", key.label());
    flash.addFlashAttribute("done", "access.shop.keyWithdrawn");
    return SHOP;
  }

  /** A key that this visitor may touch; others do not exist for him. */
  private ApiKey key(UUID id) {
    return keys.byId(id)
        .filter(k -> user.isOwner() || k.signInName().equals(user.signInName()))
        .orElseThrow(() -> new NotFoundException("key"));
  }
}
