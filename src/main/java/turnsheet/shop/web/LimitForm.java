package turnsheet.shop.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.Size;
import java.util.Optional;
import org.springframework.validation.Errors;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.MachineModel;
import turnsheet.shop.ServiceLimit;
import turnsheet.shop.SpeedSetting;

/**
 * A service limit as typed.
 *
 * @param setting id of a speed setting
 * @param figure path of a figure
 */
record LimitForm(
    String setting,
    String figure,
    String upperBound,
    @NotBlank(message = "{shop.form.origin}")
        @Size(max = ServiceLimit.ORIGIN_LENGTH, message = "{shop.form.tooLong}")
        String origin) {

  static final LimitForm EMPTY = new LimitForm("", "", "", "");

  LimitForm {
    setting = Typed.text(setting);
    figure = Typed.text(figure);
    upperBound = Typed.text(upperBound);
    origin = Typed.text(origin);
  }

  static LimitForm of(ServiceLimit limit) {
    return new LimitForm(
        limit.settingId().toString(),
        limit.figure().path(),
        Typed.number(limit.upperBound()),
        limit.origin());
  }

  /** The limit meant; nothing where the errors say why. */
  Optional<ServiceLimit> limit(MachineModel model, Errors errors) {
    Double bound = Typed.positive(errors, "upperBound", upperBound);
    Optional<SpeedSetting> at =
        model.settings().stream().filter(s -> s.id().toString().equals(setting)).findFirst();
    if (at.isEmpty()) {
      errors.rejectValue("setting", "shop.form.choose");
    }
    Optional<FigureName> bounded = FigureName.ofPath(figure);
    if (bounded.isEmpty()) {
      errors.rejectValue("figure", "shop.form.choose");
    }
    return errors.hasErrors() || bound == null
        ? Optional.empty()
        : at.flatMap(s -> bounded.map(f -> new ServiceLimit(s.id(), f, bound, origin)));
  }
}
