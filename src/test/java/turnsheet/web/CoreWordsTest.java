package turnsheet.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Properties;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.springframework.context.i18n.LocaleContextHolder;

/** The German of what the core says, held against the source of the core. */
class CoreWordsTest {

  private static final Path MAIN = Path.of("src", "main");
  private static final CoreWords WORDS = new CoreWords();

  @Test
  void fillsInWhatTheCoreFilledInWithTheDecimalComma() {
    assertThat(
            CoreWords.in(
                Locale.GERMANY,
                "The tone was lost 3 times, 0.25 s in all, first at 1.50 s: these stretches are left"
                    + " out of the figures."))
        .startsWith("Der Ton ging 3-mal verloren, zusammen 0,25 s, zuerst bei 1,50 s:");
  }

  @Test
  void saysPiecesInGermanToo() {
    assertThat(CoreWords.in(Locale.GERMANY, "text, 2 columns separated by tabs"))
        .isEqualTo("Text, 2 Spalten, getrennt durch Tabulatoren");
    assertThat(
            CoreWords.in(
                Locale.GERMANY,
                "Line 7, column 2: \"x\" stands where a number is needed: correct or remove the line."))
        .isEqualTo(
            "Zeile 7, Spalte 2: \"x\" steht, wo eine Zahl gebraucht wird: Berichtigen oder entfernen Sie die Zeile.");
  }

  @Test
  void whatIsNotKnownStaysAndIsMarked() {
    String unknown = "The moon stood in the way.";
    try {
      LocaleContextHolder.setLocale(Locale.GERMANY);
      assertThat(WORDS.text(unknown)).isEqualTo(unknown);
      assertThat(WORDS.lang(unknown)).isEqualTo("en");
      assertThat(WORDS.lang("as received")).isNull();
      assertThat(WORDS.text("as received")).isEqualTo("wie erhalten");
      LocaleContextHolder.setLocale(Locale.UK);
      assertThat(WORDS.text("as received")).isEqualTo("as received");
      assertThat(WORDS.lang(unknown)).isNull();
    } finally {
      LocaleContextHolder.resetLocaleContext();
    }
  }

  /** A sentence changed in the core must be changed here, or it would turn English unnoticed. */
  @Test
  void everyEnglishTextIsSaidSomewhere() throws IOException {
    String source = source("java/turnsheet");
    Properties english = new Properties();
    try (var in = Files.newBufferedReader(MAIN.resolve("resources/messages/core.properties"))) {
      english.load(in);
    }
    assertThat(english.stringPropertyNames())
        .filteredOn(key -> !key.startsWith("core.missing."))
        .allSatisfy(
            key ->
                assertThat(english.getProperty(key).replace("''", "'").split("\\{\\d}", -1))
                    .as(key)
                    .extracting(piece -> piece.replaceAll("^[^A-Za-z]+|[^A-Za-z]+$", ""))
                    .allMatch(source::contains));
  }

  /** Fixed reasons and causes, and the sentences that are formatted whole. */
  @Test
  void everythingAMeasurementSaysHasItsGerman() throws IOException {
    String source = source("java/turnsheet/core/measure");
    List<String> said = new ArrayList<>();
    collect(
        said,
        source,
        "(?:absent|withoutUncertainty|plus|plusRectangular)\\((?:[^\";]*,)?\\s*\"([a-z][^\"]+)\"");
    collect(said, source, "String [A-Z_]+ = \"([a-z]+ [a-z ]+)\"");
    collect(said, source, "\"([A-Z][^\"]{30,}\\.)\"");
    assertThat(said).hasSizeGreaterThan(50);
    assertThat(said)
        .allSatisfy(
            text -> {
              String example = text.replaceAll("%[-+]?[0-9.]*[a-z]", "12.5");
              assertThat(CoreWords.german(example)).as(text).isPresent();
              assertThat(CoreWords.german(example).orElseThrow()).doesNotContain("{");
            });
  }

  /** A sentence in two languages would be worse than one in English. */
  @Test
  void whateverIsUploadedByMistakeIsNamedInGerman() throws IOException {
    String source =
        Files.readString(MAIN.resolve("java/turnsheet/core/format/ForeignContent.java"));
    List<String> named = new ArrayList<>();
    collect(named, source, "(?:archive|compressed)\\((?:\\d, )?\"[^\"]*\", \"([^\"]+)\"\\)");
    collect(named, source, "new Mark\\(\\d, \"[^\"]*\", \"[^\"]*\", \"([^\"]+)\"");
    collect(named, source, "String [A-Z_]+ =\\s*\"([^\"]+)\"");
    named.remove("Monkey's Audio"); // a name in either language
    assertThat(named).hasSizeGreaterThan(35).contains("a JPEG picture", "CAF audio");
    assertThat(named).allSatisfy(text -> assertThat(CoreWords.german(text)).as(text).isPresent());
  }

  @Test
  void aTextWithoutNumbersIsRefusedInGerman() {
    String rest = " no line of numbers: export the capture as a table, one row per line.";
    assertThat(CoreWords.in(Locale.GERMANY, "The text holds" + rest))
        .startsWith("In dem Text ist keine Zeile mit Zahlen:");
    assertThat(CoreWords.in(Locale.GERMANY, "The first 256 KiB of the text hold" + rest))
        .startsWith("In den ersten 256 KiB des Textes ist keine Zeile mit Zahlen:");
  }

  private static void collect(List<String> said, String source, String pattern) {
    Pattern.compile(pattern).matcher(source).results().map(m -> m.group(1)).forEach(said::add);
  }

  /** All source with the pieces of each text joined and without its comments. */
  private static String source(String below) throws IOException {
    StringBuilder all = new StringBuilder();
    try (Stream<Path> files = Files.walk(MAIN.resolve(below))) {
      files
          .filter(p -> p.toString().endsWith(".java"))
          .forEach(
              p -> {
                try {
                  all.append(Files.readString(p));
                } catch (IOException e) {
                  throw new UncheckedIOException(e);
                }
              });
    }
    return all.toString()
        .replaceAll("(?s)/\\*.*?\\*/|//[^\n]*", "")
        .replaceAll("\"\\s*\\+\\s*\"", "")
        .replace("\\u00b1", "±")
        .replace("\\u00b5", "µ")
        .replace("%%", "%");
  }
}
