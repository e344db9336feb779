package turnsheet.demo;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.util.Locale;

/** Writes edge times and waveforms the way benches export them as text. */
final class TextSamples {

  private static final double MICRO = 1e6;
  private static final double NANO = 1e9;

  private TextSamples() {}

  /** One column of rising-edge times in microseconds with one decimal place. */
  static void edgeList(OutputStream out, double[] risingSeconds) throws IOException {
    var text = new StringBuilder("time_us\n");
    for (double t : risingSeconds) {
      text.append(String.format(Locale.ROOT, "%.1f\n", t * MICRO));
    }
    write(out, text);
  }

  /** One column of the times between rising edges in microseconds with two decimal places. */
  static void periodList(OutputStream out, double[] risingSeconds) throws IOException {
    var text = new StringBuilder("period_us\n");
    for (int k = 1; k < risingSeconds.length; k++) {
      text.append(
          String.format(Locale.ROOT, "%.2f\n", (risingSeconds[k] - risingSeconds[k - 1]) * MICRO));
    }
    write(out, text);
  }

  /** A value change dump of one signal at a time step of 100 ns; each pulse is high for a third. */
  static void valueChangeDump(OutputStream out, double[] risingSeconds) throws IOException {
    var text =
        new StringBuilder(
            """
            $comment invented bench, tachometer of a dictation machine $end
            $timescale 100 ns $end
            $scope module bench $end
            $var wire 1 ! tacho $end
            $var wire 1 " gate $end
            $upscope $end
            $enddefinitions $end
            #0
            $dumpvars
            0!
            1"
            $end
            """);
    for (int k = 0; k + 1 < risingSeconds.length; k++) {
      long up = Math.round(risingSeconds[k] * NANO / 100);
      long down =
          Math.round(
              (risingSeconds[k] + (risingSeconds[k + 1] - risingSeconds[k]) / 3) * NANO / 100);
      text.append('#').append(Math.max(1, up)).append("\n1!\n");
      text.append('#').append(Math.max(2, down)).append("\n0!\n");
    }
    write(out, text);
  }

  /** A table with preamble, units row, semicolons and decimal commas; time starts below zero. */
  static void waveformTable(
      OutputStream out, double[] volts, double stepSeconds, double startSeconds)
      throws IOException {
    var text =
        new StringBuilder(
            "Instrument;bench recorder (invented)\nCoupling;DC\nTime;Channel A\n(ms);(V)\n");
    for (int i = 0; i < volts.length; i++) {
      text.append(
          String.format(
                  Locale.ROOT, "%.3f;%.4f\n", (startSeconds + i * stepSeconds) * 1000, volts[i])
              .replace('.', ','));
    }
    write(out, text);
  }

  private static void write(OutputStream out, CharSequence text) throws IOException {
    out.write(text.toString().getBytes(StandardCharsets.UTF_8));
  }
}
