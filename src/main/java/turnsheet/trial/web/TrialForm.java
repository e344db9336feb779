package turnsheet.trial.web;

import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.validation.Errors;
import turnsheet.core.diagnose.filter.Circuit;
import turnsheet.core.diagnose.filter.ESeries;
import turnsheet.core.diagnose.filter.FilterFamily;
import turnsheet.core.diagnose.filter.FilterKind;
import turnsheet.shop.web.Typed;
import turnsheet.trial.TrialOrder;

/**
 * A trial as typed.
 *
 * @param levelFollows empty for no
 */
record TrialForm(
    List<FilterKind> kinds,
    List<FilterFamily> families,
    List<Integer> poles,
    String highPassFrom,
    String highPassTo,
    String lowPassFrom,
    String lowPassTo,
    String steps,
    String hysteresis,
    String offset,
    String goodEnough,
    String lowest,
    String highest,
    String levelFollows,
    ESeries series,
    String capacitor,
    String resistorPercent,
    String capacitorPercent) {

  /** Decades to choose from, in farads. */
  static final List<String> CAPACITORS = List.of("1e-9", "10e-9", "100e-9", "1e-6");

  static final List<Integer> POLES = List.of(2, 4, 6, 8);

  TrialForm {
    kinds = given(kinds);
    families = given(families);
    poles = given(poles);
    series = given(series);
    highPassFrom = Typed.text(highPassFrom);
    highPassTo = Typed.text(highPassTo);
    lowPassFrom = Typed.text(lowPassFrom);
    lowPassTo = Typed.text(lowPassTo);
    steps = Typed.text(steps);
    hysteresis = Typed.text(hysteresis);
    offset = Typed.text(offset);
    goodEnough = Typed.text(goodEnough);
    lowest = Typed.text(lowest);
    highest = Typed.text(highest);
    levelFollows = Typed.text(levelFollows);
    capacitor = Typed.text(capacitor);
    resistorPercent = Typed.text(resistorPercent);
    capacitorPercent = Typed.text(capacitorPercent);
  }

  static TrialForm of(TrialOrder order) {
    return new TrialForm(
        order.kinds(),
        order.families(),
        order.poles(),
        Typed.number(order.highPass().fromHz()),
        Typed.number(order.highPass().toHz()),
        Typed.number(order.lowPass().fromHz()),
        Typed.number(order.lowPass().toHz()),
        Integer.toString(order.steps()),
        Typed.number(order.comparator().hysteresisPercent()),
        Typed.number(order.comparator().offsetPercent()),
        Typed.number(order.comparator().goodEnoughPercent()),
        Typed.number(order.speeds().lowestHz()),
        Typed.number(order.speeds().highestHz()),
        order.speeds().levelFollows() ? "yes" : "",
        order.parts().series(),
        CAPACITORS.stream()
            .filter(c -> Double.parseDouble(c) == order.parts().capacitorFarad())
            .findFirst()
            .orElse("10e-9"),
        Typed.number(order.parts().resistorPercent()),
        Typed.number(order.parts().capacitorPercent()));
  }

  /** The order meant; nothing where the errors say why. */
  Optional<TrialOrder> order(Errors errors) {
    required(errors, "kinds", kinds);
    required(errors, "families", families);
    required(errors, "poles", poles);
    Double highFrom = Typed.positive(errors, "highPassFrom", highPassFrom);
    Double highTo = Typed.positive(errors, "highPassTo", highPassTo);
    Double lowFrom = Typed.positive(errors, "lowPassFrom", lowPassFrom);
    Double lowTo = Typed.positive(errors, "lowPassTo", lowPassTo);
    upwards(errors, "highPassTo", highFrom, highTo);
    upwards(errors, "lowPassTo", lowFrom, lowTo);
    if (kinds.contains(FilterKind.BAND_PASS)
        && highTo != null
        && lowTo != null
        && highTo >= lowTo) {
      errors.rejectValue("lowPassTo", "trial.form.band");
    }
    Double slow = Typed.positive(errors, "lowest", lowest);
    Double fast = Typed.positive(errors, "highest", highest);
    upwards(errors, "highest", slow, fast);
    Integer count = Typed.countOrNone(errors, "steps", steps);
    if (count != null && count > TrialOrder.MOST_STEPS) {
      errors.rejectValue("steps", "trial.form.steps");
    }
    TrialOrder.After after = after(errors);
    Circuit.Parts parts = parts(errors);
    if (errors.hasErrors()
        || highFrom == null
        || highTo == null
        || lowFrom == null
        || lowTo == null
        || slow == null
        || fast == null
        || after == null
        || parts == null) {
      return Optional.empty();
    }
    return Optional.of(
        new TrialOrder(
            kinds,
            families,
            poles,
            new TrialOrder.Range(highFrom, highTo),
            new TrialOrder.Range(lowFrom, lowTo),
            count == null ? 1 : count,
            after,
            new TrialOrder.Speeds(slow, fast, !levelFollows.isEmpty()),
            parts));
  }

  private TrialOrder.@Nullable After after(Errors errors) {
    Double width = Typed.notNegativeOrNone(errors, "hysteresis", hysteresis);
    boolean below = offset.startsWith("-") || offset.startsWith("\u2212");
    Double shift = Typed.notNegativeOrNone(errors, "offset", below ? offset.substring(1) : offset);
    Double enough = Typed.notNegativeOrNone(errors, "goodEnough", goodEnough);
    share(errors, "hysteresis", width, 100);
    share(errors, "offset", shift, 50);
    if (errors.hasErrors()) {
      return null;
    }
    double up = shift == null ? 0 : shift;
    return new TrialOrder.After(
        width == null ? 0 : width, below ? -up : up, enough == null ? 0 : enough);
  }

  private Circuit.@Nullable Parts parts(Errors errors) {
    Double resistors = Typed.notNegativeOrNone(errors, "resistorPercent", resistorPercent);
    Double capacitors = Typed.notNegativeOrNone(errors, "capacitorPercent", capacitorPercent);
    share(errors, "resistorPercent", resistors, 50);
    share(errors, "capacitorPercent", capacitors, 50);
    if (errors.hasErrors()) {
      return null;
    }
    return new Circuit.Parts(
        series,
        Double.parseDouble(CAPACITORS.contains(capacitor) ? capacitor : "10e-9"),
        resistors == null ? 0 : resistors,
        capacitors == null ? 0 : capacitors);
  }

  /** A box that is not ticked is not sent. */
  private static <T> List<T> given(@Nullable List<T> sent) {
    return sent == null ? List.of() : sent;
  }

  private static ESeries given(@Nullable ESeries sent) {
    return sent == null ? ESeries.E96 : sent;
  }

  private static void required(Errors errors, String field, List<?> chosen) {
    if (chosen.isEmpty()) {
      errors.rejectValue(field, "trial.form.choose");
    }
  }

  private static void upwards(
      Errors errors, String field, @Nullable Double from, @Nullable Double to) {
    if (from != null && to != null && to < from) {
      errors.rejectValue(field, "trial.form.upwards");
    }
  }

  private static void share(Errors errors, String field, @Nullable Double value, double below) {
    if (value != null && value >= below) {
      errors.rejectValue(
          field, "trial.form.below", new Object[] {Integer.toString((int) below)}, "");
    }
  }
}
