package turnsheet.exchange;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.tuple;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.springframework.context.annotation.AnnotationConfigApplicationContext;
import org.springframework.jdbc.core.simple.JdbcClient;
import turnsheet.access.ShopPreferences;
import turnsheet.access.ShopProfiles;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.StoredBytes;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.exchange.Import.ShopSettings;
import turnsheet.exchange.ImportResult.Left;
import turnsheet.exchange.ImportResult.OfKind;
import turnsheet.exchange.ImportResult.Reason;
import turnsheet.shop.ShopRules;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

/** What a shop has set for itself, and pictures, on their way to another shop. */
@OnEachDatabase
class ShopSettingsTest {

  private final Database database;
  private final JdbcClient jdbc;
  private final CaptureStore otherStore = ExportOn.store();
  private final AnnotationConfigApplicationContext service;
  private final AnnotationConfigApplicationContext other;
  private final String everything;

  ShopSettingsTest(Database database) throws IOException {
    this.database = database;
    this.jdbc = database.jdbc();
    database.empty();
    this.service = SampleBooks.service(database);
    this.other = SampleBooks.service(database, otherStore);
    SampleBooks.fill(database);
    this.everything = json(Scope.everything());
  }

  @AfterEach
  void close() {
    service.close();
    other.close();
  }

  @Test
  void whatTheReceivingShopHasSetOtherwiseStaysAndIsNamed() throws IOException {
    anotherShop();
    ImportResult result = take(everything, ShopSettings.KEEP);

    assertThat(result.complete()).isFalse();
    assertThat(kind(result, "shop").different())
        .extracting(Left::reason, Left::members)
        .containsExactly(
            tuple(
                Reason.OTHER_CONTENT,
                List.of("name", "address", "speedUnit", "mainsHz", "paper", "language")));
    assertThat(kind(result, "shopRules").different())
        .extracting(Left::members)
        .containsExactly(List.of("decisionRule"));
    // it had no mark, so nothing of its own was replaced
    assertThat(kind(result, "shopLogo").added()).isEqualTo(1);
    assertThat(kind(result, "units").added()).isEqualTo(2);
    assertThat(profile().name()).isEqualTo("Another shop");
    assertThat(rules().rule()).isEqualTo(DecisionRule.SIMPLE);
    assertThat(audited()).doesNotContain("exchange.audit.shop");
  }

  @Test
  void whoeverSaysSoTakesThemOver() throws IOException {
    anotherShop();
    ImportResult result = take(everything, ShopSettings.TAKE_OVER);

    assertThat(result.complete()).isTrue();
    assertThat(profile().name()).isEqualTo("Shop " + SampleBooks.ODD);
    assertThat(rules().rule()).isEqualTo(DecisionRule.GUARDED);
    assertThat(new ShopPreferences(jdbc).get().mainsHz()).isEqualTo(60);
    assertThat(json(Scope.everything())).isEqualTo(everything);
    assertThat(audited()).contains("exchange.audit.shop");
  }

  @Test
  void photographsComeWithTheirBytes() throws IOException {
    String unit = json(Scope.unit(photographed()));
    assertThat(unit).contains("\"jpeg\":\"/9j/").contains("\"shop\": [\n]");
    database.empty();
    take(unit, ShopSettings.KEEP);

    StoredBytes bytes =
        jdbc.sql("select sha256, byte_length from plate_photo")
            .query((row, n) -> new StoredBytes(row.getString(1), row.getLong(2)))
            .single();
    try (InputStream in = otherStore.open(bytes).open()) {
      assertThat(in.readAllBytes()).isEqualTo(SampleBooks.picture("jpeg"));
    }
  }

  @Test
  void aPhotographWhoseFileIsGoneGetsItBackFromADocument() throws IOException {
    // the other service looks at the same books, and its store is empty
    StringWriter without = new StringWriter();
    other.getBean(Export.class).writeJson(Scope.everything(), without);
    assertThat(without.toString()).contains("\"photos\": [\n]");
    assertThat(kind(take(everything, ShopSettings.KEEP), "photos").same()).isEqualTo(1);

    StringWriter again = new StringWriter();
    other.getBean(Export.class).writeJson(Scope.everything(), again);
    assertThat(again.toString()).isEqualTo(everything);
  }

  /** The file was written by version 1 of the export and is never made anew. */
  @Test
  void aDocumentOfTheFirstVersionIsStillTakenIn() throws IOException {
    String old;
    try (InputStream in =
        java.util.Objects.requireNonNull(
            ShopSettingsTest.class.getResourceAsStream("/exchange/version-1.json"))) {
      old = new String(in.readAllBytes(), StandardCharsets.UTF_8);
    }
    anotherShop();
    ImportResult result = take(old, ShopSettings.TAKE_OVER);

    assertThat(result.complete()).isTrue();
    assertThat(kind(result, "readings").added()).isEqualTo(3);
    assertThat(kind(result, "reports").added()).isEqualTo(2);
    assertThat(profile().name()).isEqualTo("Another shop");
    // what the old file has, the new one has in the same words; its parts are of no kind
    assertThat(
            json(Scope.everything())
                .replace(",\"kind\":null,\"details\":null", "")
                .lines()
                .toList())
        .containsAll(old.lines().filter(line -> line.startsWith("{\"")).toList());
  }

  /** A shop with a letterhead, a rule and preferences of its own and nothing else. */
  private void anotherShop() {
    database.empty();
    jdbc.sql("insert into shop_rules values (1, 'SIMPLE', 10, 0.02)").update();
    jdbc.sql("insert into shop_profile (id, name, address) values (1, 'Another shop', '')")
        .update();
  }

  private java.util.UUID photographed() {
    return jdbc.sql("select unit_id from visit join plate_photo on visit_id = id")
        .query(java.util.UUID.class)
        .single();
  }

  private ShopProfiles.ShopProfile profile() {
    return other.getBean(ShopProfiles.class).get().orElseThrow();
  }

  private ShopRules.Rules rules() {
    return new ShopRules(jdbc, database.transactions()).get();
  }

  private List<String> audited() {
    return jdbc.sql("select action from audit_entry").query(String.class).list();
  }

  private ImportResult take(String file, ShopSettings settings) throws IOException {
    return other
        .getBean(Import.class)
        .take(new ByteArrayInputStream(file.getBytes(StandardCharsets.UTF_8)), settings);
  }

  private String json(Scope scope) throws IOException {
    StringWriter out = new StringWriter();
    service.getBean(Export.class).writeJson(scope, out);
    return out.toString();
  }

  private static OfKind kind(ImportResult result, String name) {
    return result.kinds().stream().filter(k -> k.kind().equals(name)).findFirst().orElseThrow();
  }
}
