package turnsheet.core.format.text;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.RejectedException;

/**
 * Reads the definitions of a value change dump (IEEE 1364-2005, clause 18.2).
 *
 * <p>Unknown sections are skipped. An identifier code that is declared again is the same signal
 * seen from another scope: its first path counts.
 */
final class VcdDefinitionsReader {

  static final int MAX_SIGNALS = 100_000;
  static final long MAX_DEFINITION_BYTES = 32L << 20;
  private static final int MAX_PATH_CHARS = 4096;
  private static final long MAX_NAME_CHARS = 16L << 20;

  /** Kinds of variables that hold no level, whatever their size. */
  private static final Set<String> NO_LEVEL =
      Set.of("event", "real", "real_parameter", "realtime", "shortreal", "string", "parameter");

  private static final Map<String, Double> UNITS =
      Map.of("s", 1.0, "ms", 1e3, "us", 1e6, "ns", 1e9, "ps", 1e12, "fs", 1e15);

  private final VcdTokens tokens;
  private final Deque<String> scopes = new ArrayDeque<>();
  private final List<VcdDefinitions.Signal> signals = new ArrayList<>();
  private final Set<String> codes = new HashSet<>();
  private int otherSignals;
  private long nameChars;
  private @Nullable String timescale;
  private @Nullable Double unitSeconds;

  VcdDefinitionsReader(VcdTokens tokens) {
    this.tokens = tokens;
  }

  VcdDefinitions read() throws IOException, RejectedException {
    tokens.stopAfter(MAX_DEFINITION_BYTES);
    while (tokens.next()) {
      if (tokens.is("$enddefinitions")) {
        tokens.skipSection();
        tokens.goOn();
        return new VcdDefinitions(timescale, unitSeconds, signals, otherSignals);
      }
      section();
    }
    throw incomplete();
  }

  private void section() throws IOException, RejectedException {
    if (tokens.is("$timescale")) {
      readTimescale(String.join("", rest()));
    } else if (tokens.is("$scope")) {
      List<String> words = rest();
      enter(words.size() < 2 ? "" : words.get(1));
    } else if (tokens.is("$upscope")) {
      scopes.pollLast();
      rest();
    } else if (tokens.is("$var")) {
      declare(tokens.line(), rest());
    } else if (isByteOrderMarkedCommand() || tokens.first() == '$') {
      if (!tokens.skipSection()) {
        throw incomplete();
      }
    } else {
      throw new RejectedException(
          "vcdSyntax",
          "Line "
              + tokens.line()
              + ": "
              + tokens.shown()
              + " stands among the definitions, before $enddefinitions: export the dump again.");
    }
  }

  private boolean isByteOrderMarkedCommand() {
    return tokens.length() > 3 && tokens.first() == (byte) 0xef && tokens.at(3) == '$';
  }

  private List<String> rest() throws IOException, RejectedException {
    List<String> words = new ArrayList<>();
    while (tokens.next()) {
      if (tokens.is("$end")) {
        return words;
      }
      if (words.size() < 16) {
        words.add(tokens.tail(0));
      }
    }
    throw incomplete();
  }

  private void enter(String name) throws RejectedException {
    String parent = scopes.isEmpty() ? "" : scopes.getLast();
    String path = parent.isEmpty() ? plain(name) : parent + "." + plain(name);
    if (path.length() > MAX_PATH_CHARS || scopes.size() > MAX_PATH_CHARS) {
      throw new RejectedException(
          "vcdSyntax",
          "Line " + tokens.line() + ": scopes are nested too deep: export the dump again.");
    }
    scopes.addLast(path);
  }

  private void declare(long line, List<String> words) throws RejectedException {
    if (words.size() < 4 || !words.get(1).matches("[0-9]{1,9}")) {
      throw new RejectedException(
          "vcdSyntax",
          "Line " + line + ": a $var needs kind, size, code and name: export the dump again.");
    }
    String kind = words.get(0).toLowerCase(Locale.ROOT);
    String code = words.get(2);
    boolean oneBit = Integer.parseInt(words.get(1)) == 1 && !NO_LEVEL.contains(kind);
    if (!codes.add(code)) {
      return;
    }
    if (!oneBit) {
      otherSignals++;
    } else {
      String name = plain(String.join("", words.subList(3, words.size())));
      String scope = scopes.isEmpty() ? "" : scopes.getLast() + ".";
      nameChars += scope.length() + name.length();
      signals.add(new VcdDefinitions.Signal(code, scope + name));
    }
    if (codes.size() > MAX_SIGNALS || nameChars > MAX_NAME_CHARS) {
      throw new RejectedException(
          "tooManySignals",
          "Line " + line + ": more than " + MAX_SIGNALS + " signals: export fewer signals.");
    }
  }

  private void readTimescale(String written) throws RejectedException {
    for (String mantissa : List.of("100", "10", "1")) {
      if (written.startsWith(mantissa)) {
        Double perSecond = UNITS.get(written.substring(mantissa.length()).toLowerCase(Locale.ROOT));
        if (perSecond != null) {
          timescale = mantissa + " " + written.substring(mantissa.length());
          unitSeconds = Integer.parseInt(mantissa) / perSecond;
          return;
        }
      }
    }
    throw new RejectedException(
        "vcdTimescale",
        "Line "
            + tokens.line()
            + ": the $timescale is none of 1, 10 or 100 with s, ms, us, ns, ps or fs: correct it.");
  }

  /** A name without the mark of an escaped identifier. */
  private static String plain(String name) {
    String text = new String(name.getBytes(StandardCharsets.ISO_8859_1), StandardCharsets.UTF_8);
    return text.startsWith("\\") ? text.substring(1) : text;
  }

  private RejectedException incomplete() {
    if (tokens.stopped()) {
      return new RejectedException(
          "tooManySignals", "The definitions are longer than 32 MiB: export fewer signals.");
    }
    return new RejectedException(
        "vcdIncomplete",
        "The value change dump ends within its definitions (no $enddefinitions): export it again.");
  }
}
