package turnsheet.reading.web;

import java.util.List;
import java.util.Locale;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.reading.Population;
import turnsheet.reading.Populations;
import turnsheet.shop.MachineModel;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.web.TypicalFigures;
import turnsheet.web.Wording;

/** Tells the page of a model what is typical for its units. */
@Component
class TypicalOfModel implements TypicalFigures {

  private final Populations populations;
  private final MessageSource messages;

  TypicalOfModel(Populations populations, MessageSource messages) {
    this.populations = populations;
    this.messages = messages;
  }

  @Override
  public List<Row> of(MachineModel model, Locale locale) {
    Wording words = new Wording(messages, locale);
    return populations.ofModel(model.id()).stream().map(p -> row(p, model, words)).toList();
  }

  private static Row row(Population population, MachineModel model, Wording words) {
    TypicalText text = new TypicalText(words);
    return new Row(
        model.setting(population.settingId()).map(SpeedSetting::label).orElse(""),
        words.nameOf(population.figure()),
        population.units(),
        text.lower(population),
        text.median(population),
        text.upper(population));
  }
}
