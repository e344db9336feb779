package turnsheet.core.format.audio;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/**
 * Files built byte by byte, with the samples that the layout rules give in closed form. Powers of
 * two divide exactly, so every comparison is exact.
 *
 * <p>Source: Microsoft, "WAVEFORMATEX" and "WAVEFORMATEXTENSIBLE": up to 8 bits unsigned around
 * 128, wider ones signed, left-justified in whole bytes.
 */
class WavFormatTest {

  private static final byte[] FOUR_BYTES = {1, 0, 2, 0};

  @Test
  void reads8BitAsUnsigned() throws Exception {
    byte[] file = WavBytes.plain(1, 1, 8000, 1, 8, bytes(0, 128, 255, 129));
    assertThat(Reading.samples(file, 1, 100)).containsExactly(-1, 0, 127 / 128.0, 1 / 128.0);
  }

  @Test
  void reads16BitOfTheChosenChannel() throws Exception {
    byte[] data = bytes(0x00, 0x80, 0x01, 0x00, 0xff, 0x7f, 0xfe, 0xff);
    byte[] file = WavBytes.plain(1, 2, 44100, 4, 16, data);
    assertThat(Reading.samples(file, 1, 100)).containsExactly(-1, 32767 / 32768.0);
    assertThat(Reading.samples(file, 2, 100)).containsExactly(1 / 32768.0, -2 / 32768.0);
  }

  @Test
  void reads24And32Bit() throws Exception {
    byte[] file24 = WavBytes.plain(1, 1, 8000, 3, 24, bytes(0, 0, 0x80, 1, 0, 0, 0xff, 0xff, 0xff));
    assertThat(Reading.samples(file24, 1, 100)).containsExactly(-1, 0x1p-23, -0x1p-23);
    byte[] file32 = WavBytes.plain(1, 1, 8000, 4, 32, bytes(0, 0, 0, 0x80, 1, 0, 0, 0));
    assertThat(Reading.samples(file32, 1, 100)).containsExactly(-1, 0x1p-31);
  }

  @Test
  void readsNarrowSamplesLeftJustified() throws Exception {
    byte[] file12 = WavBytes.plain(1, 1, 8000, 2, 12, bytes(0x10, 0x00, 0x00, 0x80));
    assertThat(Reading.samples(file12, 1, 100)).containsExactly(1 / 2048.0, -1);
    byte[] file20 = WavBytes.plain(1, 1, 8000, 3, 20, bytes(0x10, 0, 0, 0xf0, 0xff, 0x7f));
    assertThat(Reading.samples(file20, 1, 100)).containsExactly(1 / 524288.0, 524287 / 524288.0);
    assertThat(Reading.accepted(file20).format()).isEqualTo("WAV, 20-bit PCM");
  }

  @Test
  void reads24BitInTheHighBytesOfFour() throws Exception {
    byte[] data = bytes(0, 0, 0, 0x80, 0, 1, 0, 0);
    byte[] file = WavBytes.of("RIFF").extensible(1, 1, 8000, 4, 32, 24).chunk("data", data).file();
    assertThat(Reading.samples(file, 1, 100)).containsExactly(-1, 0x1p-23);
    assertThat(Reading.accepted(file).warnings()).isEmpty();
    assertThat(Reading.accepted(file).format()).isEqualTo("WAV, 24-bit PCM");
  }

  @Test
  void reads24BitInTheLowBytesOfFourWithAWarning() throws Exception {
    // 0xffffa0 is -96 in 24 bits, whether the fourth byte repeats the sign or is zero
    byte[] data = bytes(0xa0, 0xff, 0xff, 0, 0x0c, 0x5a, 0, 0, 0x00, 0x00, 0x80, 0xff);
    byte[] file = WavBytes.plain(1, 1, 8000, 4, 24, data);
    assertThat(Reading.samples(file, 1, 100)).containsExactly(-96 * 0x1p-23, 23052 * 0x1p-23, -1);
    assertThat(Reading.warningsAfterReading(file)).containsExactly("lowAligned");
  }

