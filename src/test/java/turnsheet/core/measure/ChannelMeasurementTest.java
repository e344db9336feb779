package turnsheet.core.measure;

import static java.util.Objects.requireNonNull;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.CyclicBarrier;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.stream.IntStream;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.signal.SpeedTrace;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;

/** Channels side by side against each of them alone. */
@Timeout(value = 2, unit = TimeUnit.MINUTES)
class ChannelMeasurementTest {

  private static final int RATE_HERTZ = 32_000;

  private final Measurement alone = new Measurement(CaptureFormats.standard());
  private final ExecutorService threads = Executors.newFixedThreadPool(4);
  private final ChannelMeasurement together = new ChannelMeasurement(alone, threads);

  @AfterEach
  void end() {
    threads.shutdownNow();
  }

  /** Keeps everything. */
  private static final ChannelMeasurement.Keeper<Outcome> ALL = (channel, outcome) -> outcome;

  @Test
  void everyChannelGivesTheBitsThatItGivesAlone() throws IOException {
    ByteSource wav = wav(tone(0.0042, 1), tone(-0.001, 2), tone(0.0123, 3));
    Map<Integer, Outcome> outcomes =
        together.measure(
            order(wav), List.of(2, 1, 3), 3, ALL, ChannelMeasurement.ChannelProgress.NONE);
    assertThat(outcomes.keySet()).containsExactly(2, 1, 3);
    for (int channel = 1; channel <= 3; channel++) {
      Outcome.Measured here = (Outcome.Measured) requireNonNull(outcomes.get(channel));
      Outcome.Measured there =
          (Outcome.Measured)
              alone.measure(
                  wav,
                  "0".repeat(64),
                  ReadOptions.none(),
                  MeasureSettings.tone(3150).onChannel(channel),
                  Progress.NONE);
      assertThat(here.reading()).isEqualTo(there.reading());
      assertThat(bits(here.series().trace())).isEqualTo(bits(there.series().trace()));
      assertThat(here.reading().source().channel()).isEqualTo(channel);
    }
  }

  @Test
  void aSilentChannelLeavesTheOtherAlone() throws IOException {
    Map<Integer, Outcome> outcomes =
        together.measure(
            order(wav(new double[8 * RATE_HERTZ], tone(0.004, 1))),
            List.of(1, 2),
            2,
            ALL,
            ChannelMeasurement.ChannelProgress.NONE);
    assertThat(outcomes.get(1))
        .isInstanceOfSatisfying(
            Outcome.Refused.class, r -> assertThat(r.rejection().code()).isEqualTo("silent"));
    assertThat(outcomes.get(2)).isInstanceOf(Outcome.Measured.class);
  }

  /** Both threads stand at the barrier together or the test runs out of time. */
  @Test
  void channelsAreMeasuredAtTheSameTime() throws IOException {
    CyclicBarrier both = new CyclicBarrier(2);
    Map<Integer, Outcome> outcomes =
        together.measure(
            order(wav(tone(0.004, 1), tone(0.002, 2))),
            List.of(1, 2),
            2,
            (channel, outcome) -> {
              meet(both);
              return outcome;
            },
            ChannelMeasurement.ChannelProgress.NONE);
    assertThat(outcomes).hasSize(2);
  }

  @Test
  void neverMoreAtOnceThanAllowed() throws IOException {
    AtomicInteger open = new AtomicInteger();
    AtomicInteger most = new AtomicInteger();
    double[][] eight =
        IntStream.range(0, 8).mapToObj(i -> tone(0.001 * i, i)).toArray(double[][]::new);
    together.measure(
        order(counted(wav(eight), open, most)),
        ChannelMeasurement.chosen(8, 1),
        2,
        ALL,
        ChannelMeasurement.ChannelProgress.NONE);
    assertThat(most.get()).isLessThanOrEqualTo(2);
    assertThat(open.get()).isZero();
  }

  @Test
  void progressTellsOfEachChannelAndEndsAtTheWhole() throws IOException {
    List<List<ChannelMeasurement.Share>> told = new ArrayList<>();
    together.measure(order(wav(tone(0.004, 1), tone(0.002, 2))), List.of(2, 1), 2, ALL, told::add);
    assertThat(told)
        .allSatisfy(
            shares ->
                assertThat(shares)
                    .extracting(ChannelMeasurement.Share::channel)
                    .containsExactly(2, 1));
    assertThat(told.get(told.size() - 1))
        .extracting(ChannelMeasurement.Share::fraction)
        .containsExactly(1.0, 1.0);
    for (int i = 0; i < 2; i++) {
      int channel = i;
      assertThat(told.stream().map(shares -> shares.get(channel).fraction())).isSorted();
    }
  }

  @Test
  void whoStopsTheWorkFindsItStopped() throws IOException {
    AtomicInteger open = new AtomicInteger();
    assertThatThrownBy(
            () ->
                together.measure(
                    order(counted(endless(), open, new AtomicInteger())),
                    List.of(1, 2),
                    2,
                    ALL,
                    shares -> {
                      if (shares.stream().allMatch(s -> s.fraction() > 0)) {
                        throw new IllegalStateException("going down");
                      }
                    }))
        .isInstanceOf(IllegalStateException.class)
        .hasMessage("going down");
    assertThat(open.get()).isZero();
  }

