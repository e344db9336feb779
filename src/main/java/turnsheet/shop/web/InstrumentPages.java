package turnsheet.shop.web;

import jakarta.validation.Valid;
import java.util.Optional;
import java.util.UUID;
import java.util.function.UnaryOperator;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Controller;
import org.springframework.ui.Model;
import org.springframework.validation.BindingResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.ModelAttribute;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.shop.Media;
import turnsheet.shop.RefusedChangeException;
import turnsheet.web.NotFoundException;
import turnsheet.web.Shown;
import turnsheet.web.Times;

/** What records and what is played: the list of both, and entering instruments. */
@Controller
class InstrumentPages {

  private static final String LIST = "redirect:/instruments";
  private static final String FORM_PAGE = "shop/instrument-form";

  private final Instruments instruments;
  private final Media media;
  private final Refusals refusals;
  private final Times times;

  InstrumentPages(Instruments instruments, Media media, Refusals refusals, Times times) {
    this.instruments = instruments;
    this.media = media;
    this.refusals = refusals;
    this.times = times;
  }

  @GetMapping("/instruments")
  String list(Model model) {
    model.addAttribute(
        "instruments", instruments.all().stream().map(i -> InstrumentRow.of(i, times)).toList());
    model.addAttribute("media", media.all().stream().map(MediumRow::of).toList());
    return "shop/instruments";
  }

  @GetMapping("/instruments/new")
  String blank(Model model) {
    model.addAttribute("form", InstrumentForm.EMPTY);
    return FORM_PAGE;
  }

  @PostMapping("/instruments/new")
  String add(@Valid @ModelAttribute("form") InstrumentForm form, BindingResult errors) {
    return write(form, InstrumentId.next(), errors, instruments::add) ? LIST : FORM_PAGE;
  }

  @GetMapping("/instruments/{id}/edit")
  String edit(@PathVariable UUID id, Model model) {
    model.addAttribute("form", InstrumentForm.of(instrument(id)));
    model.addAttribute("id", id.toString());
    return FORM_PAGE;
  }

  @PostMapping("/instruments/{id}/edit")
  String change(
      @PathVariable UUID id,
      @Valid @ModelAttribute("form") InstrumentForm form,
      BindingResult errors,
      Model model) {
    model.addAttribute("id", instrument(id).id().toString());
    UnaryOperator<BenchInstrument> change = i -> instruments.change(i).orElseThrow();
    return write(form, new InstrumentId(id), errors, change) ? LIST : FORM_PAGE;
  }

  private boolean write(
      InstrumentForm form,
      InstrumentId id,
      BindingResult errors,
      UnaryOperator<BenchInstrument> writing) {
    Optional<BenchInstrument> meant = form.instrument(id, errors);
    try {
      return meant.map(writing).isPresent();
    } catch (RefusedChangeException e) {
      refusals.show(e, errors, "name");
      return false;
    }
  }

  private BenchInstrument instrument(UUID id) {
    return instruments
        .find(new InstrumentId(id))
        .orElseThrow(() -> new NotFoundException("instrument"));
  }

  /** A line of the list; no uncertainty and an empty day where they are unknown. */
  record InstrumentRow(
      String id,
      String name,
      Shown clockErrorPpm,
      @Nullable Shown uncertaintyPpm,
      String checkedOn) {

    static InstrumentRow of(BenchInstrument instrument, Times times) {
      return new InstrumentRow(
          instrument.id().toString(),
          instrument.name(),
          Typed.cell(instrument.clockErrorPpm()),
          Typed.cellOrNone(instrument.clockExpandedUncertaintyPpm()),
          times.day(instrument.checkedOn()));
    }
  }
}
