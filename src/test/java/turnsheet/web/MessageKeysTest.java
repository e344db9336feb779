package turnsheet.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Properties;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import turnsheet.core.measure.FigureName;

/**
 * Every text has a use and every use a text. A key is used where it stands whole between quotes or
 * in a message expression; a word between quotes that ends with a point, as in {@code
 * 'web.verdict.' + word}, uses all keys that begin with it.
 */
class MessageKeysTest {
  private static final Path MAIN = Path.of("src", "main");

  private static final String GERMAN = "_de";
  private static final Set<String> USED = new TreeSet<>();

  private static final Properties KEYS = new Properties();
  private static final List<String> TWICE = new ArrayList<>();

  @BeforeAll
  static void readEverything() throws IOException {
    for (Path file : files("resources/messages", ".properties")) {
      if (isGerman(file)) {
        continue;
      }
      Properties one = read(file);
      one.stringPropertyNames().stream().filter(KEYS::containsKey).forEach(TWICE::add);
      KEYS.putAll(one);
    }
    for (FigureName figure : FigureName.values()) {
      USED.add("figure." + figure.path()); // figures are named by their path in the contract
    }
    String roots =
        KEYS.stringPropertyNames().stream()
            .map(k -> k.substring(0, k.indexOf('.')))
            .distinct()
            .collect(Collectors.joining("|", "(?:", ")"));
    // "{key}" is how bean validation names one
    Pattern use =
        Pattern.compile("(?:[\"'|]|#\\{|\\{)(" + roots + "\\.[A-Za-z0-9.]*)(?=[\"'|}(]|\\$\\{)");
    for (Path file : files("resources/templates", ".html")) {
      collect(use, file);
    }
    for (Path file : files("java", ".java")) {
      collect(use, file);
    }
  }

  @Test
  void theScanSeesTheProject() {
    assertThat(KEYS.size()).isGreaterThan(100);
    assertThat(USED).contains("web.layout.shop", "access.signIn.title", "web.verdict.");
  }

  /**
   * Each English file has a German one with the same texts and the same places for what is filled
   * in.
   */
  @Test
  void germanSaysAllThatEnglishSays() throws IOException {
    List<Path> files = files("resources/messages", ".properties");
    List<Path> english = files.stream().filter(file -> !isGerman(file)).toList();
    assertThat(files).hasSize(2 * english.size());
    for (Path file : english) {
      String name = file.getFileName().toString().replace(".properties", GERMAN + ".properties");
      Properties said = read(file);
      Properties german = read(file.resolveSibling(name));
      assertThat(german.stringPropertyNames()).as(name).isEqualTo(said.stringPropertyNames());
      for (String key : said.stringPropertyNames()) {
        assertThat(places(german.getProperty(key)))
            .as(key)
            .isEqualTo(places(said.getProperty(key)));
      }
    }
  }

  /**
   * A text is a pattern, in which an apostrophe stands twice, only where something is filled in.
   */
  @Test
  void apostrophesArriveAsOne() throws IOException {
    for (Path file : files("resources/messages", ".properties")) {
      Properties texts = read(file);
      for (String key : texts.stringPropertyNames()) {
        String text = texts.getProperty(key);
        if (places(text).isEmpty()) {
          assertThat(text).as(key).doesNotContain("''");
        } else {
          assertThat(text.replace("''", "")).as(key).doesNotContain("'");
        }
      }
    }
  }

  private static Set<String> places(String text) {
    return Pattern.compile("\\{\\w+")
        .matcher(text)
        .results()
        .map(r -> r.group())
        .collect(Collectors.toCollection(TreeSet::new));
  }

  private static boolean isGerman(Path file) {
    return file.getFileName().toString().contains(GERMAN);
  }

  private static Properties read(Path file) throws IOException {
    Properties texts = new Properties();
    try (var in = Files.newBufferedReader(file)) {
      texts.load(in);
    }
    return texts;
  }

  @Test
  void everyUseHasAText() {
    assertThat(USED)
        .filteredOn(use -> !use.endsWith("."))
        .allSatisfy(use -> assertThat(KEYS.stringPropertyNames()).contains(use));
    assertThat(USED)
        .filteredOn(use -> use.endsWith("."))
        .allSatisfy(
            use -> assertThat(KEYS.stringPropertyNames()).anyMatch(key -> key.startsWith(use)));
  }

  @Test
  void everyTextHasAUse() {
    assertThat(KEYS.stringPropertyNames()).filteredOn(MessageKeysTest::unused).isEmpty();
  }

  @Test
  void noKeyStandsTwice() {
    assertThat(TWICE).isEmpty();
  }

  private static boolean unused(String key) {
    return !USED.contains(key)
        && USED.stream().noneMatch(use -> use.endsWith(".") && key.startsWith(use));
  }

  private static void collect(Pattern use, Path file) throws IOException {
    Matcher found = use.matcher(Files.readString(file));
    while (found.find()) {
      USED.add(found.group(1));
    }
  }

  private static List<Path> files(String below, String ending) {
    try (Stream<Path> all = Files.walk(MAIN.resolve(below))) {
      return all.filter(p -> p.toString().endsWith(ending)).toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
