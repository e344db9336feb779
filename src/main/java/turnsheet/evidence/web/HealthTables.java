package turnsheet.evidence.web;

import java.util.ArrayList;
import java.util.List;
import turnsheet.core.diagnose.sensor.SensorHealth;
import turnsheet.core.diagnose.sensor.TwoReadings;
import turnsheet.core.measure.Figure;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.Curve;
import turnsheet.reading.chart.SvgChart;
import turnsheet.web.Numbers.Sign;
import turnsheet.web.Shown;
import turnsheet.web.Wording;

/** Tables and the drawing of the section about the sensor's signal. */
final class HealthTables {

  private static final int HEIGHT = 240;
  private static final int TABLE_STEP = 8;

  private HealthTables() {}

  static List<HealthPage.Fact> facts(SensorHealth health, Wording words) {
    List<HealthPage.Fact> facts = new ArrayList<>();
    facts.add(plain("evidence.health.looked", health.lookedSeconds(), "s", words));
    facts.add(plain("evidence.health.low", health.low(), "", words));
    facts.add(plain("evidence.health.high", health.high(), "", words));
    Double noise = health.noiseRms();
    if (noise != null) {
      facts.add(plain("evidence.health.noise", noise, "", words));
    }
    facts.add(figure("evidence.health.snr", health.snrDb(), "dB", words));
    facts.add(plain("evidence.health.distortion", health.distortionPercent(), "%", words));
    facts.add(figure("evidence.health.duty", health.dutyPercent(), "%", words));
    facts.add(figure("evidence.health.riseSlope", health.riseSlopePerSecond(), "1/s", words));
    facts.add(figure("evidence.health.fallSlope", health.fallSlopePerSecond(), "1/s", words));
    facts.add(figure("evidence.health.rise", health.riseMicroseconds(), "µs", words));
    facts.add(
        figure("evidence.health.predicted", health.predictedEdgeNoiseMicroseconds(), "µs", words));
    facts.add(figure("evidence.health.measured", health.edgeNoiseMicroseconds(), "µs", words));
    return facts;
  }

  private static HealthPage.Fact plain(String key, double value, String unit, Wording words) {
    return new HealthPage.Fact(
        words.text(key), words.numbers().show(value, null, unit, Sign.PLAIN));
  }

  private static HealthPage.Fact figure(String key, Figure figure, String unit, Wording words) {
    return new HealthPage.Fact(words.text(key), words.numbers().show(figure, unit, Sign.PLAIN));
  }

  static Picture pulse(SensorHealth health, Wording words) {
    int count = health.pulse().size();
    float[] values = new float[count + 1];
    double[] all = new double[count + 1];
    List<List<String>> rows = new ArrayList<>();
    for (int i = 0; i <= count; i++) {
      all[i] = health.pulse().get(i % count);
      values[i] = (float) all[i];
      if (i % TABLE_STEP == 0) {
        rows.add(
            List.of(words.numbers().fixed(100.0 * i / count, 1), words.numbers().fixed(all[i], 4)));
      }
    }
    SvgChart chart =
        new SvgChart(
                Axis.linear(words.text("evidence.health.axis.place"), "%", 0, 100),
                Axis.around(words.text("evidence.health.axis.level"), "", all),
                HEIGHT,
                words.text("evidence.health.chart"),
                words.text("evidence.health.chart.more"))
            .decimalSign(words.numbers().decimalSign());
    chart.limit((health.low() + health.high()) / 2, words.text("evidence.health.crossing"));
    return new Picture(
        chart.curve(Curve.ofSamples(0, 100.0 / count, values)).toSvg(),
        List.of(
            words.text("evidence.health.column.place"), words.text("evidence.health.axis.level")),
        rows);
  }

  static List<HealthPage.Both> both(TwoReadings both, Wording words) {
    Shown none = words.numbers().show(0, null, "%", Sign.PLAIN);
    return List.of(
        both("evidence.health.unweighted", both.edgesPercent(), both.bandPercent(), words),
        both(
            "evidence.health.weighted",
            both.edgesWeightedPercent(),
            both.bandWeightedPercent(),
            words),
        both("evidence.health.floor", both.edgesFloorPercent(), both.bandFloorPercent(), words),
        new HealthPage.Both(
            words.text("evidence.health.false"),
            words.numbers().show(both.falsePercent(), null, "%", Sign.PLAIN),
            none),
        both(
            "evidence.health.least",
            both.smallestByEdgesPercent(),
            both.smallestByBandPercent(),
            words));
  }

  private static HealthPage.Both both(String key, Figure edges, Figure band, Wording words) {
    return new HealthPage.Both(
        words.text(key),
        words.numbers().show(edges, "%", Sign.PLAIN),
        words.numbers().show(band, "%", Sign.PLAIN));
  }
}
