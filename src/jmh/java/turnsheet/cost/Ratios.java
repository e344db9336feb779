package turnsheet.cost;

import com.sun.management.OperatingSystemMXBean;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.CsvRecord;
import java.io.File;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.lang.management.ManagementFactory;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.Callable;

/**
 * Processor time of measurements beside that of other programs on the same files, as table rows for
 * docs/performance.md. A load beside it disturbs processor time less than time on the clock, and
 * always upwards: the least of several runs counts.
 *
 * <p>Arguments: names of rows to print; all of them without.
 */
public final class Ratios {

  private static final Path PYTHON_SCRIPT =
      Path.of("docs", "performance", "mix_decimate_unwrap.py");

  private Ratios() {}

  /** Prints the rows. */
  public static void main(String[] args) throws Exception {
    List<String> chosen =
        args.length == 0
            ? List.of("tone", "hour", "stereo", "shell", "edges", "trial", "heap")
            : List.of(args);
    for (String row : chosen) {
      switch (row) {
        case "tone" -> tone();
        case "hour" -> hour();
        case "shell" -> shell();
        case "edges" -> edges();
        case "stereo" -> Channels.rows();
        case "trial" -> trial();
        case "heap" -> heap();
        case "one" -> twoHours(1, 1);
        case "both in turn" -> twoHours(2, 1);
        case "both at once" -> twoHours(2, 2);
        default -> throw new IllegalArgumentException(row);
      }
    }
  }

  private static void tone() throws Exception {
    Path file = Recordings.tone(10, 96_000, 1);
    double sox = soxSeconds(file);
    double own = least(24, () -> Measuring.tone(file));
    row("sox FILE -n stat", sox, 1);
    row("tone of 10 min in process, warm", own, own / sox);
    double python =
        process(1, "python3 " + PYTHON_SCRIPT + " " + file + " " + Recordings.TONE_HERTZ);
    row("NumPy script", python, python / own);
    row("sha256sum FILE", process(5, "sha256sum " + file), Double.NaN);
  }

  private static double soxSeconds(Path file) throws IOException, InterruptedException {
    return process(5, "sox " + file + " -n stat");
  }

  private static void hour() throws Exception {
    Path ten = Recordings.tone(10, 96_000, 1);
    Path sixty = Recordings.tone(60, 96_000, 1);
    double short10 = least(24, () -> Measuring.tone(ten));
    double long60 = least(4, () -> Measuring.tone(sixty));
    row("tone of 60 min over 10 min", long60, long60 / short10);
  }

  private static void shell() throws IOException, InterruptedException {
    Path file = Recordings.tone(10, 96_000, 1);
    double sox = soxSeconds(file);
    double whole =
        process(
            5,
            "java -XX:SharedArchiveFile=target/turnsheet.jsa -jar target/turnsheet.jar measure "
                + file
                + " --tone-hz "
                + Recordings.TONE_HERTZ);
    row("shell command less sox", whole - sox, Double.NaN);
  }

  private static void edges() throws Exception {
    Path file = Recordings.edges(60);
    double plain = least(5, () -> fields(file));
    double own = least(5, () -> Measuring.edges(file));
    row("FastCSV over the edge list of 1 h", plain, 1);
    row("edge list of 1 h in process, warm", own, own / plain);
  }

  /** Asked for: within 5 times one measurement per candidate, divided by the processors. */
  private static void trial() throws Exception {
    Path file = Recordings.tachometer(96_000);
    double one = least(6, () -> Measuring.tachometer(file));
    double wallBefore = System.nanoTime() * 1e-9;
    double all = least(2, () -> Measuring.trial(file));
    double wall = (System.nanoTime() * 1e-9 - wallBefore) / 2;
    row("tachometer of 60 s, 96 kHz, in process, warm", one, 1);
    row("trial of 40 filters on it, per filter", all / 40, all / 40 / one);
    row(
        "the same, on the clock",
        wall,
        wall / (40 * one / Runtime.getRuntime().availableProcessors()));
  }

  private static long fields(Path file) throws IOException {
    long characters = 0;
    try (CsvReader<CsvRecord> reader = CsvReader.builder().ofCsvRecord(file)) {
      for (CsvRecord line : reader) {
        characters += line.getField(0).length();
      }
    }
    return characters;
  }

  /** The smallest heap in which two hours can be measured, within two megabytes. */
  private static void heap() throws IOException, InterruptedException {
    Recordings.tone(120, 192_000, 2); // made by a process that has the memory for it
    for (String how : List.of("one", "both in turn", "both at once")) {
      int enough = 512;
      int tooSmall = 16;
      while (enough - tooSmall > 2) {
        int middle = (enough + tooSmall) / 2;
        if (fits(middle, how)) {
          enough = middle;
        } else {
          tooSmall = middle;
        }
      }
      System.out.printf(
          Locale.ROOT, "| heap for 2 h of 192 kHz stereo, %s | %d MiB | |%n", how, enough);
    }
  }

  private static void twoHours(int channels, int atOnce) throws IOException {
    Channels.measure(FileSource.of(Recordings.tone(120, 192_000, 2)), channels, atOnce);
  }

  private static boolean fits(int megabytes, String how) throws IOException, InterruptedException {
    String java = Path.of(System.getProperty("java.home"), "bin", "java").toString();
    return new ProcessBuilder(
                java,
                "-XX:+UseSerialGC",
                "-Xmx" + megabytes + "m",
                "-cp",
                System.getProperty("java.class.path"),
                Ratios.class.getName(),
                how)
            .redirectErrorStream(true)
            .redirectOutput(ProcessBuilder.Redirect.DISCARD)
            .start()
            .waitFor()
        == 0;
  }

  /** Least processor time of this process, in seconds. */
  private static double least(int runs, Callable<?> work) throws Exception {
    var system = ManagementFactory.getPlatformMXBean(OperatingSystemMXBean.class);
    double least = Double.POSITIVE_INFINITY;
    for (int i = 0; i < runs; i++) {
      long before = system.getProcessCpuTime();
      work.call();
      least = Math.min(least, (system.getProcessCpuTime() - before) * 1e-9);
    }
    return least;
  }

  /** Least processor time of a command with all that it starts, in seconds. */
  private static double process(int runs, String command) throws IOException, InterruptedException {
    double least = Double.POSITIVE_INFINITY;
    for (int i = 0; i < runs; i++) {
      File times = File.createTempFile("times", null);
      Process process =
          new ProcessBuilder(
                  "bash", "-c", "TIMEFORMAT='%U %S'; time " + command + " > /dev/null 2>&1")
              .redirectError(times)
              .start();
      int status = process.waitFor();
      String told = Files.readString(times.toPath(), StandardCharsets.UTF_8).strip();
      Files.delete(times.toPath());
      if (status != 0) {
        throw new UncheckedIOException(new IOException(command + ": status " + status));
      }
      String[] userAndSystem = told.split(" ", 2);
      least =
          Math.min(
              least, Double.parseDouble(userAndSystem[0]) + Double.parseDouble(userAndSystem[1]));
    }
    return least;
  }

  private static void row(String what, double seconds, double ratio) {
    String shown = Double.isNaN(ratio) ? "" : String.format(Locale.ROOT, "%.2f", ratio);
    System.out.printf(Locale.ROOT, "| %s | %.2f s | %s |%n", what, seconds, shown);
  }
}
