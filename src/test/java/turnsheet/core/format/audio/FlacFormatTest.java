package turnsheet.core.format.audio;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.ByteArrayOutputStream;
import java.security.MessageDigest;
import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.signal.RejectedException;

/** Streams built bit by bit after RFC 9639; the sample values follow in closed form. */
@Timeout(30)
class FlacFormatTest {

  private static final byte[] NO_MD5 = new byte[16];

  @Test
  void readsVerbatimAndConstantChannels() throws Exception {
    FlacBytes frame = FlacBytes.frame(0, 3, 1).verbatim(16, 32767, -32768, 5);
    byte[] file = join(header(44100, 2, 16, 3), frame.bits(0, 8).bits(-7, 16).frameEnd());
    assertThat(Reading.samples(file, 1, 9)).containsExactly(32767 / 32768.0, -1, 5 / 32768.0);
    assertThat(Reading.samples(file, 2, 2)).containsOnly(-7 / 32768.0).hasSize(3);
    Recognised recognised = Reading.accepted(file);
    assertThat(recognised.format()).isEqualTo("FLAC, 16-bit");
    assertThat(recognised.frames()).isEqualTo(3);
    assertThat(recognised.channels()).hasSize(2);
    assertThat(recognised.sampleRateHertz()).isEqualTo(44100);
  }

  @Test
  void readsFixedPredictorsOfEveryOrder() throws Exception {
    // residual zero: order n continues a polynomial of degree n - 1 exactly
    long[][] starts = {{}, {9}, {3, 5}, {1, 4, 9}, {1, 8, 27, 64}};
    double[][] expected = {
      {0, 0, 0, 0, 0, 0},
      {9, 9, 9, 9, 9, 9},
      {3, 5, 7, 9, 11, 13},
      {1, 4, 9, 16, 25, 36},
      {1, 8, 27, 64, 125, 216}
    };
    for (int order = 0; order <= 4; order++) {
      FlacBytes frame = FlacBytes.frame(0, 6, 0).bits((8 + order) << 1, 8);
      for (long start : starts[order]) {
        frame.bits(start, 16);
      }
      frame.bits(0, 2).bits(0, 4).bits(0, 4);
      for (int i = order; i < 6; i++) {
        frame.rice(0, 0);
      }
      byte[] file = join(header(8000, 1, 16, 6), frame.frameEnd());
      double[] scaled = Arrays.stream(expected[order]).map(v -> v / 32768).toArray();
      assertThat(Reading.samples(file, 1, 4)).containsExactly(scaled);
    }
  }

  @Test
  void readsLinearPredictionWithRiceAndEscapedPartitions() throws Exception {
    // coefficient 3 at shift 1 of one warm-up sample: each next sample is floor(1.5 x) + residual
    FlacBytes frame = FlacBytes.frame(0, 4, 0).bits(32 << 1, 8).bits(-5, 24);
    frame.bits(3 - 1, 4).bits(1, 5).bits(3, 3);
    frame.bits(1, 2).bits(1, 4);
    frame.bits(2, 5).rice(-9, 2);
    frame.bits(31, 5).bits(4, 5).bits(7, 4).bits(-8, 4);
    byte[] file = join(header(8000, 1, 24, 4), frame.frameEnd());
    // floor(-7.5) - 9 = -17; floor(-25.5) + 7 = -19; floor(-28.5) - 8 = -37
    assertThat(Reading.samples(file, 1, 9))
        .containsExactly(-5 * 0x1p-23, -17 * 0x1p-23, -19 * 0x1p-23, -37 * 0x1p-23);
  }

  @Test
  void readsWastedBits() throws Exception {
    FlacBytes frame = FlacBytes.frame(0, 2, 0).bits(1 << 1 | 1, 8).bits(0b001, 3);
    byte[] file = join(header(8000, 1, 16, 2), frame.bits(3, 13).bits(-1, 13).frameEnd());
    assertThat(Reading.samples(file, 1, 9)).containsExactly(24 / 32768.0, -8 / 32768.0);
  }

