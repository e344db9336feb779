package turnsheet.core.format.audio;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.format.api.Recognition;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Rejection;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/** Short ways through the facade, so that the tests see what a caller sees. */
final class Reading {

  private Reading() {}

  static Recognised accepted(byte[] file) throws IOException {
    Recognition recognition =
        CaptureFormats.standard().recognise(new MemorySource(file), ReadOptions.none());
    assertThat(recognition).isInstanceOf(Recognition.Accepted.class);
    return ((Recognition.Accepted) recognition).recognised();
  }

  static Rejection refused(byte[] file) throws IOException {
    return refused(new MemorySource(file), ReadOptions.none());
  }

  static Rejection refused(ByteSource source, ReadOptions options) throws IOException {
    Recognition recognition = CaptureFormats.standard().recognise(source, options);
    assertThat(recognition).isInstanceOf(Recognition.Refused.class);
    return ((Recognition.Refused) recognition).rejection();
  }

  static double[] samples(byte[] file, int channel, int blockSize)
      throws IOException, RejectedException {
    try (SampleReader reader = open(file, channel)) {
      return samples(reader, blockSize);
    }
  }

  static double[] samples(SampleReader reader, int blockSize)
      throws IOException, RejectedException {
    List<Double> samples = new ArrayList<>();
    double[] block = new double[blockSize];
    for (int got = reader.read(block); got > 0; got = reader.read(block)) {
      for (int i = 0; i < got; i++) {
        samples.add(block[i]);
      }
    }
    return samples.stream().mapToDouble(Double::doubleValue).toArray();
  }

  static List<String> warningsAfterReading(byte[] file) throws IOException, RejectedException {
    try (SampleReader reader = open(file, 1)) {
      assertThat(samples(reader, 1000)).isNotEmpty();
      return reader.warnings().stream().map(Warning::code).toList();
    }
  }

  static SampleReader open(byte[] file, int channel) throws IOException, RejectedException {
    return CaptureFormats.standard()
        .openSamples(new MemorySource(file), ReadOptions.none().withChannel(channel));
  }
}
