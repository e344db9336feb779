package turnsheet.web;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Properties;
import java.util.regex.Pattern;

/**
 * English that was left on a German page: every text of the English message files that is long
 * enough not to be part of a name and is said differently in German. What a page marks as English
 * is left out.
 */
public final class EnglishLeft {

  private static final Path MESSAGES = Path.of("src", "main", "resources", "messages");

  /** Shorter texts are words that both languages have, or parts of words. */
  private static final int LENGTH = 12;

  /** What says that it is English, an article as a whole; and what nobody sees. */
  private static final Pattern MEANT =
      Pattern.compile(
          "(?s)<article[^>]*\\slang=\"en\".*?</article>"
              + "|<(\\w+)[^>]*\\slang=\"en\"[^>]*>[^<]*</\\1>"
              + "|<input type=\"hidden\"[^>]*>");

  private static final Pattern GERMAN_ROOT = Pattern.compile("<html[^>]*\\slang=\"de\"");

  private static final List<String> TEXTS = texts();

  private EnglishLeft() {}

  /** Texts of the English files that stand in this page; and what else shows a forgotten text. */
  public static List<String> in(String page) {
    List<String> found = new ArrayList<>();
    if (!GERMAN_ROOT.matcher(page).find()) {
      found.add("the page does not say that it is German");
    }
    if (page.contains("??")) {
      found.add("a text without message");
    }
    String shown = MEANT.matcher(page).replaceAll("").replace("&#39;", "'");
    TEXTS.stream().filter(shown::contains).forEach(found::add);
    return found;
  }

  private static List<String> texts() {
    List<String> texts = new ArrayList<>();
    try (DirectoryStream<Path> files = Files.newDirectoryStream(MESSAGES, "*_de.properties")) {
      for (Path german : files) {
        String name = german.getFileName().toString();
        Properties said = read(german);
        Properties english = read(MESSAGES.resolve(name.replace("_de", "")));
        for (String key : english.stringPropertyNames()) {
          String text = english.getProperty(key);
          if (text.length() >= LENGTH
              && text.contains(" ")
              && !text.contains("{")
              && !text.equals(said.getProperty(key))) {
            texts.add(text);
          }
        }
      }
      return texts;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static Properties read(Path file) throws IOException {
    Properties texts = new Properties();
    try (var in = Files.newBufferedReader(file)) {
      texts.load(in);
    }
    return texts;
  }
}
