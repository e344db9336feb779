package turnsheet.demo;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;

/** Writes the sample folder: the files and the page that says what is true about them. */
public final class SampleFolder {

  private static final String HEAD =
      """
      # Sample uploads

      Recordings of invented machines with invented faults, to try the service with. Every file is
      made by this project from a closed-form speed and a fixed seed (`turnsheet.demo.SampleUploads`);
      a test compares this folder with what the generator writes. To write it afresh:

          java -jar target/turnsheet.jar samples sample-uploads

      The truth below is computed on the speed function itself, never by measuring. Deviation is
      positive where the machine runs fast; the weighted figure is the magnitude of the weighted
      fluctuation (table 1 of AES6-2008) that is exceeded for 5 % of the time.

      | file | what it is | measure with | length | deviation % | weighted two-sigma % | unweighted rms % |
      | --- | --- | --- | --- | --- | --- | --- |
      """;

  private static final String TAIL =
      """

      Two files are there to be refused:

      | file | why |
      | --- | --- |
      | renamed-zip.wav | a compressed folder that was given another name |
      | silence.wav | five seconds without a signal |
      """;

  private SampleFolder() {}

  /** The shell command: one argument, the folder, {@code sample-uploads} where it is left out. */
  public static void run(String[] args) throws IOException {
    Path folder = Path.of(args.length == 0 ? "sample-uploads" : args[0]);
    write(folder);
    System.out.println("Wrote the samples to " + folder.toAbsolutePath());
  }

  /** Writes all files into a folder, which is made where it is missing. */
  static void write(Path folder) throws IOException {
    Files.createDirectories(folder);
    for (SampleUpload sample : SampleUploads.all()) {
      Files.write(folder.resolve(sample.fileName()), sample.bytes());
    }
    for (String name : RefusedUploads.ALL) {
      Files.write(folder.resolve(name), RefusedUploads.bytes(name));
    }
    Files.writeString(folder.resolve("README.md"), readme());
  }

  static String readme() {
    var text = new StringBuilder(HEAD);
    for (SampleUpload sample : SampleUploads.all()) {
      SpeedTruth truth = sample.truth();
      text.append(
          String.format(
              Locale.ROOT,
              "| %s | %s | `%s` | %.0f s | %+.4f | %.4f | %.4f |\n",
              sample.fileName(),
              sample.about(),
              option(sample),
              sample.durationSeconds(),
              truth.deviationPercent(),
              truth.weightedTwoSigmaPercent(),
              truth.unweightedRmsPercent()));
    }
    return text.append(TAIL).toString();
  }

  private static String option(SampleUpload sample) {
    return switch (sample.kind()) {
      case TONE -> String.format(Locale.ROOT, "--tone-hz %.0f", sample.nominalHz());
      case TACHOMETER, EDGES ->
          String.format(Locale.ROOT, "--pulses-per-second %.0f", sample.nominalHz());
    };
  }
}
