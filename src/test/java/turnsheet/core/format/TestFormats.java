package turnsheet.core.format;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
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
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;

/**
 * Formats whose files are one word, for tests of what happens around formats: {@code tone} is two
 * seconds of 3150 Hz at 48 kHz on two channels, {@code edges} is 400 edges per second, {@code torn}
 * breaks where it is read, {@code bug} throws, {@code unclear} is refused until its contents are
 * said.
 */
public final class TestFormats {

  private TestFormats() {}

  public static CaptureFormats formats() {
    return new CaptureFormats(List.of(new Words()));
  }

  private static final class Words implements CaptureFormat {

    private static final List<String> KNOWN = List.of("tone", "edges", "torn", "bug", "unclear");

    @Override
    public boolean claims(byte[] head) {
      return KNOWN.contains(new String(head, StandardCharsets.UTF_8).strip());
    }

    @Override
    public Recognised recognise(ByteSource source, ReadOptions options)
        throws IOException, RejectedException {
      String word = word(source);
      if (word.equals("bug")) {
        throw new IllegalStateException("planted");
      }
      if (word.equals("unclear") && options.contents() == null) {
        throw new RejectedException("unclear", "The numbers could be anything: say what they are.");
      }
      Integer channel = options.channel();
      if (channel != null && channel > 2) {
        throw new RejectedException("noSuchChannel", "The file has two channels: choose 1 or 2.");
      }
      boolean edges = word.equals("edges") || options.contents() == Contents.EDGE_TIMES;
      return new Recognised(
          edges ? "word list" : "spoken word, 2 channels",
          edges ? Contents.EDGE_TIMES : Contents.WAVEFORM,
          edges ? null : 48000.0,
          edges ? null : 96000L,
          edges
              ? List.of(new Recognised.Channel("time", "s"))
              : List.of(new Recognised.Channel("left", null), new Recognised.Channel("right", "V")),
          edges || channel == null ? 1 : channel,
          edges
              ? List.of(new Recognised.Guess("timeUnitSeconds", "seconds, as they are below 10"))
              : channel == null
                  ? List.of(new Recognised.Guess("channel", "the first, as nothing says which"))
                  : List.of(),
          List.of());
    }

    @Override
    public SampleReader openSamples(ByteSource source, ReadOptions options) throws IOException {
      boolean torn = word(source).equals("torn");
      double[] samples =
          SignalSynth.tone(SpeedFunction.constant(0.001), 3150, 48000, 2, 0.5, 60, 1);
      return new SampleReader() {
        private int at;

        @Override
        public double sampleRateHertz() {
          return 48000;
        }

        @Override
        public int read(double[] into) throws RejectedException {
          if (torn) {
            throw new RejectedException("torn", "The file is torn at byte 4: record it again.");
          }
          int n = Math.min(into.length, samples.length - at);
          System.arraycopy(samples, at, into, 0, n);
          at += n;
          return n;
        }

        @Override
        public List<Warning> warnings() {
          return List.of();
        }

        @Override
        public void close() {}
      };
    }

    @Override
    public EdgeReader openEdges(ByteSource source, ReadOptions options) {
      double[] times = SignalSynth.risingEdges(SpeedFunction.constant(0), 400, 2, 0, 1);
      return new EdgeReader() {
        private int at;

        @Override
        public int read(double[] into, boolean[] rising) {
          int n = Math.min(into.length, times.length - at);
          System.arraycopy(times, at, into, 0, n);
          Arrays.fill(rising, 0, n, true);
          at += n;
          return n;
        }

        @Override
        public double timeStepSeconds() {
          return 0;
        }

        @Override
        public List<Warning> warnings() {
          return List.of();
        }

        @Override
        public void close() {}
      };
    }

    private static String word(ByteSource source) throws IOException {
      try (InputStream in = source.open()) {
        return new String(in.readNBytes(16), StandardCharsets.UTF_8).strip();
      }
    }
  }
}
