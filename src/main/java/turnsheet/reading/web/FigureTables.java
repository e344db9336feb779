package turnsheet.reading.web;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.function.Function;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Reading;
import turnsheet.reading.Judged;
import turnsheet.web.Numbers;
import turnsheet.web.Wording;

/** Lays the figures of one reading out in tables. */
final class FigureTables {

  private static final Numbers.Sign SIGNED = Numbers.Sign.SHOWN;
  private static final Numbers.Sign PLAIN = Numbers.Sign.PLAIN;

  private final Wording words;
  private final Reading reading;
  private final Map<FigureName, Judged> judged;

  FigureTables(Wording words, Reading reading, List<Judged> judged) {
    this.words = words;
    this.reading = reading;
    this.judged =
        judged.stream().collect(Collectors.toMap(j -> j.limit().figure(), Function.identity()));
  }

  List<ReadingPage.Group> main() {
    return List.of(group("reading.page.speed", speed()), group("reading.page.flutter", flutter()));
  }

  /** Nothing for a tone. */
  List<ReadingPage.Group> periods() {
    List<FigureRow> rows = edges();
    return rows.isEmpty() ? List.of() : List.of(group("reading.page.periods", rows));
  }

  List<ReadingPage.Group> recording() {
    return List.of(group("reading.page.recording", signal()));
  }

  private ReadingPage.Group group(String key, List<FigureRow> rows) {
    return new ReadingPage.Group(words.text(key), rows);
  }

  private List<FigureRow> speed() {
    Reading.Speed speed = reading.speed();
    return List.of(
        row(FigureName.DEVIATION),
        row(FigureName.DRIFT),
        plain("reading.figure.meanHz", speed.meanHz(), "Hz", PLAIN),
        plain("reading.figure.startDeviation", speed.startDeviationPercent(), "%", SIGNED),
        plain("reading.figure.endDeviation", speed.endDeviationPercent(), "%", SIGNED));
  }

  private List<FigureRow> flutter() {
    List<FigureRow> rows = new ArrayList<>();
    rows.add(row(FigureName.WEIGHTED_TWO_SIGMA));
    rows.add(row(FigureName.WEIGHTED_QUASI_PEAK));
    rows.add(row(FigureName.WEIGHTED_RMS));
    rows.add(row(FigureName.UNWEIGHTED_RMS));
    for (Reading.Band band : reading.flutter().bands()) {
      String name =
          words.text(
              "reading.figure.band",
              words.said(band.name()),
              words.numbers().plain(band.fromHz()),
              words.numbers().plain(band.toHz()));
      rows.add(
          new FigureRow(
              name, words.numbers().show(band.rmsPercent(), "%", PLAIN), "", "", null, "", null));
    }
    return rows;
  }

  private List<FigureRow> edges() {
    Reading.Edges edges = reading.edges();
    if (edges == null) {
      return List.of();
    }
    List<FigureRow> rows = new ArrayList<>();
    rows.add(plain("reading.figure.meanPeriod", edges.meanPeriodMicroseconds(), "µs", PLAIN));
    rows.add(row(FigureName.PERIOD_STD_DEV));
    rows.add(row(FigureName.CYCLE_TO_CYCLE));
    addIfKnown(rows, "reading.figure.duty", edges.dutyPercent());
    rows.add(plain("reading.figure.edgeNoise", edges.edgeNoiseMicroseconds(), "µs", PLAIN));
    Reading.Wheel wheel = edges.wheel();
    addIfKnown(
        rows, "reading.figure.wheel", wheel == null ? null : wheel.patternRmsPercentOfPeriod());
    return rows;
  }

  private List<FigureRow> signal() {
    return List.of(
        plain("reading.figure.snr", reading.signal().snrDb(), "dB", PLAIN),
        plain("reading.figure.floor", reading.signal().floorPercent(), "%", PLAIN));
  }

  private void addIfKnown(List<FigureRow> rows, String key, @Nullable Figure figure) {
    if (figure != null) {
      rows.add(plain(key, figure, "%", PLAIN));
    }
  }

  private FigureRow row(FigureName name) {
    return FigureRow.of(words, name, name.of(reading), judged.get(name));
  }

  private FigureRow plain(String key, Figure figure, String unit, Numbers.Sign sign) {
    return FigureRow.plain(words, key, figure, unit, sign);
  }
}
