package turnsheet.shop.web;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.UUID;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.context.i18n.LocaleContextHolder;
import org.springframework.stereotype.Component;
import org.springframework.ui.Model;
import turnsheet.access.ShopPreferences;
import turnsheet.core.diagnose.parts.Drive;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.core.diagnose.parts.Turning;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ModelId;
import turnsheet.shop.PageQuery;
import turnsheet.shop.PartBasis;
import turnsheet.shop.PartRules;
import turnsheet.shop.RotatingPart;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedUnit;
import turnsheet.shop.Units;
import turnsheet.web.NotFoundException;

/** Fills the page of a machine model; its sub-forms come back to it when something is wrong. */
@Component
class ModelScreen {

  static final String PAGE = "shop/model";

  /** All that a part can be, as the pages offer them. */
  private static final List<String> KINDS =
      Arrays.stream(PartKind.values())
          .filter(k -> k != PartKind.MAINS)
          .map(PartKind::name)
          .toList();

  /** What a part's rate is at a setting that it does not follow from. */
  private static final String UNKNOWN = "\u2013";

  private final MachineModels models;
  private final Units units;
  private final TypicalFigures typical;
  private final MessageSource messages;
  private final ShopPreferences preferences;

  ModelScreen(
      MachineModels models,
      Units units,
      TypicalFigures typical,
      MessageSource messages,
      ShopPreferences preferences) {
    this.preferences = preferences;
    this.typical = typical;
    this.messages = messages;
    this.models = models;
    this.units = units;
  }

  MachineModel model(UUID id) {
    return models.find(new ModelId(id)).orElseThrow(() -> new NotFoundException("machine model"));
  }

  /**
   * Shows the model with its sub-forms, those that were typed into as they were typed.
   *
   * @param opened which list the sub-form belongs to that something is wrong in; empty for none
   */
  String show(UUID id, Model screen, String opened) {
    MachineModel model = model(id);
    screen.addAttribute("opened", opened);
    addChoices(model, screen);
    screen.addAttribute("typical", typical.of(model, LocaleContextHolder.getLocale()));
    addUnlessTyped(screen, "settingForm", SettingForm.empty(preferences.get().speeds()));
    addUnlessTyped(screen, "limitForm", LimitForm.EMPTY);
    return PAGE;
  }

  /** What the form of a single setting, part or limit chooses from. */
  void addChoices(MachineModel model, Model screen) {
    screen.addAttribute("page", page(model));
    screen.addAttribute(
        "speedUnits",
        List.of(SpeedUnit.CM_PER_S.name(), SettingForm.IN_PER_S, SpeedUnit.REV_PER_MIN.name()));
    screen.addAttribute("kinds", KINDS);
    screen.addAttribute("figures", Stream.of(FigureName.values()).map(this::figure).toList());
    screen.addAttribute("knownSpeeds", KnownSpeed.ALL);
  }

  /** What the form of a part of a kind asks for. */
  void addPartFields(PartKind kind, Model screen) {
    screen.addAttribute("kind", kind.name());
    screen.addAttribute("bases", PartRules.bases(kind).stream().map(PartBasis::name).toList());
    screen.addAttribute(
        "windings", Arrays.stream(Drive.Winding.values()).map(Drive.Winding::name).toList());
  }

  private Choice figure(FigureName figure) {
    Locale locale = LocaleContextHolder.getLocale();
    String name = messages.getMessage("figure." + figure.path(), null, locale);
    return new Choice(figure.path(), name + ", " + figure.unit());
  }

  private ModelPage page(MachineModel model) {
    return new ModelPage(
        model.id().toString(),
        model.name(),
        Typed.number(model.pulsesPerTurn()),
        model.note(),
        (int) units.ofModel(model.id(), PageQuery.first(1)).total(),
        model.settings().stream().map(s -> settingRow(model, s)).toList(),
        model.parts().stream().map(p -> partRow(model, p)).toList(),
        model.limits().stream().map(l -> limitRow(model, l)).toList());
  }

  private ModelPage.SettingRow settingRow(MachineModel model, SpeedSetting setting) {
    OptionalDouble pulses = model.pulsesPerSecond(setting);
    Double tone = setting.toneHz();
    return new ModelPage.SettingRow(
        setting.id().toString(),
        setting.label(),
        SpeedText.of(setting, preferences.get().speeds()),
        tone == null ? "" : SpeedText.digits(tone),
        pulses.isPresent() ? SpeedText.digits(pulses.getAsDouble()) : "",
        pulses.isPresent() && setting.pulsesPerSecond() == null);
  }

  private ModelPage.PartRow partRow(MachineModel model, RotatingPart part) {
    int mains = preferences.get().mainsHz();
    return new ModelPage.PartRow(
        part.name(),
        part.kind().name(),
        part.basis().name(),
        SpeedText.digits(part.amount()),
        part.referencePart(),
        digits(part.details().emptyMm()),
        model.settings().stream()
            .map(s -> model.turningAt(part, s, mains).map(ModelScreen::hertz).orElse(UNKNOWN))
            .toList());
  }

  private static String digits(@Nullable Double number) {
    return number == null ? "" : SpeedText.digits(number);
  }

  private static String hertz(Turning turning) {
    return turning.isRange()
        ? SpeedText.hertz(turning.lowHertz()) + " \u2013 " + SpeedText.hertz(turning.highHertz())
        : SpeedText.hertz(turning.hertz());
  }

  private static ModelPage.LimitRow limitRow(MachineModel model, ServiceLimit limit) {
    return new ModelPage.LimitRow(
        limit.settingId().toString(),
        model.setting(limit.settingId()).map(SpeedSetting::label).orElseThrow(),
        limit.figure().name(),
        limit.figure().path(),
        Typed.cell(limit.upperBound()),
        limit.figure().unit(),
        limit.origin());
  }

  private static void addUnlessTyped(Model screen, String name, Object empty) {
    if (!screen.containsAttribute(name)) {
      screen.addAttribute(name, empty);
    }
  }
}