  @Test
  void readsFloatingPointAsItIs() throws Exception {
    ByteBuffer data32 = ByteBuffer.allocate(8).order(ByteOrder.LITTLE_ENDIAN);
    data32.putFloat(1.5f).putFloat(-0.1f);
    byte[] file32 = WavBytes.plain(3, 1, 8000, 4, 32, data32.array());
    assertThat(Reading.samples(file32, 1, 100)).containsExactly(1.5, -0.1f);
    ByteBuffer data64 = ByteBuffer.allocate(16).order(ByteOrder.LITTLE_ENDIAN);
    data64.putDouble(Math.PI).putDouble(-1e-300);
    byte[] file64 =
        WavBytes.of("RIFF").extensible(3, 1, 8000, 8, 64, 64).chunk("data", data64.array()).file();
    assertThat(Reading.samples(file64, 1, 100)).containsExactly(Math.PI, -1e-300);
    assertThat(Reading.accepted(file64).format()).isEqualTo("WAV, 64-bit float");
  }

  @Test
  void readsBigEndianFiles() throws Exception {
    byte[] file =
        WavBytes.of("RIFX")
            .format(1, 1, 8000, 2, 16)
            .chunk("data", bytes(0x80, 0, 0x00, 0x01))
            .file();
    assertThat(Reading.samples(file, 1, 100)).containsExactly(-1, 1 / 32768.0);
    byte[] extensible =
        WavBytes.of("RIFX")
            .extensible(3, 1, 8000, 4, 32, 32)
            .chunk("data", ByteBuffer.allocate(4).putFloat(0.25f).array())
            .file();
    assertThat(Reading.samples(extensible, 1, 100)).containsExactly(0.25);
  }

  @Test
  void readsLongSizesFromDs64() throws Exception {
    for (String container : new String[] {"RF64", "BW64"}) {
      byte[] file =
          WavBytes.of(container)
              .longSizes(76, 4, 2)
              .format(1, 1, 8000, 2, 16)
              .chunk("data", -1, FOUR_BYTES)
              .file(-1);
      assertThat(Reading.accepted(file).frames()).isEqualTo(2);
      assertThat(Reading.accepted(file).warnings()).isEmpty();
      assertThat(Reading.samples(file, 1, 100)).containsExactly(1 / 32768.0, 2 / 32768.0);
    }
  }

  @Test
  void skipsForeignChunksWithTheirPadding() throws Exception {
    byte[] file =
        WavBytes.of("RIFF")
            .chunk("LIST", new byte[7])
            .format(1, 1, 8000, 2, 16)
            .chunk("odd ", new byte[1])
            .chunk("data", FOUR_BYTES)
            .chunk("tail", new byte[3])
            .file();
    assertThat(Reading.samples(file, 1, 100)).containsExactly(1 / 32768.0, 2 / 32768.0);
    assertThat(Reading.accepted(file).warnings()).isEmpty();
  }

  @Test
  void tellsWhatTheFileHolds() throws Exception {
    byte[] file = WavBytes.plain(1, 2, 48000, 4, 16, new byte[400]);
    Recognised recognised = Reading.accepted(file);
    assertThat(recognised.format()).isEqualTo("WAV, 16-bit PCM");
    assertThat(recognised.contents()).isEqualTo(Contents.WAVEFORM);
    assertThat(recognised.sampleRateHertz()).isEqualTo(48000);
    assertThat(recognised.frames()).isEqualTo(100);
    assertThat(recognised.channels())
        .extracting(Recognised.Channel::name)
        .containsExactly("channel 1", "channel 2");
    assertThat(recognised.channel()).isEqualTo(1);
    assertThat(recognised.guesses())
        .extracting(Recognised.Guess::subject)
        .containsExactly("channel");
  }

  @Test
  void refusesAChannelThatIsNotThere() throws Exception {
    byte[] file = WavBytes.plain(1, 2, 48000, 4, 16, new byte[400]);
    assertThat(Reading.refused(new MemorySource(file), ReadOptions.none().withChannel(3)).code())
        .isEqualTo("noSuchChannel");
    assertThatThrownBy(() -> Reading.open(file, 3)).isInstanceOf(RejectedException.class);
  }

