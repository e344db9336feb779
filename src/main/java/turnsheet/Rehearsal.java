package turnsheet;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.io.PrintStream;
import java.net.URI;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.springframework.context.ConfigurableApplicationContext;
import turnsheet.cli.MeasureCommand;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;

/**
 * The whole start, the first page and one measurement on the shell, once, for the archive of
 * classes that is made when the project is packaged: what is not used here is not in it.
 */
final class Rehearsal {

  private Rehearsal() {}

  /** Asks a started service for its first page and ends it, then measures a short tone. */
  static void run(ConfigurableApplicationContext service) throws IOException {
    try (service) {
      String port = service.getEnvironment().getRequiredProperty("local.server.port");
      try (InputStream page = URI.create("http://localhost:" + port + "/").toURL().openStream()) {
        page.readAllBytes();
      }
    }
    measure();
  }

  private static void measure() throws IOException {
    Path file = Files.createTempFile("rehearsal", ".wav");
    try (PrintStream nowhere =
        new PrintStream(OutputStream.nullOutputStream(), false, StandardCharsets.UTF_8)) {
      SpeedFunction speed = SpeedFunction.constant(0).plusLine(4, 0.1, 0);
      double[] samples = SignalSynth.tone(speed, 1000, 8000, 8, 0.5, 60, 1);
      try (OutputStream out = Files.newOutputStream(file)) {
        WavWriter.write(out, 8000, 24, samples);
      }
      String[] asked = {file.toString(), "--tone-hz", "1000"};
      MeasureCommand.run(asked, nowhere, nowhere);
    } finally {
      Files.delete(file);
    }
  }
}
