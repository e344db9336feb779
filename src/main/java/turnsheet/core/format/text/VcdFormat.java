package turnsheet.core.format.text;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.CaptureFormat;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.format.api.Recognised.Channel;
import turnsheet.core.format.api.Recognised.Guess;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;

/**
 * Value change dumps after IEEE 1364-2005, clause 18: edge times of one-bit signals.
 *
 * <p>Vectors, reals, strings and events are passed over. Times are seconds from time stamp 0.
 */
public final class VcdFormat implements CaptureFormat {

  /** Fewer edges than this show no turning. */
  static final int MIN_EDGES = 8;

  @Override
  public boolean claims(byte[] head) {
    int at = TextBytes.firstInk(head);
    return TextBytes.looksLikeText(head)
        && at + 1 < head.length
        && head[at] == '$'
        && head[at + 1] >= 'a'
        && head[at + 1] <= 'z';
  }

  @Override
  public Recognised recognise(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    try (VcdTokens tokens = new VcdTokens(source.open())) {
      VcdDefinitions definitions = definitions(tokens, options);
      VcdSurvey survey = VcdSurvey.of(definitions.signals(), new VcdChanges(tokens));
      int channel = channel(definitions, survey, options);
      String path = definitions.signals().get(channel - 1).path();
      int edges = survey.edges().get(channel - 1);
      if (survey.wholeFile() && edges < MIN_EDGES) {
        throw new RejectedException(
            "tooShort",
            "The signal "
                + path
                + " has "
                + edges
                + " edges, at least 8 are needed: record longer"
                + " or choose another signal.");
      }
      return new Recognised(
          "VCD, timescale " + shownTimescale(definitions, options),
          Contents.EDGE_TIMES,
          null,
          null,
          definitions.signals().stream().map(s -> new Channel(s.path(), null)).toList(),
          channel,
          guesses(definitions, survey, options, channel),
          survey.warnings());
    }
  }

  @Override
  public SampleReader openSamples(ByteSource source, ReadOptions options) {
    throw new IllegalStateException("a value change dump holds edges");
  }

  @Override
  public EdgeReader openEdges(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    Integer chosen = options.channel();
    int channel = chosen == null ? busiestChannel(source, options) : chosen;
    VcdTokens tokens = new VcdTokens(source.open());
    try {
      VcdDefinitions definitions = definitions(tokens, options);
      requireChannel(channel, definitions);
      return new VcdEdgeReader(
          new VcdChanges(tokens),
          definitions.signals().get(channel - 1),
          new TickScale(unitSeconds(definitions, options)));
    } catch (IOException | RejectedException e) {
      tokens.close();
      throw e;
    }
  }

  private static int busiestChannel(ByteSource source, ReadOptions options)
      throws IOException, RejectedException {
    try (VcdTokens tokens = new VcdTokens(source.open())) {
      VcdDefinitions definitions = definitions(tokens, options);
      VcdSurvey survey = VcdSurvey.of(definitions.signals(), new VcdChanges(tokens));
      return channel(definitions, survey, options);
    }
  }

  private static VcdDefinitions definitions(VcdTokens tokens, ReadOptions options)
      throws IOException, RejectedException {
    if (options.contents() != null && options.contents() != Contents.EDGE_TIMES) {
      throw new RejectedException(
          "contentsNotPossible",
          "A value change dump holds edge times, neither a waveform nor periods: choose edge"
              + " times.");
    }
    VcdDefinitions definitions = new VcdDefinitionsReader(tokens).read();
    if (definitions.signals().isEmpty()) {
      throw new RejectedException(
          "noOneBitSignal",
          "The value change dump declares no one-bit signal ("
              + definitions.otherSignals()
              + " others): export the signal of the tachometer as one bit.");
    }
    unitSeconds(definitions, options);
    return definitions;
  }

  private static double unitSeconds(VcdDefinitions definitions, ReadOptions options)
      throws RejectedException {
    Double chosen = options.timeUnitSeconds();
    Double written = definitions.unitSeconds();
    if (chosen != null) {
      return chosen;
    }
    if (written == null) {
      throw new RejectedException(
          "timeUnitNeeded",
          "The value change dump has no $timescale: state how long one unit of its times is.");
    }
    return written;
  }

  private static int channel(VcdDefinitions definitions, VcdSurvey survey, ReadOptions options)
      throws RejectedException {
    Integer chosen = options.channel();
    if (chosen != null) {
      requireChannel(chosen, definitions);
      return chosen;
    }
    if (survey.changing() == 0) {
      throw new RejectedException(
          "noSignalChanges",
          "None of the "
              + definitions.signals().size()
              + " one-bit signals changes between 0 and 1"
              + (survey.wholeFile() ? "" : " in the first 4 MiB")
              + ": record while the machine turns, or choose a signal.");
    }
    return survey.busiest() + 1;
  }

  private static void requireChannel(int channel, VcdDefinitions definitions)
      throws RejectedException {
    int count = definitions.signals().size();
    if (channel > count) {
      throw new RejectedException(
          "noSuchChannel",
          "Signal " + channel + " was chosen, the file has " + count + ": choose one of them.");
    }
  }

  private static String shownTimescale(VcdDefinitions definitions, ReadOptions options) {
    Double chosen = options.timeUnitSeconds();
    return chosen != null ? chosen + " s (chosen)" : String.valueOf(definitions.timescale());
  }

  private static List<Guess> guesses(
      VcdDefinitions definitions, VcdSurvey survey, ReadOptions options, int channel) {
    List<Guess> guesses = new ArrayList<>();
    if (options.channel() == null && definitions.signals().size() > 1) {
      guesses.add(
          new Guess(
              "channel",
              definitions.signals().get(channel - 1).path()
                  + ": most edges ("
                  + survey.edges().get(channel - 1)
                  + (survey.wholeFile() ? ")" : " in the first 4 MiB)")
                  + "; "
                  + (survey.changing() - 1)
                  + " other one-bit signals change"));
    }
    return guesses;
  }
}
