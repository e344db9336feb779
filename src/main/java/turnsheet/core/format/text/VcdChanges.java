package turnsheet.core.format.text;

import java.io.Closeable;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/** Value changes of a dump in the order of the file; stands after its definitions. */
final class VcdChanges implements Closeable {

  /** neither 0 nor 1, or not known yet */
  static final int UNKNOWN = -1;

  private final VcdTokens tokens;
  private final List<Warning> warnings = new ArrayList<>();
  private long ticks;
  private int level;
  private int codeFrom;

  VcdChanges(VcdTokens tokens) {
    this.tokens = tokens;
  }

  /** Moves to the next change of a bit or vector; false at the end of the file. */
  boolean next() throws IOException, RejectedException {
    while (tokens.next()) {
      switch (tokens.first()) {
        case '#' -> readTime();
        case '$' -> {
          if (!skipCommand()) {
            return false;
          }
        }
        case 'b', 'B' -> {
          level = levelOf(tokens.last());
          codeFrom = 0;
          return readCode();
        }
        case 'r', 'R', 's', 'S' -> {
          if (!readCode()) {
            return false;
          }
        }
        default -> {
          return readBit();
        }
      }
    }
    return false;
  }

  /** Time stamp of the change. */
  long ticks() {
    return ticks;
  }

  /** 0, 1 or {@link #UNKNOWN}; of a vector its last bit. */
  int level() {
    return level;
  }

  boolean isOf(byte[] code) {
    return tokens.tailIs(codeFrom, code);
  }

  String code() {
    return tokens.tail(codeFrom);
  }

  /** Lets the file seem to end after so many more bytes. */
  void stopAfter(long bytes) {
    tokens.stopAfter(bytes);
  }

  boolean stopped() {
    return tokens.stopped();
  }

  List<Warning> warnings() {
    return List.copyOf(warnings);
  }

  @Override
  public void close() throws IOException {
    tokens.close();
  }

  private boolean readBit() throws RejectedException {
    level = levelOf(tokens.first());
    boolean known = level != UNKNOWN || "xXzZuUwW-".indexOf(tokens.first()) >= 0;
    if (known && tokens.length() > 1 && tokens.length() <= VcdTokens.KEPT_BYTES) {
      codeFrom = 1;
      return true;
    }
    if (!tokens.terminated()) {
      return truncated();
    }
    throw new RejectedException(
        "vcdSyntax",
        "Line "
            + tokens.line()
            + ": "
            + tokens.shown()
            + " is no value change and no time stamp: export the dump again.");
  }

  private boolean readCode() throws IOException, RejectedException {
    return tokens.next() || truncated();
  }

  private boolean skipCommand() throws IOException, RejectedException {
    boolean holdsChanges =
        tokens.is("$end")
            || tokens.is("$dumpvars")
            || tokens.is("$dumpall")
            || tokens.is("$dumpon")
            || tokens.is("$dumpoff");
    return holdsChanges || tokens.skipSection() || truncated();
  }

  private boolean truncated() {
    if (tokens.stopped()) {
      return false;
    }
    warnings.add(
        new Warning(
            "truncated",
            "The file ends in the middle of line " + tokens.line() + ": what precedes is used."));
    return false;
  }

  private void readTime() throws RejectedException {
    if (!tokens.terminated()) {
      // may be cut short, and nothing can follow it
      return;
    }
    long time = 0;
    int i = 1;
    int count = (int) Math.min(tokens.length(), VcdTokens.KEPT_BYTES);
    for (; i < count && tokens.at(i) >= '0' && tokens.at(i) <= '9'; i++) {
      if (time > (Long.MAX_VALUE - 9) / 10) {
        throw badTime("is beyond 64 bits");
      }
      time = time * 10 + (tokens.at(i) - '0');
    }
    if (i == 1) {
      throw badTime("is no number");
    }
    if (i < count) {
      readFraction(i, count);
    }
    if (time < ticks) {
      throw new RejectedException(
          "timeRunsBackwards",
          "Line "
              + tokens.line()
              + ": the time stamp "
              + time
              + " follows "
              + ticks
              + ": time must not run backwards; export the dump again.");
    }
    ticks = time;
  }

  /** Whole numbers are all that IEEE 1364 allows; one writer adds a nought as a decimal. */
  private void readFraction(int from, int count) throws RejectedException {
    boolean whole = tokens.at(from) == '.';
    for (int i = from + 1; i < count; i++) {
      whole &= tokens.at(i) == '0';
    }
    if (!whole) {
      throw badTime("is no whole number of timescale units");
    }
    if (warnings.isEmpty()) {
      warnings.add(
          new Warning(
              "fractionalTimeStamp",
              "From line " + tokens.line() + " time stamps are written with a decimal point."));
    }
  }

  private RejectedException badTime(String why) {
    return new RejectedException(
        "vcdTimeStamp",
        "Line "
            + tokens.line()
            + ": the time stamp "
            + tokens.shown()
            + " "
            + why
            + ": export the dump with a finer timescale.");
  }

  private static int levelOf(byte written) {
    return switch (written) {
      case '0', 'L' -> 0;
      case '1', 'H' -> 1;
      default -> UNKNOWN;
    };
  }
}
