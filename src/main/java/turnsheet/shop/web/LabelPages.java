package turnsheet.shop.web;

import java.util.List;
import java.util.UUID;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestParam;
import turnsheet.shop.PageQuery;
import turnsheet.shop.UnitId;
import turnsheet.shop.UnitSummary;
import turnsheet.shop.Units;
import turnsheet.web.NotFoundException;
import turnsheet.web.PublicAddress;
import turnsheet.web.QrDrawing;

/** Labels for units: one for a label printer, or a sheet of them to be cut. */
@Controller
class LabelPages {

  /** As many rows as the list of units has on a page. */
  private static final int MOST = 50;

  private final Units units;
  private final PublicAddress address;

  LabelPages(Units units, PublicAddress address) {
    this.units = units;
    this.address = address;
  }

  /**
   * A label.
   *
   * @param code in two groups
   * @param address what the drawing holds
   */
  record Label(
      String unitId, String code, String model, String serial, String address, QrDrawing drawing) {}

  @GetMapping("/units/{id}/label")
  String one(@PathVariable UUID id, Model model) {
    UnitSummary unit =
        units.summary(new UnitId(id)).orElseThrow(() -> new NotFoundException("unit"));
    model.addAttribute("label", label(unit));
    return "shop/label";
  }

  /** The labels of one page of the list of units. */
  @GetMapping("/units/labels")
  String sheet(
      @RequestParam(defaultValue = "") String q,
      @RequestParam(defaultValue = "1") int page,
      Model model) {
    List<Label> labels =
        units.page(new PageQuery(q, page, MOST)).items().stream().map(this::label).toList();
    model.addAttribute("labels", labels);
    return "shop/labels";
  }

  private Label label(UnitSummary summary) {
    String held = address.of("/u/" + summary.unit().code());
    return new Label(
        summary.unit().id().toString(),
        summary.unit().code().grouped(),
        summary.modelName(),
        summary.unit().serialNumber(),
        held,
        QrDrawing.of(held));
  }
}
