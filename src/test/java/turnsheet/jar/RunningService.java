package turnsheet.jar;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.net.ServerSocket;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The service in a process of its own, on a free port, with what it prints at hand. */
public final class RunningService implements AutoCloseable {

  private final Process process;
  private final int port;
  private final List<String> lines = new ArrayList<>();
  private volatile boolean ending;

  private RunningService(Process process, int port) {
    this.process = process;
    this.port = port;
    Thread reader = new Thread(this::collect);
    reader.setDaemon(true);
    reader.start();
  }

  /**
   * Starts the service on a data folder.
   *
   * @param subcommand {@code serve} or {@code demo}
   */
  public static RunningService start(String subcommand, Path dataFolder) throws IOException {
    return start(subcommand, dataFolder, Map.of());
  }

  /**
   * Starts the service on a data folder.
   *
   * @param settings environment variables beyond those of the tests
   */
  static RunningService start(String subcommand, Path dataFolder, Map<String, String> settings)
      throws IOException {
    int port;
    try (var probe = new ServerSocket(0)) {
      port = probe.getLocalPort();
    }
    ProcessBuilder command =
        new ProcessBuilder(
                BuiltJar.command(
                    List.of("-Xmx512m"),
                    subcommand,
                    "--server.port=" + port,
                    "--turnsheet.data-dir=" + dataFolder))
            .redirectErrorStream(true);
    command.environment().putAll(settings);
    return new RunningService(command.start(), port);
  }

  public String address(String path) {
    return "http://localhost:" + port + path;
  }

  /** Waits for a printed line that holds the pattern; its first group, or the whole match. */
  public String printed(Pattern pattern, Duration atMost) throws InterruptedException {
    long deadline = System.nanoTime() + atMost.toNanos();
    int seen = 0;
    synchronized (lines) {
      while (true) {
        for (; seen < lines.size(); seen++) {
          Matcher m = pattern.matcher(lines.get(seen));
          if (m.find()) {
            return m.groupCount() > 0 ? m.group(1) : m.group();
          }
        }
        long left = (deadline - System.nanoTime()) / 1_000_000;
        if (left <= 0 || !process.isAlive()) {
          throw new IllegalStateException(
              "no line with " + pattern + " within " + atMost + "; printed: " + lines);
        }
        lines.wait(Math.min(left, 200));
      }
    }
  }

  /** Ends the process as a power cut would. */
  public void kill() throws InterruptedException {
    ending = true;
    process.toHandle().destroyForcibly();
    process.waitFor();
  }

  /** Asks the process to end and waits; ends it by force where it does not. */
  @Override
  public void close() {
    ending = true;
    process.destroy();
    if (process.onExit().completeOnTimeout(process, 10, TimeUnit.SECONDS).join().isAlive()) {
      process.toHandle().destroyForcibly();
    }
  }

  private void collect() {
    try (var in =
        new BufferedReader(
            new InputStreamReader(process.getInputStream(), StandardCharsets.UTF_8))) {
      for (String line = in.readLine(); line != null; line = in.readLine()) {
        synchronized (lines) {
          lines.add(line);
          lines.notifyAll();
        }
      }
    } catch (IOException e) {
      if (!ending) {
        throw new UncheckedIOException(e);
      }
    }
  }
}
