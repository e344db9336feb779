package turnsheet.trial.web;

import java.util.ArrayList;
import java.util.List;
import turnsheet.core.diagnose.filter.Circuit;
import turnsheet.core.diagnose.filter.SallenKey;
import turnsheet.core.diagnose.filter.Section;
import turnsheet.reading.chart.Axis;
import turnsheet.reading.chart.Curve;
import turnsheet.reading.chart.SvgChart;
import turnsheet.web.Wording;

/** A circuit as the page shows it. */
final class CircuitView {

  private static final int HEIGHT = 280;
  private static final double LOWEST_DB = -80;

  /** Every so many points stand in the table. */
  private static final int TABLE_STEP = 6;

  private final Circuit circuit;
  private final Wording words;
  private final Values values;

  CircuitView(Circuit circuit, Wording words) {
    this.circuit = circuit;
    this.words = words;
    this.values = new Values(words);
  }

  TrialPage.CircuitPart part(String name) {
    List<String> drawings = new ArrayList<>();
    List<TrialPage.StageRow> sections = new ArrayList<>();
    List<TrialPage.PartRow> parts = new ArrayList<>();
    for (int k = 0; k < circuit.stages().size(); k++) {
      SallenKey stage = circuit.stages().get(k);
      drawings.add(drawing(stage, k + 1));
      sections.add(section(stage, circuit.bands().get(k), k + 1));
      parts.addAll(parts(stage, k + 1));
    }
    return new TrialPage.CircuitPart(
        words.text("trial.circuit.title", name),
        words.text(
            "trial.circuit.lead",
            Integer.toString(drawings.size()),
            circuit.parts().series().name(),
            values.farads(circuit.parts().capacitorFarad())),
        drawings,
        sections,
        parts,
        response(name),
        responseRows(),
        words.text(
            "trial.circuit.opAmp",
            values.frequency(circuit.opAmpHertz()),
            Integer.toString((int) Circuit.OP_AMP_MULTIPLE)),
        words.text(
            "trial.circuit.band",
            Integer.toString(Circuit.DRAWS),
            words.numbers().plain(circuit.parts().resistorPercent()),
            words.numbers().plain(circuit.parts().capacitorPercent())));
  }

  private String name(SallenKey stage, int number) {
    return words.text(
        stage.wanted().highPass() ? "trial.circuit.highStage" : "trial.circuit.lowStage",
        Integer.toString(number));
  }

  private String drawing(SallenKey stage, int number) {
    boolean first = number == 1;
    boolean last = number == circuit.stages().size();
    return StageDrawing.of(
        stage,
        number,
        name(stage, number),
        first ? words.text("trial.circuit.in") : Integer.toString(number - 1),
        last ? words.text("trial.circuit.out") : Integer.toString(number + 1),
        values);
  }

  private TrialPage.StageRow section(SallenKey stage, Circuit.StageBand band, int number) {
    Section built = stage.built();
    return new TrialPage.StageRow(
        name(stage, number),
        values.hertz(stage.wanted().f0Hz()),
        values.hertz(built.f0Hz()),
        words.text(
            "trial.circuit.between",
            values.hertz(band.f0Hz().low()),
            values.hertz(band.f0Hz().high())),
        values.three(stage.wanted().q()),
        values.three(built.q()),
        words.text(
            "trial.circuit.between", values.three(band.q().low()), values.three(band.q().high())));
  }

  private List<TrialPage.PartRow> parts(SallenKey stage, int number) {
    String resistors = percent(circuit.parts().resistorPercent());
    String capacitors = percent(circuit.parts().capacitorPercent());
    return List.of(
        new TrialPage.PartRow("R" + number + "1", values.ohms(stage.r1Ohm()), resistors),
        new TrialPage.PartRow("R" + number + "2", values.ohms(stage.r2Ohm()), resistors),
        new TrialPage.PartRow("C" + number + "1", values.farads(stage.c1Farad()), capacitors),
        new TrialPage.PartRow("C" + number + "2", values.farads(stage.c2Farad()), capacitors));
  }

  private String percent(double tolerance) {
    return "±\u202f" + words.numbers().plain(tolerance) + "\u202f%";
  }

  /** As wanted a full line; the band of the built ones about it. */
  private String response(String name) {
    List<Circuit.ResponseBand> points = circuit.responses();
    Curve[] wanted = new Curve[points.size() - 1];
    Curve[] bands = new Curve[points.size() - 1];
    for (int i = 0; i < wanted.length; i++) {
      Circuit.ResponseBand a = points.get(i);
      Circuit.ResponseBand b = points.get(i + 1);
      double step = b.hertz() - a.hertz();
      wanted[i] = Curve.ofSamples(a.hertz(), step, pair(a.wantedDb(), b.wantedDb()));
      bands[i] =
          Curve.ofBuckets(
              a.hertz(),
              step,
              2,
              pair(a.bandDb().low(), b.bandDb().low()),
              pair(a.bandDb().high(), b.bandDb().high()));
    }
    return new SvgChart(
            Axis.logarithmic(
                words.text("trial.circuit.frequency"),
                "Hz",
                points.get(0).hertz(),
                points.get(points.size() - 1).hertz()),
            Axis.linear(words.text("trial.circuit.gain"), "dB", LOWEST_DB, 6),
            HEIGHT,
            words.text("trial.circuit.response", name),
            words.text("trial.circuit.responseHint"))
        .decimalSign(words.numbers().decimalSign())
        .curve(wanted)
        .curve(bands)
        .limit(-3.01, words.text("trial.circuit.cutoff"))
        .toSvg();
  }

  private static float[] pair(double a, double b) {
    return new float[] {(float) Math.max(LOWEST_DB, a), (float) Math.max(LOWEST_DB, b)};
  }

  private List<List<String>> responseRows() {
    List<List<String>> rows = new ArrayList<>();
    for (int i = 0; i < circuit.responses().size(); i += TABLE_STEP) {
      Circuit.ResponseBand point = circuit.responses().get(i);
      rows.add(
          List.of(
              values.hertz(point.hertz()),
              values.decibels(point.wantedDb()),
              values.decibels(point.builtDb()),
              words.text(
                  "trial.circuit.between",
                  values.decibels(point.bandDb().low()),
                  values.decibels(point.bandDb().high()))));
    }
    return rows;
  }
}
