package turnsheet.jar;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;

/** The built jar as its users run it: a process of its own. */
public final class BuiltJar {

  private BuiltJar() {}

  /** What a finished run left behind. */
  public record Ended(int status, String out, String err) {}

  /** Path of the jar, from the build. */
  public static Path path() {
    return Path.of(System.getProperty("turnsheet.jar", "target/turnsheet.jar"));
  }

  /** Command line that runs the jar on the JDK of the tests. */
  public static List<String> command(List<String> jvmOptions, String... arguments) {
    var command = new ArrayList<String>();
    command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
    command.addAll(jvmOptions);
    command.add("-jar");
    command.add(path().toString());
    command.addAll(List.of(arguments));
    return command;
  }

  /** Runs to the end within a bound, or fails. */
  public static Ended run(int seconds, List<String> jvmOptions, String... arguments)
      throws IOException, InterruptedException {
    Process process = new ProcessBuilder(command(jvmOptions, arguments)).start();
    var err = new StringBuilder();
    Thread reader = new Thread(() -> err.append(text(process.getErrorStream())));
    reader.start();
    String out = text(process.getInputStream());
    if (!process.waitFor(seconds, TimeUnit.SECONDS)) {
      process.destroyForcibly();
      throw new IllegalStateException("still running after " + seconds + " s: " + out + err);
    }
    reader.join();
    return new Ended(process.exitValue(), out, err.toString());
  }

  private static String text(InputStream in) {
    try (in) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new java.io.UncheckedIOException("reading what the process prints", e);
    }
  }
}