  @Test
  void readsEveryStereoPairing() throws Exception {
    long left = 20_001;
    long right = -12_000;
    long side = left - right;
    long mid = (left + right) >> 1;
    byte[][] frames = {
      FlacBytes.frame(0, 1, 8).verbatim(16, left).verbatim(17, side).frameEnd(),
      FlacBytes.frame(0, 1, 9).verbatim(17, side).verbatim(16, right).frameEnd(),
      FlacBytes.frame(0, 1, 10).verbatim(16, mid).verbatim(17, side).frameEnd()
    };
    for (byte[] frame : frames) {
      byte[] file = join(header(8000, 2, 16, 1), frame);
      assertThat(Reading.samples(file, 1, 9)).containsExactly(left / 32768.0);
      assertThat(Reading.samples(file, 2, 9)).containsExactly(right / 32768.0);
    }
  }

  @Test
  void reads32BitSidesWithoutOverflow() throws Exception {
    long left = Integer.MAX_VALUE;
    long right = Integer.MIN_VALUE;
    FlacBytes frame = FlacBytes.frame(0, 1, 8).verbatim(32, left).verbatim(33, left - right);
    byte[] file = join(header(8000, 2, 32, 1), frame.frameEnd());
    assertThat(Reading.samples(file, 1, 9)).containsExactly(left * 0x1p-31);
    assertThat(Reading.samples(file, 2, 9)).containsExactly(-1);
  }

  @Test
  void anyCuttingIntoBlocksGivesTheSameSamples() throws Exception {
    byte[] file = noise(40, 700);
    double[] whole = Reading.samples(file, 1, 100_000);
    assertThat(whole).hasSize(28_000);
    for (int blockSize : new int[] {1, 699, 701, 4096}) {
      assertThat(Arrays.equals(Reading.samples(file, 1, blockSize), whole)).isTrue();
    }
  }

  @Test
  void holdsTheSamplesAgainstTheMd5OfTheHeader() throws Exception {
    byte[] frame = FlacBytes.frame(0, 2, 0).verbatim(16, 0x1234, -2).frameEnd();
    byte[] md5 =
        MessageDigest.getInstance("MD5").digest(new byte[] {0x34, 0x12, (byte) 0xfe, (byte) 0xff});
    assertThat(Reading.warningsAfterReading(join(header(8000, 1, 16, 2, md5), frame))).isEmpty();
    md5[0]++;
    assertThat(Reading.warningsAfterReading(join(header(8000, 1, 16, 2, md5), frame)))
        .containsExactly("md5Mismatch");
  }

  @Test
  void readsAStreamWithoutTotal() throws Exception {
    byte[] file = join(header(8000, 1, 16, 0), FlacBytes.frame(0, 1, 0).verbatim(16, 1).frameEnd());
    assertThat(Reading.accepted(file).frames()).isNull();
    assertThat(Reading.warningsAfterReading(file)).isEmpty();
  }

  @Test
  void readsBehindAnId3TagAndStopsBeforeOne() throws Exception {
    byte[] tag = new byte[10 + 200];
    tag[0] = 'I';
    tag[1] = 'D';
    tag[2] = '3';
    tag[3] = 4;
    // 200 in digits of seven bits
    tag[8] = 1;
    tag[9] = 72;
    byte[] trailer = new byte[128];
    trailer[0] = 'T';
    trailer[1] = 'A';
    trailer[2] = 'G';
    byte[] frame = FlacBytes.frame(0, 1, 0).verbatim(16, 1).frameEnd();
    for (int total : new int[] {0, 1}) {
      byte[] file = join(tag, header(8000, 1, 16, total), frame, trailer);
      assertThat(Reading.samples(file, 1, 9)).containsExactly(1 / 32768.0);
      assertThat(Reading.warningsAfterReading(file)).isEmpty();
    }
    assertThat(Reading.refused(join(tag, trailer)).code()).isEqualTo("compressedAudio");
  }

  @Test
  void saysWhatATruncatedStreamLacks() throws Exception {
    byte[] file = noise(10, 800);
    byte[] cut = Arrays.copyOf(file, file.length - 100);
    assertThat(Reading.samples(cut, 1, 500)).hasSize(9 * 800);
    assertThat(Reading.warningsAfterReading(cut)).containsExactly("truncated");
  }

