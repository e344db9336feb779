package turnsheet.core.format.text;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.CaptureFormat;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/**
 * Numbers as text: waveforms, edge times and periods in columns separated by tabs, semicolons,
 * commas or blanks.
 *
 * <p>UTF-8 or Latin-1; decimal point or comma; lines before the table, a header, a row of units and
 * comments are understood. Samples keep the unit of the file; times become seconds. The first 256
 * KiB decide what the numbers are, and are read as they will be read, so that what is wrong there
 * is refused at once.
 */
public final class TableFormat implements CaptureFormat {

  @Override
  public boolean claims(byte[] head) {
    return TextBytes.looksLikeText(head);
  }

  @Override
  public Recognised recognise(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    TextHead head = TextHead.of(source);
    TablePlan plan = plan(head, options);
    List<Warning> warnings = new ArrayList<>(plan.warnings());
    warnings.addAll(tryHead(head, plan));
    return new Recognised(
        name(plan.layout()),
        plan.contents(),
        plan.contents() == Contents.WAVEFORM ? plan.sampleRateHertz() : null,
        null,
        plan.channels(),
        plan.channel(),
        plan.guesses(),
        warnings);
  }

  @Override
  public SampleReader openSamples(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    TablePlan plan = plan(TextHead.of(source), options);
    if (plan.contents() != Contents.WAVEFORM) {
      throw new IllegalStateException("the table holds " + plan.contents());
    }
    return new TableSampleReader(rows(source, plan), plan);
  }

  @Override
  public EdgeReader openEdges(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    TablePlan plan = plan(TextHead.of(source), options);
    if (plan.contents() == Contents.WAVEFORM) {
      throw new IllegalStateException("the table holds a waveform");
    }
    return new TableEdgeReader(rows(source, plan), plan);
  }

  private static TablePlan plan(TextHead head, ReadOptions options)
      throws IOException, RejectedException {
    Layout layout = LayoutFinder.find(head);
    int rows = layout.rows().size();
    if (rows < LayoutFinder.MIN_ROWS) {
      if (layout.broken()) {
        tryEveryColumn(head, layout);
      }
      throw new RejectedException(
          "tooShort",
          "From line "
              + layout.firstLine()
              + " there are "
              + rows
              + (rows == 1 ? " row" : " rows")
              + " of numbers, at least 8 are needed: record longer.");
    }
    return TablePlanner.plan(layout, options);
  }

  /** Finds the cell that ended a table after a few rows. */
  private static void tryEveryColumn(TextHead head, Layout layout)
      throws IOException, RejectedException {
    for (int column = 0; column < layout.columns(); column++) {
      try (DataRows rows = DataRows.open(head, layout, column, -1)) {
        while (rows.next()) {
          // the rows complain of themselves
        }
      }
    }
  }

  /** Reads the head as the whole file will be read. */
  private static List<Warning> tryHead(TextHead head, TablePlan plan)
      throws IOException, RejectedException {
    double[] numbers = new double[4096];
    List<Warning> warnings;
    if (plan.contents() == Contents.WAVEFORM) {
      try (SampleReader reader = new TableSampleReader(rows(head, plan), plan)) {
        while (reader.read(numbers) > 0) {
          // the reader complains of itself
        }
        warnings = reader.warnings();
      }
    } else {
      boolean[] rising = new boolean[numbers.length];
      try (EdgeReader reader = new TableEdgeReader(rows(head, plan), plan)) {
        while (reader.read(numbers, rising) > 0) {
          // the reader complains of itself
        }
        warnings = reader.warnings();
      }
    }
    return head.wholeFile() ? warnings : List.of();
  }

  private static DataRows rows(ByteSource source, TablePlan plan)
      throws IOException, RejectedException {
    return DataRows.open(source, plan.layout(), plan.timeColumn(), plan.valueColumn());
  }

  private static String name(Layout layout) {
    String comma = layout.mark() == ',' ? ", decimal comma" : "";
    return layout.columns() == 1
        ? "text, one number per line" + comma
        : "text, " + layout.columns() + " columns separated by " + layout.separatorName() + comma;
  }
}
