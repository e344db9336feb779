package turnsheet.core.format.audio;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.format.api.Recognition;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Rejection;
import turnsheet.core.signal.SampleReader;
import turnsheet.core.signal.Warning;

/**
 * Files of public decoder test suites (each folder's SOURCE.md names origin and licence), with what
 * two general decoders made of them: rate, channels, frames, and the MD5 of all samples interleaved
 * as left-justified 32-bit little-endian integers.
 */
class AudioCorpusTest {

  private static final List<String> FOLDERS =
      List.of(
          "aiff-basic",
          "flac-conformance",
          "flac-fuzz",
          "flac-metadata",
          "mixed-odd",
          "wav-bw64",
          "wav-chunks",
          "wav-codecs",
          "wav-depths",
          "wav-headers",
          "wav-structured");

  /** Unusable by its SOURCE.md, or in an encoding that this service refuses by name. */
  private static final List<String> MUST_REFUSE =
      List.of(
          "ableton.aif",
          "large_vendor_string.flac",
          "large_vorbis_comment_block.flac",
          "CWE-835-01.aiff",
          "dvi_adpcm.wav",
          "mpeglayer3.wav",
          "mulaw.wav",
          "rect_24bit_noriff.wav",
          "rect_24bit_wrong_fmt_size.wav",
          "4-bit-imaadpcm-8kHz-noBext-mono-reaper.wav",
          "4bit-imaadpcm-8kHz-noBext-mono-encoded.wav",
          "4bit-imaadpcm-8kHz-noBext-mono.wav",
          "8bit-alaw-8kHz-noBext-mono-encoded.wav",
          "test-44100Hz-le-1ch-4bytes-early-eof-no-data.wav",
          "test-8000Hz-le-1ch-1byte-ulaw.wav",
          "test-8000Hz-le-3ch-5S-24bit-inconsistent.wav",
          "test-8000Hz-le-3ch-5S-45bit.wav",
          "test-8000Hz-le-3ch-5S-64bit.wav");

  /** Beginnings of names of files that may go either way, with what SOURCE.md says of them. */
  private static final Map<String, String> EITHER =
      Map.ofEntries(
          Map.entry("faulty__", "refuse, or decode with a stated warning"),
          Map.entry("uncommon__", "decode or refuse cleanly"),
          Map.entry("fuzz__", "bounded time and memory, no crash"),
          Map.entry("empty_vorbis_comment", "accept or refuse cleanly"),
          Map.entry("repeated_vorbis_comment", "accept or refuse cleanly"),
          Map.entry("odd-list-type", "not in the list of outcomes; a decoder reads it in part"),
          Map.entry("unsupported__", "support, or refuse naming the reason"),
          Map.entry("invalid__smpl_", "a reader without interest in smpl chunks may accept"),
          Map.entry("invalid__data_chunk_truncated", "may accept, saying that data is missing"),
          Map.entry("invalid__format_chunk_after_data_chunk", "the decoders disagree"),
          Map.entry("invalid__format_chunk_with_extra_byte_and_missing", "the decoders disagree"),
          Map.entry("invalid__float_format_chunk_extension", "the decoders disagree"),
          Map.entry("test-8000Hz-le-5ch-9S-5bit", "refuse, or read as left-justified bytes"));

  /** Files whose listed samples cannot be the measure, with the reason. */
  private static final Map<String, String> OTHER_SAMPLES =
      Map.of(
          "faulty__01 - wrong max blocksize.flac",
          "the decoder stopped early; all frames are checked against the stream's own MD5",
          "pcmwaveformat-24bit-4byte-48kHz-stereo.wav",
          "the decoder took integers for a 24.0 float code; WavFormatTest checks this layout",
          "waveformatextensible-24bit-4byte-48kHz-stereo.wav",
          "the decoder took integers for a 24.0 float code; WavFormatTest checks this layout");

  /** Big-endian files that the decoder took for little-endian; the plain counterpart is right. */
  private static final Map<String, String> COUNTERPART =
      Map.of(
          "RIFX-16bit-mono.wav", "16-bit-8kHz-noBext-mono.wav",
          "test-8000Hz-be-3ch-5S-24bit.wav", "test-8000Hz-le-3ch-5S-24bit.wav");

  /**
   * Against endless loops only: a file of seven channels is decoded seven times, on a machine that
   * may be busy with other things.
   */
  private static final Duration LIMIT = Duration.ofSeconds(30);

  private static final AtomicInteger ACCEPTED = new AtomicInteger();
  private static final AtomicInteger REFUSED = new AtomicInteger();
  private static final List<String> OWN_MEASURE = new ArrayList<>();

  @TestFactory
  Stream<DynamicTest> everyFileEndsAsExpected() throws IOException {
    Path corpus = Path.of(System.getProperty("turnsheet.corpus", "corpus"));
    if (!Files.isDirectory(corpus)) {
      System.out.println("audio corpus: the folder is absent, nothing was checked");
    }
    assumeTrue(Files.isDirectory(corpus));
    List<DynamicTest> tests = new ArrayList<>();
    for (String folder : FOLDERS) {
      List<Map<String, String>> rows = rows(corpus.resolve(folder).resolve("EXPECTED.csv"));
      for (Map<String, String> listed : rows) {
        String name = listed.getOrDefault("file", "");
        Path file = corpus.resolve(folder).resolve(name);
        String measure = COUNTERPART.getOrDefault(name, name);
        Map<String, String> row =
            rows.stream().filter(r -> measure.equals(r.get("file"))).findFirst().orElse(listed);
        tests.add(
            DynamicTest.dynamicTest(
                folder + "/" + file.getFileName(),
                () -> assertTimeoutPreemptively(LIMIT, () -> check(file, row))));
      }
    }
    assertThat(tests).hasSizeGreaterThan(150);
    return tests.stream();
  }