  @Test
  void aDiskThatFailsEndsAllChannels() throws IOException {
    ByteSource wav = wav(tone(0.004, 1), tone(0.002, 2));
    AtomicInteger opened = new AtomicInteger();
    ByteSource failing =
        new ByteSource() {
          @Override
          public InputStream open() throws IOException {
            if (opened.incrementAndGet() == 5) {
              throw new IOException("the disk is gone");
            }
            return wav.open();
          }

          @Override
          public long length() {
            return wav.length();
          }
        };
    assertThatThrownBy(
            () ->
                together.measure(
                    order(failing), List.of(1, 2), 2, ALL, ChannelMeasurement.ChannelProgress.NONE))
        .isInstanceOf(IOException.class)
        .hasMessage("the disk is gone");
  }

  @Test
  void aFaultOnOneChannelIsTheKeepersToDecide() throws IOException {
    ByteSource wav = wav(tone(0.004, 1), tone(0.002, 2));
    CountDownLatch first = new CountDownLatch(1);
    Map<Integer, String> words =
        together.measure(
            order(
                new ByteSource() {
                  @Override
                  public InputStream open() throws IOException {
                    if (first.getCount() > 0) {
                      first.countDown();
                      throw new IllegalArgumentException("planted");
                    }
                    return wav.open();
                  }

                  @Override
                  public long length() {
                    return wav.length();
                  }
                }),
            List.of(1, 2),
            1,
            new ChannelMeasurement.Keeper<>() {
              @Override
              public String keep(int channel, Outcome outcome) {
                return outcome.getClass().getSimpleName();
              }

              @Override
              public String broke(int channel, RuntimeException fault) {
                return String.valueOf(fault.getMessage());
              }
            },
            ChannelMeasurement.ChannelProgress.NONE);
    assertThat(words).containsExactly(Map.entry(1, "planted"), Map.entry(2, "Measured"));
  }

  @Test
  void oneChannelIsMeasuredWhereItWasAskedFor() throws IOException {
    Thread here = Thread.currentThread();
    Map<Integer, Thread> where =
        together.measure(
            order(wav(tone(0.004, 1))),
            List.of(1),
            2,
            (channel, outcome) -> Thread.currentThread(),
            ChannelMeasurement.ChannelProgress.NONE);
    assertThat(where.get(1)).isSameAs(here);
  }

  @Test
  void theMainChannelComesFirstAndEightAreTheMost() {
    assertThat(ChannelMeasurement.chosen(2, 2)).containsExactly(2, 1);
    assertThat(ChannelMeasurement.chosen(1, 1)).containsExactly(1);
    assertThat(ChannelMeasurement.chosen(64, 9)).containsExactly(9, 1, 2, 3, 4, 5, 6, 7);
  }

  private static ChannelMeasurement.Order order(ByteSource source) {
    return new ChannelMeasurement.Order(
        source, "0".repeat(64), ReadOptions.none(), MeasureSettings.tone(3150));
  }

  private static double[] tone(double deviation, long seed) {
    SpeedFunction speed = SpeedFunction.constant(deviation).plusLine(6.3, 0.08, 0);
    return SignalSynth.tone(speed, 3150, RATE_HERTZ, 8, 0.5, 60, seed);
  }

  private static int[] bits(SpeedTrace trace) {
    return IntStream.range(0, trace.length())
        .map(i -> Float.floatToIntBits((float) trace.percent(i)))
        .toArray();
  }

  private static void meet(CyclicBarrier barrier) {
    try {
      barrier.await(1, TimeUnit.MINUTES);
    } catch (Exception e) {
      throw new IllegalStateException("the other channel is not being measured", e);
    }
  }

  /** Counts the streams that are open, and the most that ever were. */
  private static ByteSource counted(ByteSource source, AtomicInteger open, AtomicInteger most) {
    return new ByteSource() {
      @Override
      public InputStream open() throws IOException {
        most.accumulateAndGet(open.incrementAndGet(), Math::max);
        return new java.io.FilterInputStream(source.open()) {
          private boolean closed;

          @Override
          public void close() throws IOException {
            if (!closed) {
              closed = true;
              open.decrementAndGet();
            }
            super.close();
          }
        };
      }

      @Override
      public long length() {
        return source.length();
      }
    };
  }

  private static ByteSource wav(double[]... channels) throws IOException {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    WavWriter.write(out, RATE_HERTZ, 16, channels);
    byte[] bytes = out.toByteArray();
    return new ByteSource() {
      @Override
      public InputStream open() {
        return new ByteArrayInputStream(bytes);
      }

      @Override
      public long length() {
        return bytes.length;
      }
    };
  }

  /** A wave file of the greatest announced length that repeats eight seconds without an end. */
  private static ByteSource endless() throws IOException {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    WavWriter.write(out, RATE_HERTZ, 16, tone(0.004, 1), tone(0.002, 2));
    byte[] bytes = out.toByteArray();
    java.nio.ByteBuffer head =
        java.nio.ByteBuffer.wrap(bytes).order(java.nio.ByteOrder.LITTLE_ENDIAN);
    head.putInt(4, 0xfffffff8).putInt(40, 0xffffffd0);
    return new ByteSource() {
      @Override
      public InputStream open() {
        return new InputStream() {
          private long at;

          @Override
          public int read() {
            throw new UnsupportedOperationException("blocks only");
          }

          @Override
          public int read(byte[] into, int offset, int length) {
            for (int i = 0; i < length; i++, at++) {
              into[offset + i] =
                  at < bytes.length
                      ? bytes[(int) at]
                      : bytes[44 + (int) ((at - 44) % (bytes.length - 44))];
            }
            return length;
          }
        };
      }

      @Override
      public long length() {
        return 0xffffffd0L + 44;
      }
    };
  }
}
