package turnsheet.shop.web;

import java.util.List;
import java.util.Optional;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.servlet.mvc.support.RedirectAttributes;
import turnsheet.shop.PageQuery;
import turnsheet.shop.Unit;
import turnsheet.shop.UnitCode;
import turnsheet.shop.UnitId;
import turnsheet.shop.UnitSummary;
import turnsheet.shop.Units;
import turnsheet.shop.Visits;
import turnsheet.web.NotFoundException;

/** From a code, typed or scanned, to the unit that carries it. */
@Controller
class QuickEntry {

  private final Units units;
  private final Visits visits;

  QuickEntry(Units units, Visits visits) {
    this.units = units;
    this.visits = visits;
  }

  /** What a label holds. */
  @GetMapping("/u/{code}")
  String labelled(@PathVariable String code) {
    return UnitCode.in(code)
        .flatMap(units::coded)
        .map(unit -> "redirect:/units/" + unit.id())
        .orElseThrow(() -> new NotFoundException("unit with this code"));
  }

  /**
   * What the field on the bench page sends: a code leads to the unit's open visit or, where it is
   * not on the bench, to the unit; other words lead to the only unit that has them, or to the list.
   */
  @GetMapping("/find")
  String find(@RequestParam(defaultValue = "") String q, RedirectAttributes onward) {
    Optional<Unit> coded = UnitCode.in(q).flatMap(units::coded);
    if (coded.isPresent()) {
      return "redirect:" + placeOf(coded.get().id());
    }
    List<UnitSummary> found = units.page(new PageQuery(q, 1, 2)).items();
    if (found.size() == 1 && !q.isBlank()) {
      return "redirect:" + placeOf(found.get(0).unit().id());
    }
    if (!q.isBlank()) {
      onward.addAttribute("q", q.strip());
    }
    return "redirect:/units";
  }

  private String placeOf(UnitId unit) {
    return visits.openOf(unit).map(visit -> "/visits/" + visit.id()).orElse("/units/" + unit);
  }
}
