package turnsheet.core.format.text;

import java.io.IOException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.format.api.Recognition;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Rejection;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/** Reads captures to their end, for the tests. */
final class ReadBack {

  static final CaptureFormats FORMATS = CaptureFormats.standard();

  private ReadBack() {}

  @SuppressWarnings("ArrayRecordComponent") // never compared, never shared
  record Edges(double[] times, boolean[] rising, double stepSeconds, List<Warning> warnings) {

    double[] risingTimes() {
      return times(true);
    }

    double[] times(boolean up) {
      return java.util.stream.IntStream.range(0, times.length)
          .filter(i -> rising[i] == up)
          .mapToDouble(i -> times[i])
          .toArray();
    }

    double[] periods() {
      double[] up = risingTimes();
      double[] periods = new double[Math.max(0, up.length - 1)];
      for (int i = 0; i < periods.length; i++) {
        periods[i] = up[i + 1] - up[i];
      }
      return periods;
    }
  }

  @SuppressWarnings("ArrayRecordComponent") // never compared, never shared
  record Samples(double[] values, double rateHertz, List<Warning> warnings) {}

  static Recognised accepted(ByteSource source, ReadOptions options) {
    Recognition recognition = recognise(source, options);
    if (recognition instanceof Recognition.Accepted accepted) {
      return accepted.recognised();
    }
    throw new AssertionError(recognition);
  }

  static Recognised accepted(String text) {
    return accepted(TextSources.of(text), ReadOptions.none());
  }

  static Rejection refused(ByteSource source, ReadOptions options) {
    Recognition recognition = recognise(source, options);
    if (recognition instanceof Recognition.Refused refused) {
      return refused.rejection();
    }
    throw new AssertionError(recognition);
  }

  static Rejection refused(String text) {
    return refused(TextSources.of(text), ReadOptions.none());
  }

  static Recognition recognise(ByteSource source, ReadOptions options) {
    try {
      return FORMATS.recognise(source, options);
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }

  static Edges edges(ByteSource source, ReadOptions options) throws RejectedException {
    List<Double> times = new ArrayList<>();
    List<Boolean> rising = new ArrayList<>();
    // a block that no list is a multiple of, so that block borders are met
    double[] block = new double[997];
    boolean[] up = new boolean[997];
    try (EdgeReader reader = FORMATS.openEdges(source, options)) {
      for (int n = reader.read(block, up); n > 0; n = reader.read(block, up)) {
        for (int i = 0; i < n; i++) {
          times.add(block[i]);
          rising.add(up[i]);
        }
      }
      boolean[] directions = new boolean[rising.size()];
      for (int i = 0; i < directions.length; i++) {
        directions[i] = rising.get(i);
      }
      return new Edges(
          times.stream().mapToDouble(d -> d).toArray(),
          directions,
          reader.timeStepSeconds(),
          reader.warnings());
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }

  static Samples samples(ByteSource source, ReadOptions options) throws RejectedException {
    double[] all = new double[1024];
    int count = 0;
    double[] block = new double[997];
    try (SampleReader reader = FORMATS.openSamples(source, options)) {
      for (int n = reader.read(block); n > 0; n = reader.read(block)) {
        if (count + n > all.length) {
          all = Arrays.copyOf(all, Math.max(2 * all.length, count + n));
        }
        System.arraycopy(block, 0, all, count, n);
        count += n;
      }
      return new Samples(Arrays.copyOf(all, count), reader.sampleRateHertz(), reader.warnings());
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }

  /** Everything that reading a file gives, as text: to compare two ways of reading. */
  static String everything(ByteSource source, ReadOptions options) {
    StringBuilder all = new StringBuilder();
    Recognition recognition = recognise(source, options);
    all.append(recognition).append('\n');
    if (recognition instanceof Recognition.Accepted accepted) {
      try {
        if (accepted.recognised().contents() == Contents.WAVEFORM) {
          Samples samples = samples(source, options);
          all.append(Arrays.toString(samples.values())).append(samples.rateHertz());
          all.append(samples.warnings());
        } else {
          Edges edges = edges(source, options);
          all.append(Arrays.toString(edges.times())).append(Arrays.toString(edges.rising()));
          all.append(edges.warnings());
        }
      } catch (RejectedException e) {
        all.append(e.rejection());
      }
    }
    return all.toString();
  }

  static ReadOptions as(Contents contents) {
    return new ReadOptions(null, contents, null, null);
  }
}