  @Test
  void refusesAChangeOfFormatWithinTheStream() throws Exception {
    byte[] first = FlacBytes.frame(0, 1, 0).verbatim(16, 1).frameEnd();
    byte[][] seconds = {
      FlacBytes.frame(1, 1, 1).verbatim(16, 1).verbatim(16, 1).frameEnd(),
      FlacBytes.frame(1, 1, 0, 10, 0).verbatim(16, 1).frameEnd(),
      FlacBytes.frame(1, 1, 0, 0, 6).verbatim(24, 1).frameEnd()
    };
    for (byte[] second : seconds) {
      byte[] file = join(header(44100, 1, 16, 2), first, second);
      assertThatThrownBy(() -> Reading.samples(file, 1, 9))
          .isInstanceOf(RejectedException.class)
          .hasMessageContaining("changingFormat");
    }
    assertThat(Reading.refused(join(header(44100, 2, 16, 1), first)).code())
        .isEqualTo("changingFormat");
  }

  @Test
  void refusesAMissingFrame() throws Exception {
    byte[] first = FlacBytes.frame(0, 1, 0).verbatim(16, 1).frameEnd();
    byte[] third = FlacBytes.frame(2, 1, 0).verbatim(16, 1).frameEnd();
    assertThatThrownBy(() -> Reading.samples(join(header(8000, 1, 16, 3), first, third), 1, 9))
        .hasMessageContaining("damagedFlac")
        .hasMessageContaining("frame 2 comes where 1 is due");
  }

  @Test
  void refusesDamagedMetadataWithoutBelievingItsSizes() throws Exception {
    byte[] sound = header(8000, 1, 16, 1);
    sound[4] = 0;
    byte[] huge = join(sound, new byte[] {4, -1, -1, -1, 0, 0});
    assertThat(Reading.refused(huge).code()).isEqualTo("damagedFlac");
    assertThat(Reading.refused(huge).message()).contains("16777215 bytes");
    assertThat(Reading.refused(Arrays.copyOf(sound, 30)).code()).isEqualTo("headerCut");
    assertThat(Reading.refused(header(0, 1, 16, 1)).code()).isEqualTo("noSampleRate");
    assertThat(Reading.refused(header(8000, 1, 16, 0)).code()).isEqualTo("noSamples");
  }

  /** Every outcome is fine but a wrong one: a crash, an endless loop, samples that differ. */
  @Test
  void anyDamageEndsInARejectionOrAWarning() throws Exception {
    byte[] file = noise(4, 300);
    double[] sound = Reading.samples(file, 1, 5000);
    Random random = new Random(11);
    int rejected = 0;
    for (int run = 0; run < 3000; run++) {
      byte[] damaged = file.clone();
      int at = 42 + random.nextInt(file.length - 42);
      damaged[at] ^= (byte) (1 << random.nextInt(8));
      try {
        double[] samples = Reading.samples(damaged, 1, 5000);
        assertThat(samples).isEqualTo(Arrays.copyOf(sound, samples.length));
        assertThat(samples.length < sound.length)
            .isEqualTo(Reading.warningsAfterReading(damaged).contains("truncated"));
      } catch (RejectedException e) {
        rejected++;
      }
    }
    // a check sum of 16 bits sees every single flipped bit; what is left are bits of the last of
    // four frames that make it seem to go on behind the end of the file
    assertThat(rejected).isGreaterThan(3000 * 3 / 4);
  }

  private static byte[] noise(int frames, int blockSize) throws Exception {
    Random random = new Random(5);
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    out.write(header(8000, 1, 16, (long) frames * blockSize));
    for (int f = 0; f < frames; f++) {
      FlacBytes frame = FlacBytes.frame(f, blockSize, 0).bits(9 << 1, 8).bits(0, 16);
      frame.bits(0, 2).bits(0, 4).bits(5, 4);
      for (int i = 1; i < blockSize; i++) {
        frame.rice(random.nextInt(100) - 50, 5);
      }
      out.write(frame.frameEnd());
    }
    return out.toByteArray();
  }

  static byte[] header(int rate, int channels, int bits, long frames) {
    return header(rate, channels, bits, frames, NO_MD5);
  }

  private static byte[] header(int rate, int channels, int bits, long frames, byte[] md5) {
    FlacBytes block = new FlacBytes().bits(0x664c6143, 32).bits(0x80, 8).bits(34, 24);
    block.bits(16, 16).bits(65535, 16).bits(0, 24).bits(0, 24);
    block.bits(rate, 20).bits(channels - 1, 3).bits(bits - 1, 5).bits(frames, 36);
    for (byte b : md5) {
      block.bits(b, 8);
    }
    return block.written();
  }

  private static byte[] join(byte[]... parts) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    for (byte[] part : parts) {
      out.writeBytes(part);
    }
    return out.toByteArray();
  }
}
