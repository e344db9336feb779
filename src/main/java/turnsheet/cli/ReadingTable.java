package turnsheet.cli;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Warning;

/** A reading as a short table for the shell: name, value, uncertainty, unit. */
final class ReadingTable {

  private static final int MOST_LINES = 8;

  private final StringBuilder text = new StringBuilder();

  private ReadingTable() {}

  static String of(Reading reading, List<Recognised.Guess> guesses) {
    ReadingTable table = new ReadingTable();
    table.head(reading);
    table.speed(reading);
    table.lines(reading);
    if (reading.edges() != null) {
      table.edges(reading.edges());
    }
    for (Recognised.Guess guess : guesses) {
      table.text.append("assumed: ").append(guess.taken()).append('\n');
    }
    for (Warning warning : reading.warnings()) {
      table.text.append("note: ").append(warning.message()).append('\n');
    }
    table.text.append("Intervals hold the truth in about 95 of 100 cases (k = 2).\n");
    return table.text.toString();
  }

  private void head(Reading reading) {
    Reading.Source source = reading.source();
    text.append(
        String.format(
            Locale.ROOT,
            "%s, channel %d, %.2f s, %s, method %s%n",
            source.format(),
            source.channel(),
            source.durationSeconds(),
            source.kind().name().toLowerCase(Locale.ROOT),
            reading.method().version()));
    text.append(String.format("SHA-256 %s%n%n", source.sha256()));
  }

  private void speed(Reading reading) {
    Reading.Speed speed = reading.speed();
    Reading.Flutter flutter = reading.flutter();
    row("mean rate", speed.meanHz(), "Hz");
    row("speed deviation", speed.deviationPercent(), "%");
    row("drift", speed.driftPercentPerMinute(), "%/min");
    row("weighted, two sigma", flutter.weightedTwoSigmaPercent(), "%");
    row("weighted, quasi-peak", flutter.weightedQuasiPeakPercent(), "%");
    row("weighted, rms", flutter.weightedRmsPercent(), "%");
    row("unweighted, rms", flutter.unweightedRmsPercent(), "%");
    row("floor of the recording", reading.signal().floorPercent(), "%");
  }

  private void lines(Reading reading) {
    for (Reading.Line line :
        reading.lines().subList(0, Math.min(MOST_LINES, reading.lines().size()))) {
      Double rate = line.rateHz().value();
      String name = String.format(Locale.ROOT, "line at %.3f Hz, peak", rate == null ? 0 : rate);
      row(name, line.peakPercent(), "%");
    }
  }

  private void edges(Reading.Edges edges) {
    text.append(
        String.format(
            "%-30s %d, %d missing, %d extra%n",
            "edges", edges.count(), edges.missing(), edges.extra()));
    row("mean period", edges.meanPeriodMicroseconds(), "us");
    row("standard deviation of periods", edges.periodStdDevMicroseconds(), "us");
    row("cycle to cycle, rms", edges.cycleToCycleMicroseconds(), "us");
    row("noise of an edge", edges.edgeNoiseMicroseconds(), "us");
    if (edges.dutyPercent() != null) {
      row("high level", edges.dutyPercent(), "%");
    }
    if (edges.wheel() != null) {
      row("pattern of the wheel, rms", edges.wheel().patternRmsPercentOfPeriod(), "% of a period");
    }
  }

  private void row(String name, Figure figure, String unit) {
    Double value = figure.value();
    Double uncertainty = figure.expandedUncertainty();
    String shown;
    if (value == null) {
      shown = "-  (" + figure.why() + ")";
    } else if (uncertainty == null) {
      shown = number(value, null) + " " + unit + "  (uncertainty: " + figure.why() + ")";
    } else {
      shown = number(value, uncertainty) + " +/- " + number(uncertainty, uncertainty) + " " + unit;
    }
    text.append(String.format("%-30s %s%n", name, shown));
  }

  /** Two digits of the uncertainty decide how many of the value are shown (JCGM 100 7.2.6). */
  private static String number(double value, @Nullable Double uncertainty) {
    if (uncertainty == null || uncertainty == 0) {
      return new BigDecimal(value).round(new MathContext(5)).toPlainString();
    }
    int scale = 1 - (int) Math.floor(Math.log10(uncertainty));
    BigDecimal rounded =
        new BigDecimal(value).setScale(Math.min(12, scale), RoundingMode.HALF_EVEN);
    return rounded.setScale(Math.max(0, rounded.scale()), RoundingMode.UNNECESSARY).toPlainString();
  }
}
