package turnsheet.evidence.web;

import java.util.ArrayList;
import java.util.List;
import org.springframework.core.annotation.Order;
import org.springframework.stereotype.Component;
import turnsheet.core.diagnose.mains.Mains;
import turnsheet.core.diagnose.mains.SupplySplit;
import turnsheet.core.measure.Causes;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;
import turnsheet.core.stats.Budget;
import turnsheet.evidence.Section;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.SvgChart;
import turnsheet.reading.chart.TimeMarks;
import turnsheet.web.Numbers.Sign;
import turnsheet.web.Shown;
import turnsheet.web.Wording;

/** Shows the mains frequency and, of a synchronous motor, what the supply does to the speed. */
@Component
@Order(10)
class MainsView implements SectionView {

  private static final int HEIGHT = 240;

  @Override
  public String name() {
    return "mains";
  }

  @Override
  public String template() {
    return "evidence/_mains";
  }

  @Override
  public String title(Wording words) {
    return words.text("evidence.mains.title");
  }

  @Override
  public String what(Wording words) {
    return words.text("evidence.mains.what");
  }

  @Override
  public MainsPage page(Section section, SectionView.Beside beside, Wording words) {
    Mains mains = section.found(Mains.class).orElseThrow();
    Figure frequency = mains.frequencyHz();
    Double hertz = frequency.value();
    double off = hertz == null ? 0 : 100 * (hertz / mains.nominalHz() - 1);
    Reading reading = beside.reading();
    return new MainsPage(
        words.text(
            "evidence.mains.sentence",
            words.numbers().show(frequency, "Hz", Sign.PLAIN).text(),
            words.numbers().show(off, 0.01, "%", Sign.SHOWN).valueAndUnit(),
            words.numbers().plain(mains.nominalHz())),
        clock(frequency, words),
        beside.captureId(),
        reading.source().channel(),
        beside.synchronous(),
        beside.synchronous() ? split(reading, mains, words) : null,
        mains.points().size() < 2 ? null : picture(mains, words),
        words.numbers().show(mains.wanderHz(), "Hz", Sign.PLAIN),
        rows(mains, words));
  }

  private static String clock(Figure frequency, Wording words) {
    double share =
        frequency.budget().stream()
            .filter(c -> c.cause().equals(Causes.CLOCK))
            .mapToDouble(c -> Budget.K * 1000 * c.standardUncertainty())
            .sum();
    return words.text("evidence.mains.clock", words.numbers().fixed(share, 1));
  }

  private static MainsPage.Split split(Reading reading, Mains mains, Wording words) {
    Figure deviation = reading.speed().deviationPercent();
    SupplySplit split = SupplySplit.of(deviation, mains);
    Shown whole = words.numbers().show(deviation, "%", Sign.SHOWN);
    Shown supply = words.numbers().show(split.supplyPercent(), "%", Sign.SHOWN);
    Shown rest = words.numbers().show(split.restPercent(), "%", Sign.SHOWN);
    return new MainsPage.Split(
        words.text("evidence.mains.split.sentence", whole.text(), supply.text(), rest.text()),
        whole,
        supply,
        rest);
  }

  private static Picture picture(Mains mains, Wording words) {
    List<TimeMarks.Point> points = new ArrayList<>();
    List<List<String>> rows = new ArrayList<>();
    double[] values = new double[2 * mains.points().size()];
    double end = 1;
    for (Mains.Point p : mains.points()) {
      double half = Budget.K * p.noiseHz();
      values[2 * points.size()] = p.frequencyHz() - half;
      values[2 * points.size() + 1] = p.frequencyHz() + half;
      points.add(TimeMarks.Point.of(p.timeSeconds(), p.frequencyHz(), half));
      end = Math.max(end, p.timeSeconds());
      rows.add(
          List.of(
              words.numbers().fixed(p.timeSeconds(), 1),
              words.numbers().fixed(p.frequencyHz(), 4),
              words.numbers().fixed(half, 4)));
    }
    Axis x = Axis.linear(words.text("evidence.axis.time"), "s", 0, 1.08 * end);
    Axis y = Axis.around(words.text("evidence.mains.axis"), "Hz", values);
    SvgChart chart =
        new SvgChart(
                x,
                y,
                HEIGHT,
                words.text("evidence.mains.chart"),
                words.text("evidence.mains.chart.more"))
            .decimalSign(words.numbers().decimalSign());
    chart.limit(mains.nominalHz(), words.text("evidence.mains.nominal"));
    chart.mark(TimeMarks.join(points)).mark(TimeMarks.dots(1, points));
    return new Picture(
        chart.toSvg(),
        List.of(
            words.text("evidence.mains.column.time"),
            words.text("evidence.mains.column.frequency"),
            words.text("evidence.mains.column.uncertainty")),
        rows);
  }

  private static List<MainsPage.Row> rows(Mains mains, Wording words) {
    return mains.harmonics().stream().map(h -> row(h, words)).toList();
  }

  private static MainsPage.Row row(Mains.Harmonic harmonic, Wording words) {
    return new MainsPage.Row(
        Integer.toString(harmonic.order()),
        words.numbers().fixed(harmonic.rateHz(), 3),
        words.numbers().fixed(20 * Math.log10(harmonic.peak()), 1),
        words.numbers().fixed(harmonic.overNoiseDb(), 1));
  }
}
