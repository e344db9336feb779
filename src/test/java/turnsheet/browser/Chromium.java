package turnsheet.browser;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.time.Duration;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import java.util.logging.Level;
import org.openqa.selenium.Dimension;
import org.openqa.selenium.chrome.ChromeDriver;
import org.openqa.selenium.chrome.ChromeDriverService;
import org.openqa.selenium.chrome.ChromeOptions;
import org.openqa.selenium.logging.LogType;
import org.openqa.selenium.logging.LoggingPreferences;

/**
 * A real Chromium for the browser tests: the one on the machine, or on Debian the one that apt
 * installs. Elsewhere the message says what is missing.
 */
final class Chromium {

  private static final List<String> BROWSERS =
      List.of("/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome");
  private static final List<String> DRIVERS =
      List.of("/usr/bin/chromedriver", "/usr/lib/chromium-browser/chromedriver");

  private Chromium() {}

  /** Starts a headless browser; the caller quits it. */
  static ChromeDriver start(int width, int height) throws IOException, InterruptedException {
    if (isMissing()) {
      installAlone();
    }
    String browser = first(BROWSERS);
    String driver = first(DRIVERS);
    if (browser == null || driver == null) {
      throw new IllegalStateException(
          "The browser tests need Chromium and its driver. Looked for "
              + BROWSERS
              + " and "
              + DRIVERS
              + ". On Debian: apt-get install chromium chromium-driver. Elsewhere install both and"
              + " link them to the first of those paths.");
    }
    ChromeOptions options = new ChromeOptions();
    options.setBinary(browser);
    options.addArguments(
        "--headless=new",
        "--no-sandbox",
        "--disable-gpu",
        "--disable-quic",
        "--disable-dev-shm-usage",
        "--no-first-run",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
        "--lang=en-GB",
        "--user-data-dir=" + Files.createTempDirectory("turnsheet-chromium"));
    options.setExperimentalOption(
        "prefs", Map.of("download.default_directory", System.getProperty("java.io.tmpdir")));
    LoggingPreferences console = new LoggingPreferences();
    console.enable(LogType.BROWSER, Level.ALL);
    options.setCapability(ChromeOptions.LOGGING_PREFS, console);
    ChromeDriver chrome =
        new ChromeDriver(
            new ChromeDriverService.Builder()
                .usingDriverExecutable(Path.of(driver).toFile())
                .build(),
            options);
    chrome.manage().timeouts().pageLoadTimeout(Duration.ofSeconds(30));
    chrome.manage().window().setSize(new Dimension(width, height));
    return chrome;
  }

  private static boolean isMissing() {
    return first(BROWSERS) == null || first(DRIVERS) == null;
  }

  /** Two test processes may find the browser missing; the one that comes second finds it there. */
  private static void installAlone() throws IOException, InterruptedException {
    Path lock = Path.of(System.getProperty("java.io.tmpdir"), "turnsheet-chromium.lock");
    try (FileChannel channel =
            FileChannel.open(lock, StandardOpenOption.CREATE, StandardOpenOption.WRITE);
        FileLock held = channel.lock()) {
      if (held.isValid() && isMissing()) {
        install();
      }
    }
  }

  private static String first(List<String> paths) {
    return paths.stream().filter(p -> Files.isExecutable(Path.of(p))).findFirst().orElse(null);
  }

  /** Debian with the right to install; anywhere else it does nothing and the caller says so. */
  private static void install() throws IOException, InterruptedException {
    if (!Files.exists(Path.of("/etc/debian_version"))) {
      return;
    }
    boolean root = "root".equals(System.getProperty("user.name"));
    String apt =
        "export DEBIAN_FRONTEND=noninteractive; apt-get update -qq && apt-get install -y -qq"
            + " chromium chromium-driver fonts-liberation";
    List<String> command = root ? List.of("sh", "-c", apt) : List.of("sudo", "-n", "sh", "-c", apt);
    Process process =
        new ProcessBuilder(command)
            .redirectErrorStream(true)
            .redirectOutput(ProcessBuilder.Redirect.DISCARD)
            .start();
    if (!process.waitFor(5, TimeUnit.MINUTES)) {
      process.destroyForcibly();
    }
  }
}
