package turnsheet.shop.web;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;
import turnsheet.access.ShopPreferences;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.core.diagnose.parts.Turning;
import turnsheet.shop.MachineModel;
import turnsheet.shop.PartBasis;
import turnsheet.shop.PartDetails;
import turnsheet.shop.RotatingPart;
import turnsheet.shop.SpeedSetting;

/** Between rotating parts and their JSON. */
@Component
class PartDocuments {

  private final Refusals refusals;
  private final ShopPreferences preferences;

  PartDocuments(Refusals refusals, ShopPreferences preferences) {
    this.refusals = refusals;
    this.preferences = preferences;
  }

  RotatingPart read(ModelDocument.Part sent) {
    Integer poles = sent.mainsPolePairs();
    Double onMains = poles == null ? null : Double.valueOf(poles);
    long given =
        Stream.of(
                sent.diameterMm(),
                sent.turnsPerTurn(),
                sent.turnsPerMinute(),
                sent.lengthMm(),
                onMains)
            .filter(Objects::nonNull)
            .count();
    if (given != 1) {
      throw refusals.answer("partOnce", sent.name());
    }
    if (sent.turnsPerTurn() == null && sent.lengthMm() == null && sent.turnsOf() != null) {
      throw refusals.answer("turnsOfAlone", sent.name());
    }
    PartBasis basis = basis(sent);
    Double amount = amount(sent, basis);
    PartDetails details = sent.details();
    return new RotatingPart(
        sent.name(),
        kind(sent),
        basis,
        amount == null ? Objects.requireNonNull(onMains) : amount,
        sent.turnsOf(),
        details == null ? PartDetails.NONE : details);
  }

  private PartKind kind(ModelDocument.Part sent) {
    String word = sent.kind();
    if (word == null) {
      return PartKind.OTHER;
    }
    return Arrays.stream(PartKind.values())
        .filter(k -> k != PartKind.MAINS && word(k).equals(word))
        .findFirst()
        .orElseThrow(() -> refusals.answer("partKindUnknown", sent.name(), word));
  }

  private static PartBasis basis(ModelDocument.Part sent) {
    if (sent.turnsPerTurn() != null) {
      return PartBasis.TURNS_PER_TURN;
    }
    if (sent.diameterMm() != null) {
      return PartBasis.DIAMETER_MM;
    }
    if (sent.lengthMm() != null) {
      return PartBasis.LENGTH_MM;
    }
    return sent.turnsPerMinute() == null ? PartBasis.MAINS_POLE_PAIRS : PartBasis.FIXED_PER_MINUTE;
  }

  private static @Nullable Double amount(ModelDocument.Part sent, PartBasis basis) {
    return switch (basis) {
      case DIAMETER_MM -> sent.diameterMm();
      case TURNS_PER_TURN -> sent.turnsPerTurn();
      case FIXED_PER_MINUTE -> sent.turnsPerMinute();
      case LENGTH_MM -> sent.lengthMm();
      case MAINS_POLE_PAIRS -> null;
    };
  }

  ModelDocument.Part write(MachineModel model, RotatingPart part) {
    int mains = preferences.get().mainsHz();
    List<ModelDocument.Rate> rates = new ArrayList<>();
    for (SpeedSetting setting : model.settings()) {
      model.turningAt(part, setting, mains).ifPresent(t -> rates.add(rate(setting, t)));
    }
    return new ModelDocument.Part(
        part.name(),
        word(part.kind()),
        amount(part, PartBasis.DIAMETER_MM),
        amount(part, PartBasis.TURNS_PER_TURN),
        amount(part, PartBasis.FIXED_PER_MINUTE),
        amount(part, PartBasis.LENGTH_MM),
        part.basis() == PartBasis.MAINS_POLE_PAIRS ? (Integer) (int) part.amount() : null,
        part.referencePart(),
        part.details().equals(PartDetails.NONE) ? null : part.details(),
        rates);
  }

  private static ModelDocument.Rate rate(SpeedSetting setting, Turning turning) {
    return new ModelDocument.Rate(
        setting.label(),
        turning.hertz(),
        turning.isRange() ? turning.lowHertz() : null,
        turning.isRange() ? turning.highHertz() : null);
  }

  private static @Nullable Double amount(RotatingPart part, PartBasis basis) {
    return part.basis() == basis ? part.amount() : null;
  }

  private static String word(PartKind kind) {
    return kind.name().toLowerCase(Locale.ROOT);
  }
}
