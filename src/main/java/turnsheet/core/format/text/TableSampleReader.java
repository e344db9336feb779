package turnsheet.core.format.text;

import java.io.IOException;
import java.util.List;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/**
 * Samples of a value column; where there is a time column, its steps are checked on the way.
 *
 * <p>A step that is off by more than a quarter (and by more than the printed digits explain) is a
 * rejection, a smaller unevenness one warning.
 */
final class TableSampleReader implements SampleReader {

  /** Beyond this a row is missing or doubled rather than late. */
  private static final double GAP = 0.25;

  /** Below this unevenness is of no account: it averages out over the record. */
  private static final double JITTER = 1e-3;

  /** A mean step off by less than this does not show in any figure. */
  private static final double DRIFT = 1e-6;

  private final DataRows rows;
  private final TablePlan plan;
  private double firstTime;
  private double time;
  private long count;
  private boolean jitterTold;
  private boolean ended;
  private double resolution;
  private double coarseFrom;

  TableSampleReader(DataRows rows, TablePlan plan) {
    this.rows = rows;
    this.plan = plan;
    this.resolution = plan.digits().resolution(0);
    this.coarseFrom = plan.digits().fineBelow();
  }

  @Override
  public double sampleRateHertz() {
    return plan.sampleRateHertz();
  }

  @Override
  public int read(double[] into) throws IOException, RejectedException {
    int n = 0;
    while (n < into.length && !ended) {
      if (!rows.next() || !timeFits()) {
        finish();
        break;
      }
      into[n++] = rows.second();
    }
    return n;
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
  private boolean timeFits() throws RejectedException {
    if (plan.step() > 0) {
      double before = time;
      time = rows.first();
      if (count == 0) {
        firstTime = time;
      } else if (!stepFits(before, time - before)) {
        return false;
      }
    }
    count++;
    return true;
  }

  private boolean stepFits(double before, double step) throws RejectedException {
    if (step < 0) {
      rows.refuse("timeRunsBackwards", Sentences.backwards(rows.line(), before, time));
      time = before;
      return false;
    }
    if (Math.abs(time) >= coarseFrom) {
      resolution = plan.digits().resolution(time);
      coarseFrom = Math.pow(10, Math.floor(Math.log10(Math.abs(time))) + 1);
    }
    double printed = 2 * resolution;
    double off = Math.abs(step - plan.step());
    if (off <= JITTER * plan.step() + printed) {
      return true;
    }
    if (off > GAP * plan.step() + printed) {
      rows.refuse(
          "unevenSteps",
          "Line "
              + rows.line()
              + ": the time grows by "
              + (float) step
              + " where steps of "
              + (float) plan.step()
              + " precede: rows are missing or doubled; export again with even steps, or choose"
              + " edge times where rows are edges.");
      time = before;
      return false;
    }
    if (!jitterTold) {
      jitterTold = true;
      rows.warn(
          "timeJitter",
          "From line "
              + rows.line()
              + " times are up to a quarter of a step uneven: the rows are taken as evenly"
              + " spaced.");
    }
    return true;
  }

  private void finish() {
    ended = true;
    if (plan.step() > 0 && count > 1) {
      double mean = (time - firstTime) / (count - 1);
      double relative = mean / plan.step() - 1;
      double printed = 2 * resolution / Math.abs(time - firstTime);
      if (Math.abs(relative) > DRIFT + printed) {
        rows.warn(
            "sampleStepDrifts",
            "The mean time step of the whole file differs from that of its beginning, which was"
                + " used, by "
                + Math.round(relative * 1e6)
                + " ppm.");
      }
    }
  }
}
