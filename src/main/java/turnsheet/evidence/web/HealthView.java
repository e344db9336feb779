package turnsheet.evidence.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import org.springframework.core.annotation.Order;
import org.springframework.stereotype.Component;
import turnsheet.core.diagnose.sensor.RidingLine;
import turnsheet.core.diagnose.sensor.SensorHealth;
import turnsheet.core.diagnose.sensor.TwoReadings;
import turnsheet.evidence.Section;
import turnsheet.web.Numbers.Sign;
import turnsheet.web.Shown;
import turnsheet.web.Wording;

/** Shows how healthy the waveform of a tachometer is. */
@Component
@Order(20)
class HealthView implements SectionView {

  /** Measured edge noise up to this many times the predicted one is explained by it. */
  private static final double EXPLAINED = 1.3;

  @Override
  public String name() {
    return "health";
  }

  @Override
  public String template() {
    return "evidence/_health";
  }

  @Override
  public String title(Wording words) {
    return words.text("evidence.health.title");
  }

  @Override
  public String what(Wording words) {
    return words.text("evidence.health.what");
  }

  @Override
  public HealthPage page(Section section, SectionView.Beside beside, Wording words) {
    SensorHealth health = section.found(SensorHealth.class).orElseThrow();
    TwoReadings both = health.readings();
    return new HealthPage(
        both == null ? null : smallest(both, words),
        health.refusal() == null ? null : health.refusal().message(),
        edgeNoise(health, words),
        hysteresis(health, words),
        HealthTables.facts(health, words),
        HealthTables.pulse(health, words),
        health.riding().stream().map(r -> riding(r, words)).toList(),
        both == null
            ? ""
            : words.text("evidence.health.top", words.numbers().fixed(both.bandTopHz(), 0)),
        both == null ? List.of() : HealthTables.both(both, words),
        both == null ? List.of() : both.lines().stream().map(l -> line(l, words)).toList());
  }

  private static String smallest(TwoReadings both, Wording words) {
    Shown edges = words.numbers().show(both.smallestByEdgesPercent(), "%", Sign.PLAIN);
    Shown band = words.numbers().show(both.smallestByBandPercent(), "%", Sign.PLAIN);
    return words.text("evidence.health.smallest", edges.valueAndUnit(), band.valueAndUnit());
  }

  private static String edgeNoise(SensorHealth health, Wording words) {
    Double predicted = health.predictedEdgeNoiseMicroseconds().value();
    Double measured = health.edgeNoiseMicroseconds().value();
    if (predicted == null || measured == null) {
      return "";
    }
    String first = microseconds(predicted, words);
    String second = microseconds(measured, words);
    return measured < EXPLAINED * predicted
        ? words.text("evidence.health.noise.explained", first, second)
        : words.text("evidence.health.noise.more", first, second);
  }

  private static String microseconds(double value, Wording words) {
    return words.numbers().show(value, null, "µs", Sign.PLAIN).valueAndUnit();
  }

  private static String hysteresis(SensorHealth health, Wording words) {
    String widest = words.numbers().fixed(health.hysteresis().widestPercent(), 0);
    Double needed = health.hysteresis().neededPercent();
    if (needed == null) {
      return words.text("evidence.health.hysteresis.widest", widest);
    }
    String least = words.numbers().show(needed, null, "", Sign.PLAIN).value();
    return needed < health.hysteresis().widestPercent()
        ? words.text("evidence.health.hysteresis.room", widest, least)
        : words.text("evidence.health.hysteresis.none", widest, least);
  }

  private static HealthPage.Riding riding(RidingLine line, Wording words) {
    return new HealthPage.Riding(
        words.text("evidence.health.cause." + line.cause().name()),
        words.numbers().fixed(line.rateHz(), 2),
        words.numbers().show(line.peak(), null, "", Sign.PLAIN).value(),
        words.numbers().fixed(line.relativeDb(), 1),
        words.numbers().fixed(line.falseRateHz(), 2),
        percent(line.falsePeakPercent(), words));
  }

  private static HealthPage.Line line(TwoReadings.Line line, Wording words) {
    Double band = line.bandPeakPercent();
    return new HealthPage.Line(
        words.numbers().fixed(line.rateHz(), 2),
        percent(line.edgesPeakPercent(), words),
        optional(band, words),
        optional(band == null ? null : line.edgesPeakPercent() - band, words),
        optional(line.predictedPercent(), words),
        band == null
            ? words.text("evidence.health.beyond")
            : words.text("evidence.health.who." + line.who().name()));
  }

  private static String optional(@Nullable Double value, Wording words) {
    return value == null ? "\u2013" : percent(value, words);
  }

  private static String percent(double value, Wording words) {
    return words.numbers().fixed(value, 4);
  }
}
