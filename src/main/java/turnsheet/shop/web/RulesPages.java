package turnsheet.shop.web;

import jakarta.validation.Valid;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;
import turnsheet.access.AuditTrail;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.shop.ShopRules;
import turnsheet.web.Bound;

/** By what rule figures are judged, and how small a change is too small to matter. */
@Controller
class RulesPages {

  private static final String PATH = "/shop/rules";

  private final ShopRules rules;
  private final AuditTrail audit;

  RulesPages(ShopRules rules, AuditTrail audit) {
    this.rules = rules;
    this.audit = audit;
  }

  @GetMapping(PATH)
  String show(Model model) {
    model.addAttribute("form", RulesForm.of(rules.get()));
    return form(model);
  }

  @PostMapping(PATH)
  String change(
      @Valid @ModelAttribute("form") RulesForm form,
      BindingResult errors,
      Model model,
      RedirectAttributes flash) {
    Bound.require(errors);
    ShopRules.Rules meant = form.rules(errors).orElse(null);
    if (meant == null || errors.hasErrors()) {
      return form(model);
    }
    rules.put(meant);
    audit.record("shop.audit.rules", meant.rule().name());
    flash.addFlashAttribute("done", "shop.rules.changed");
    return "redirect:/shop";
  }

  private static String form(Model model) {
    model.addAttribute("choices", DecisionRule.values());
    return "shop/rules";
  }
}
