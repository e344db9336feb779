package turnsheet.browser;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Locale;
import java.util.stream.Collectors;

/**
 * Keeps each page as the service sends it, which is not what the browser makes of it: that mends
 * the markup, and scripts add to it. The build gives the folder to the markup checker after the
 * browser tests (see {@code pom.xml}).
 */
final class SentPages {

  private static final Path FOLDER = Path.of("target", "pages");

  /** Asks for the same address once more: pages are sent not to be stored, so none is at hand. */
  private static final String SOURCE =
      """
      const done = arguments[arguments.length - 1];
      fetch(location.href).then((answer) => answer.text()).then(done, (e) => done(""));
      """;

  private final Visitor visitor;
  private int count;

  /** Starts with an empty folder. */
  SentPages(Visitor visitor) throws IOException {
    this.visitor = visitor;
    Files.createDirectories(FOLDER);
    try (var old = Files.list(FOLDER)) {
      for (Path file : old.toList()) {
        Files.delete(file);
      }
    }
  }

  int count() {
    return count;
  }

  /** Keeps the page that stands open. */
  void keep(String page) throws IOException {
    String source = String.valueOf(visitor.awaitScript(SOURCE));
    if (!source.contains("</html>")) {
      throw new IllegalStateException(page + " cannot be fetched again: " + source);
    }
    count++;
    Files.writeString(FOLDER.resolve("%02d-%s.html".formatted(count, words(page))), source);
  }

  /** {@code visits-id-sheet}. */
  private static String words(String page) {
    return Arrays.stream(page.toLowerCase(Locale.ROOT).split("[^a-z0-9]+", -1))
        .filter(word -> !word.isEmpty())
        .collect(Collectors.joining("-"));
  }
}