  @AfterAll
  static void printSummary() {
    System.out.printf(
        "audio corpus: %d files, %d accepted (%d with the listed samples, %s checked otherwise),"
            + " %d refused%n",
        ACCEPTED.get() + REFUSED.get(),
        ACCEPTED.get(),
        ACCEPTED.get() - OWN_MEASURE.size(),
        OWN_MEASURE,
        REFUSED.get());
  }

  private static void check(Path path, Map<String, String> row) throws Exception {
    String file = path.getFileName().toString();
    Outcome outcome = outcome(new MemorySource(Files.readAllBytes(path)));
    boolean either = EITHER.keySet().stream().anyMatch(file::startsWith);
    boolean mustRefuse = MUST_REFUSE.contains(file) || (file.startsWith("invalid__") && !either);
    Rejection rejection = outcome.rejection;
    if (rejection != null) {
      assertThat(mustRefuse || either).as("refused: " + rejection).isTrue();
      assertThat(rejection.code()).matches("[a-z][A-Za-z0-9]+");
      assertThat(rejection.message()).endsWith(".").hasSizeGreaterThan(30);
      REFUSED.incrementAndGet();
      return;
    }
    assertThat(mustRefuse).as("accepted").isFalse();
    if (file.startsWith("invalid__data_chunk_truncated")) {
      assertThat(outcome.warnings).extracting(Warning::code).contains("truncated");
    }
    assertThat(outcome.warnings).extracting(Warning::code).doesNotContain("md5Mismatch");
    ACCEPTED.incrementAndGet();
    if (OTHER_SAMPLES.containsKey(file) || row.getOrDefault("rate_hz", "").isEmpty()) {
      OWN_MEASURE.add(file);
      return;
    }
    assertThat(outcome.rateHertz).isEqualTo(Double.parseDouble(row.get("rate_hz")));
    assertThat(outcome.channels).isEqualTo(Integer.parseInt(row.get("channels")));
    String frames = row.getOrDefault("decoded_frames", "");
    assertThat(outcome.frames).isEqualTo(frames.isEmpty() ? 0 : Long.parseLong(frames));
    if (outcome.frames > 0) {
      assertThat(outcome.md5).isEqualTo(row.get("pcm_md5_s32"));
    }
    if (outcome.warnings.isEmpty() && outcome.announcedFrames >= 0) {
      assertThat(outcome.announcedFrames).isEqualTo(outcome.frames);
    }
  }

  /** Reads every channel by a reader of its own and puts them together again. */
  private static Outcome outcome(ByteSource source) throws Exception {
    CaptureFormats formats = CaptureFormats.standard();
    Outcome outcome = new Outcome();
    Recognition recognition = formats.recognise(source, ReadOptions.none());
    if (recognition instanceof Recognition.Refused refused) {
      outcome.rejection = refused.rejection();
      return outcome;
    }
    Recognised recognised = ((Recognition.Accepted) recognition).recognised();
    outcome.channels = recognised.channels().size();
    outcome.rateHertz = recognised.sampleRateHertz() == null ? 0 : recognised.sampleRateHertz();
    outcome.announcedFrames = recognised.frames() == null ? -1 : recognised.frames();
    int[][] samples = new int[outcome.channels][];
    try {
      for (int c = 0; c < outcome.channels; c++) {
        try (SampleReader reader =
            formats.openSamples(source, ReadOptions.none().withChannel(c + 1))) {
          samples[c] = all(reader);
          outcome.warnings = reader.warnings();
        }
      }
    } catch (RejectedException e) {
      outcome.rejection = e.rejection();
      return outcome;
    }
    outcome.frames = samples[0].length;
    ByteBuffer bytes =
        ByteBuffer.allocate(4 * samples.length * samples[0].length).order(ByteOrder.LITTLE_ENDIAN);
    for (int i = 0; i < samples[0].length; i++) {
      for (int[] channel : samples) {
        bytes.putInt(channel[i]);
      }
    }
    outcome.md5 = HexFormat.of().formatHex(MessageDigest.getInstance("MD5").digest(bytes.array()));
    return outcome;
  }

  private static int[] all(SampleReader reader) throws IOException, RejectedException {
    double[] block = new double[4099];
    int[] samples = new int[0];
    for (int got = reader.read(block); got > 0; got = reader.read(block)) {
      int at = samples.length;
      samples = Arrays.copyOf(samples, at + got);
      for (int i = 0; i < got; i++) {
        // a float of full scale or more ends at the largest integer, as in the listed decoder
        double scaled = Math.rint(block[i] * 0x1p31);
        samples[at + i] = (int) Math.max(Integer.MIN_VALUE, Math.min(Integer.MAX_VALUE, scaled));
      }
    }
    return samples;
  }

  private static List<Map<String, String>> rows(Path csv) throws IOException {
    try (CsvReader<NamedCsvRecord> reader = CsvReader.builder().ofNamedCsvRecord(csv)) {
      return reader.stream().map(NamedCsvRecord::getFieldsAsMap).toList();
    }
  }

  private static final class Outcome {
    private @Nullable Rejection rejection;
    private List<Warning> warnings = List.of();
    private int channels;
    private double rateHertz;
    private long announcedFrames;
    private long frames;
    private String md5 = "";
  }
}