  @Test
  void anyCuttingIntoBlocksGivesTheSameSamples() throws Exception {
    byte[] data = new byte[6 * 100_003];
    new Random(7).nextBytes(data);
    byte[] file = WavBytes.plain(1, 2, 48000, 6, 24, data);
    double[] whole = Reading.samples(file, 2, 200_000);
    assertThat(whole).hasSize(100_003);
    for (int blockSize : new int[] {1, 17, 4096, 43_690, 43_691, 100_002}) {
      assertThat(Arrays.equals(Reading.samples(file, 2, blockSize), whole)).isTrue();
    }
  }

  @Test
  void takesUnknownSizesAsUpToTheEnd() throws Exception {
    for (int unknown : new int[] {0, -1, 0x7ffff000, 0x7fffffdb}) {
      byte[] file =
          WavBytes.of("RIFF")
              .format(1, 1, 8000, 2, 16)
              .chunk("data", unknown, FOUR_BYTES)
              .file(unknown);
      assertThat(Reading.samples(file, 1, 9)).containsExactly(1 / 32768.0, 2 / 32768.0);
      assertThat(Reading.warningsAfterReading(file)).containsExactly("lengthUnknown");
    }
  }

  @Test
  void anEmptyDataChunkBeforeAnotherChunkStaysEmpty() throws Exception {
    byte[] file =
        WavBytes.of("RIFF")
            .format(1, 1, 8000, 2, 16)
            .chunk("data", new byte[0])
            .chunk("LIST", new byte[40])
            .file();
    assertThat(Reading.accepted(file).frames()).isZero();
    assertThat(Reading.samples(file, 1, 9)).isEmpty();
  }

  @Test
  void saysWhatATruncatedFileLacks() throws Exception {
    byte[] file =
        WavBytes.of("RIFF")
            .format(1, 2, 8000, 4, 16)
            .chunk("data", 16_000 * 4, new byte[8000 * 4 + 2])
            .file();
    Recognised recognised = Reading.accepted(file);
    assertThat(recognised.frames()).isEqualTo(8000);
    assertThat(recognised.warnings())
        .extracting(Warning::code)
        .containsExactly("truncated", "partialFrame");
    assertThat(recognised.warnings().get(0).message())
        .contains("8000 of 16000", "1.000 s of 2.000 s");
    assertThat(recognised.warnings().get(1).message()).contains("2 of 4 bytes");
    assertThat(Reading.samples(file, 2, 999)).hasSize(8000);
  }

  @Test
  void tellsWrongSizesApart() throws Exception {
    WavBytes sound = WavBytes.of("RIFF").format(1, 1, 8000, 2, 16).chunk("data", FOUR_BYTES);
    assertThat(Reading.accepted(sound.file(5000)).warnings().get(0).message())
        .contains("5008 bytes", "48");
    assertThat(Reading.warningsAfterReading(sound.file(20))).containsExactly("wrongSize");
    byte[] shortField =
        WavBytes.of("RIFF")
            .format(1, 1, 8000, 2, 16)
            .chunk("data", 4, bytes(1, 0, 2, 0, 0xff, 0xff, 3, 0, 4, 0, 5, 0, 6, 0))
            .file();
    assertThat(Reading.accepted(shortField).warnings().get(0).message())
        .contains("10 bytes", "no chunk");
  }

  @Test
  void refusesNumbersThatAreNone() throws Exception {
    ByteBuffer data = ByteBuffer.allocate(8 * 8000).order(ByteOrder.LITTLE_ENDIAN);
    data.putFloat(8 * 4000, Float.NEGATIVE_INFINITY).putFloat(8 * 2000 + 4, Float.NaN);
    byte[] file = WavBytes.plain(3, 2, 8000, 8, 32, data.array());
    assertThatThrownBy(() -> Reading.samples(file, 2, 300))
        .isInstanceOf(RejectedException.class)
        .hasMessageContaining("notANumber")
        .hasMessageContaining("0.250000 s of channel 2 is not a number");
    assertThatThrownBy(() -> Reading.samples(file, 1, 300))
        .hasMessageContaining("0.500000 s of channel 1 is infinite");
  }

