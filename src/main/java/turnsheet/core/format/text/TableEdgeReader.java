package turnsheet.core.format.text;

import java.io.IOException;
import java.util.List;
import turnsheet.core.format.api.Contents;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/**
 * Edges of a table: times of rising edges, times with the level that begins there, or periods.
 *
 * <p>With levels, a first row at time 0 is the level before the first edge; a row that repeats the
 * level is no edge. Periods are summed with compensation (Kahan 1965) in the unit of the file, from
 * a first edge at 0.
 */
final class TableEdgeReader implements EdgeReader {

  private static final int UNKNOWN = -1;

  private final DataRows rows;
  private final TablePlan plan;
  private final boolean periods;
  private final boolean levels;
  private boolean begun;
  private boolean ended;
  private double time = Double.NEGATIVE_INFINITY;
  private double lost;
  private int level = UNKNOWN;

  TableEdgeReader(DataRows rows, TablePlan plan) {
    this.rows = rows;
    this.plan = plan;
    this.periods = plan.contents() == Contents.PERIODS;
    this.levels = !periods && plan.valueColumn() >= 0;
  }

  @Override
  public int read(double[] timesSeconds, boolean[] rising) throws IOException, RejectedException {
    int n = 0;
    if (periods && !begun && timesSeconds.length > 0) {
      begun = true;
      time = 0;
      timesSeconds[n] = 0;
      rising[n++] = true;
    }
    while (n < timesSeconds.length && !ended) {
      if (!rows.next() || !takeRow()) {
        ended = true;
      } else if (!levels || levelChanges()) {
        timesSeconds[n] = plan.scale().seconds(time);
        rising[n++] = !levels || level == 1;
      }
    }
    return n;
  }

  @Override
  public double timeStepSeconds() {
    return plan.scale().seconds(plan.digits().resolution(0));
  }

  @Override
  public List<Warning> warnings() {
    return rows.warnings();
  }

  @Override
  public void close() throws IOException {
    rows.close();
  }

  /** False where the file stops within this row. */
  private boolean takeRow() throws RejectedException {
    return periods ? takePeriod(rows.second()) : takeTime(rows.first());
  }

  private boolean takePeriod(double period) throws RejectedException {
    if (!(period > 0)) {
      rows.refuse(
          "periodNotPositive",
          "Line "
              + rows.line()
              + ": "
              + period
              + " is no period: periods are greater than 0; remove the line or choose what the"
              + " numbers stand for.");
      return false;
    }
    double corrected = period - lost;
    double sum = time + corrected;
    lost = (sum - time) - corrected;
    time = sum;
    return true;
  }

  private boolean takeTime(double now) throws RejectedException {
    if (now < time) {
      rows.refuse("timeRunsBackwards", Sentences.backwards(rows.line(), time, now));
      return false;
    }
    if (levels && rows.second() != 0 && rows.second() != 1) {
      rows.refuse(
          "notALevel",
          "Line "
              + rows.line()
              + ": "
              + rows.second()
              + " is no level: edge lists hold 0 and 1; choose waveform where these are samples.");
      return false;
    }
    time = now;
    return true;
  }

  private boolean levelChanges() {
    int before = level;
    level = (int) rows.second();
    return before == UNKNOWN ? time != 0 : before != level;
  }
}
