package turnsheet.exchange;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.springframework.context.annotation.AnnotationConfigApplicationContext;
import org.springframework.jdbc.core.simple.JdbcClient;
import turnsheet.exchange.Import.ShopSettings;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

/** Files that are not what an export writes: refused with a place, and nothing is left of them. */
@OnEachDatabase
class RefusedFilesTest {

  private static final List<String> TABLES = Kinds.ALL.stream().map(Kind::table).toList();

  private final Database database;
  private final JdbcClient jdbc;
  private final AnnotationConfigApplicationContext service;
  private final Import importer;
  private final String everything;

  RefusedFilesTest(Database database) throws IOException {
    this.database = database;
    this.jdbc = database.jdbc();
    database.empty();
    this.service = SampleBooks.service(database);
    this.importer = service.getBean(Import.class);
    SampleBooks.fill(database);
    StringWriter out = new StringWriter();
    service.getBean(Export.class).writeJson(Scope.everything(), out);
    this.everything = out.toString();
  }

  @AfterEach
  void close() {
    service.close();
  }

  @Test
  void aReportThatWasChangedDoesNotFitItsCheckCode() {
    String changed = everything.replace("misprint", "misread");
    refused(changed, "brokenExport", "its check code is not that of the content");
    refused(
        everything.replaceFirst("\\{\"number\":1,", "{\"number\":3,"),
        "brokenExport",
        "its number is not that of the content");
  }

  @Test
  void aFileCutOffAnywhereIsRefusedAndLeavesNothing() throws IOException {
    database.empty();
    byte[] whole = everything.getBytes(StandardCharsets.UTF_8);
    Random random = new Random(7);
    for (int i = 0; i < 120; i++) {
      // the last two bytes are the brace and a line feed that nobody needs
      int length = i == 0 ? whole.length - 2 : i == 1 ? 0 : random.nextInt(whole.length - 2);
      byte[] cut = java.util.Arrays.copyOf(whole, length);
      assertThatThrownBy(() -> importer.take(new ByteArrayInputStream(cut), ShopSettings.KEEP))
          .as("cut at " + length)
          .isInstanceOfSatisfying(
              RefusedFileException.class,
              e ->
                  assertThat(e.getMessage())
                      .containsPattern("Line \\d+, column \\d+|no export")
                      .endsWith("Nothing of the file was taken in."));
      assertEmpty();
    }
  }

  @Test
  void aFileThatWasTamperedWithIsTakenOrRefusedButNeverHalf() throws IOException {
    database.empty();
    byte[] whole = everything.getBytes(StandardCharsets.UTF_8);
    Random random = new Random(11);
    int refused = 0;
    for (int i = 0; i < 120; i++) {
      byte[] changed = whole.clone();
      int at = random.nextInt(changed.length);
      changed[at] = i % 3 == 0 ? (byte) random.nextInt(256) : (byte) "\"{}[],:0-x".charAt(i % 10);
      try {
        importer.take(new ByteArrayInputStream(changed), ShopSettings.KEEP);
        database.empty();
      } catch (RefusedFileException e) {
        refused++;
        assertEmpty();
      }
    }
    assertThat(refused).isGreaterThan(40);
  }

  @Test
  void foreignNewerAndBrokenFilesAreToldApart() {
    refused("", "foreignFile", "no export");
    refused("[1, 2]", "foreignFile", "\"format\"");
    refused("RIFF....WAVE", "foreignFile", "no export");
    refused("{\"format\": \"other\"}", "foreignFile", "no export");
    refused(everything.replace("\"version\": 2", "\"version\": 3"), "newerExport", "version 3");
    refused(everything + "x", "brokenExport", "Line ");
    refused(
        everything.replaceFirst("\"note\":", "\"notes\":"), "brokenExport", "'note' is missing");
    refused(
        everything.replaceFirst("\"note\":", "\"extra\":1,\"note\":"), "brokenExport", "'extra'");
    refused(everything.replaceFirst("\"media\"", "\"medias\""), "brokenExport", "\"media\"");
    refused(
        everything.replaceFirst("\"speedUnit\":\"CM_PER_S\"", "\"speedUnit\":\"FURLONGS\""),
        "brokenExport",
        "this entry of models is wrong");
    refused(
        everything.replaceFirst("\"name\":\"Test tape\"", "\"name\":\"" + "x".repeat(300) + "\""),
        "brokenExport",
        "this entry of media is wrong");
    refused(
        everything.replace("\"decisionRule\":\"GUARDED\"", "\"decisionRule\":\"GUESSED\""),
        "brokenExport",
        "this entry of shopRules is wrong");
    refused(
        everything.replace("\"image/png\"", "\"image/svg+xml\""), "brokenExport", "it is no PNG");
    refused(everything.replace("\"widthPx\":8", "\"widthPx\":9"), "brokenExport", "another size");
    refused(
        everything.replaceFirst("\"jpeg\":\"/9j/", "\"jpeg\":\"/9k/"),
        "brokenExport",
        "not the one of its SHA-256");
    refused(everything.replace("A. Customer", "A\\u0000B"), "brokenExport", "'name' is not a text");
  }

  @Test
  void aBrokenStreamIsNotABrokenFile() {
    database.empty();
    byte[] start =
        everything.substring(0, everything.length() / 2).getBytes(StandardCharsets.UTF_8);
    InputStream breaking =
        new java.io.SequenceInputStream(
            new ByteArrayInputStream(start),
            new InputStream() {
              @Override
              public int read() throws IOException {
                throw new IOException("gone");
              }

              @Override
              public int read(byte[] into, int from, int length) throws IOException {
                return read();
              }
            });
    assertThatThrownBy(() -> importer.take(breaking, ShopSettings.KEEP))
        .isInstanceOf(IOException.class);
    assertEmpty();
  }

  private void refused(String file, String code, String words) {
    database.empty();
    assertThatThrownBy(
            () ->
                importer.take(
                    new ByteArrayInputStream(file.getBytes(StandardCharsets.UTF_8)),
                    ShopSettings.KEEP))
        .isInstanceOfSatisfying(
            RefusedFileException.class, e -> assertThat(e.code()).isEqualTo(code))
        .hasMessageContaining(words);
    assertEmpty();
  }

  private void assertEmpty() {
    for (String table : TABLES) {
      assertThat(jdbc.sql("select count(*) from " + table).query(Long.class).single())
          .as(table)
          .isZero();
    }
  }
}