  @Test
  void refusesCompressedSamplesByName() throws Exception {
    int[] codes = {0x02, 0x06, 0x07, 0x11, 0x31, 0x50, 0x55};
    String[] names = {"Microsoft ADPCM", "A-law", "mu-law", "IMA ADPCM", "GSM", "MPEG", "MP3"};
    for (int i = 0; i < codes.length; i++) {
      byte[] file = WavBytes.plain(codes[i], 1, 8000, 1, 8, FOUR_BYTES);
      assertThat(Reading.refused(file).code()).isEqualTo("compressedAudio");
      assertThat(Reading.refused(file).message()).contains(names[i], "uncompressed");
    }
    byte[] unknown = WavBytes.plain(0x4321, 1, 8000, 1, 8, FOUR_BYTES);
    assertThat(Reading.refused(unknown).message()).contains("0x4321");
  }

  @Test
  void refusesHeadersThatContradictThemselves() throws Exception {
    refuses(WavBytes.plain(1, 0, 8000, 2, 16, FOUR_BYTES), "noChannels", "0 channels");
    refuses(WavBytes.plain(1, 1, 0, 2, 16, FOUR_BYTES), "noSampleRate", "0 samples per second");
    refuses(WavBytes.plain(1, 3, 8000, 4, 24, FOUR_BYTES), "blockAlign", "3 channels of 24 bits");
    refuses(WavBytes.plain(1, 1, 8000, 0, 16, FOUR_BYTES), "blockAlign", "0 bytes a frame");
    refuses(WavBytes.plain(1, 1, 8000, 8, 64, FOUR_BYTES), "unsupportedDepth", "64 bits");
    refuses(WavBytes.plain(1, 1, 8000, 6, 45, FOUR_BYTES), "unsupportedDepth", "45 bits");
    refuses(WavBytes.plain(1, 1, 8000, 0, 0, FOUR_BYTES), "unsupportedDepth", "0 bits");
    refuses(WavBytes.plain(3, 1, 8000, 2, 16, FOUR_BYTES), "unsupportedDepth", "16 bits");
  }

  @Test
  void refusesFilesWithoutTheirParts() throws Exception {
    WavBytes noFormat = WavBytes.of("RIFF").chunk("LIST", new byte[8]);
    refuses(noFormat.file(), "noFormatChunk", "no format chunk");
    WavBytes noData = WavBytes.of("RIFF").format(1, 1, 8000, 2, 16);
    refuses(noData.file(), "noDataChunk", "without a data chunk");
    WavBytes late = WavBytes.of("RIFF").chunk("data", FOUR_BYTES).format(1, 1, 8000, 2, 16);
    refuses(late.file(), "formatAfterData", "before any format chunk");
    WavBytes noLongSizes =
        WavBytes.of("RF64").format(1, 1, 8000, 2, 16).chunk("data", -1, FOUR_BYTES);
    refuses(noLongSizes.file(-1), "damagedHeader", "ds64");
    WavBytes shortFormat = WavBytes.of("RIFF").chunk("fmt ", new byte[14]);
    refuses(shortFormat.file(), "damagedHeader", "14 bytes");
    byte[] whole = WavBytes.plain(1, 1, 8000, 2, 16, FOUR_BYTES);
    refuses(Arrays.copyOf(whole, 10), "headerCut", "10 bytes");
    refuses(Arrays.copyOf(whole, 30), "headerCut", "30 bytes");
    refuses(Arrays.copyOf(whole, 45), "noSamples", "before the first one is complete");
    byte[] video = whole.clone();
    video[8] = 'A';
    video[9] = 'V';
    video[10] = 'I';
    video[11] = ' ';
    refuses(video, "notWave", "\"AVI \"");
  }

  @Test
  void refusesMillionsOfChunksInBoundedTime() throws Exception {
    byte[] file = new byte[12 + 8 * 20_000];
    System.arraycopy(WavBytes.of("RIFF").file(), 0, file, 0, 12);
    refuses(file, "tooManyChunks", "10000 chunks");
  }

  private static void refuses(byte[] file, String code, String words) throws Exception {
    assertThat(Reading.refused(file).code()).isEqualTo(code);
    assertThat(Reading.refused(file).message()).contains(words).endsWith(".");
  }

  private static byte[] bytes(int... values) {
    byte[] bytes = new byte[values.length];
    for (int i = 0; i < values.length; i++) {
      bytes[i] = (byte) values[i];
    }
    return bytes;
  }
}
