package turnsheet.exchange;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.tuple;

import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.springframework.context.annotation.AnnotationConfigApplicationContext;
import org.springframework.jdbc.core.simple.JdbcClient;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.core.measure.Reading;
import turnsheet.document.FigurePaths;
import turnsheet.exchange.Import.ShopSettings;
import turnsheet.exchange.ImportResult.Left;
import turnsheet.exchange.ImportResult.OfKind;
import turnsheet.exchange.ImportResult.Reason;
import turnsheet.reading.SampleBench;
import turnsheet.reading.SampleReadings;
import turnsheet.report.Reports;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class ExchangeTest {

  private final Database database;
  private final JdbcClient jdbc;
  private final AnnotationConfigApplicationContext service;
  private final Export export;
  private final Import importer;
  private final SampleBench bench;
  private final String everything;

  ExchangeTest(Database database) throws IOException {
    this.database = database;
    this.jdbc = database.jdbc();
    database.empty();
    this.service = SampleBooks.service(database);
    this.export = service.getBean(Export.class);
    this.importer = service.getBean(Import.class);
    this.bench = SampleBooks.fill(database);
    this.everything = json(Scope.everything());
  }

  @AfterEach
  void close() {
    service.close();
  }

  @Test
  void whatGoesOutComesBackToTheByte() throws IOException {
    database.empty();
    ImportResult result = take(everything);

    assertThat(result.complete()).isTrue();
    assertThat(result.kinds()).allMatch(k -> k.added() > 0).allMatch(k -> k.same() == 0);
    assertThat(json(Scope.everything())).isEqualTo(everything);
    // what follows from the documents is there as well
    Reading reading = SampleReadings.tone(0.39, 2);
    assertThat(
            jdbc.sql(
                    """
                    select f.amount from reading_figure f join reading r on r.id = f.reading_id
                    where r.channel = 2 and r.method_version = ? and f.figure = ?
                    """)
                .params(reading.method().version(), FigureName.DEVIATION.path())
                .query(Double.class)
                .list())
        .containsExactly(0.39);
    Reports reports = service.getBean(Reports.class);
    assertThat(reports.find(1).orElseThrow().replacedBy()).isEqualTo(2);
    assertThat(reports.pdf(2, report -> new byte[] {1})).hasValue(new byte[] {1});
  }

  @Test
  void kindsOfPartsTravel() throws IOException {
    jdbc.sql("update rotating_part set kind = 'GEAR', basis = 'TURNS_PER_TURN', details = ?")
        .param("{\"count\":24}")
        .update();
    String with = json(Scope.everything());
    assertThat(with).contains("GEAR", "\"count\"");
    database.empty();
    assertThat(take(with).complete()).isTrue();
    assertThat(json(Scope.everything())).isEqualTo(with);
    database.empty();
    // a gear with no teeth breaks a rule of the shop
    org.assertj.core.api.Assertions.assertThatThrownBy(
            () -> take(with.replaceAll("\"count\": ?24", "\"count\":-1")))
        .isInstanceOf(RefusedFileException.class);
  }

  @Test
  void takenInTwiceNothingIsAdded() throws IOException {
    ImportResult result = take(everything);

    assertThat(result.added()).isZero();
    assertThat(result.complete()).isTrue();
    assertThat(result.kinds()).allMatch(k -> k.same() > 0);
    assertThat(json(Scope.everything())).isEqualTo(everything);
  }

  @Test
  void visitsOneAfterTheOtherMakeUpTheUnit() throws IOException {
    String unit = json(Scope.unit(bench.unit.id().value()));
    String visit = json(Scope.visit(bench.visit.id().value()));
    database.empty();

    assertThat(take(visit).complete()).isTrue();
    ImportResult rest = take(everything);

    assertThat(rest.complete()).isTrue();
    assertThat(kind(rest, "units").same()).isEqualTo(1);
    assertThat(kind(rest, "units").added()).isEqualTo(1);
    assertThat(json(Scope.everything())).isEqualTo(everything);
    assertThat(json(Scope.unit(bench.unit.id().value()))).isEqualTo(unit);
  }

  @Test
  void aDifferentReadingIsReportedAndLeftAlone() throws IOException {
    String changed =
        everything.replaceFirst(
            "\"deviationPercent\":\\{\"value\":0.37,", "\"deviationPercent\":{\"value\":0.36,");
    assertThat(changed).isNotEqualTo(everything);

    ImportResult result = take(changed);

    assertThat(result.added()).isZero();
    assertThat(kind(result, "readings").different())
        .singleElement()
        .satisfies(l -> assertThat(l.reason()).isEqualTo(Reason.OTHER_CONTENT))
        .satisfies(l -> assertThat(l.members()).containsExactly("document"))
        .satisfies(l -> assertThat(changed.lines().toList().get(l.line() - 1)).contains(l.id()));
    assertThat(json(Scope.everything())).isEqualTo(everything);
  }

  @Test
  void aNumberThatAnotherReportHasIsADifference() throws IOException {
    jdbc.sql("delete from report where number = 2").update();
    jdbc.sql("update report set content = ?, check_code = 'another' where number = 1")
        .param("{}".getBytes(StandardCharsets.UTF_8))
        .update();
    ImportResult result = take(everything);

    assertThat(kind(result, "reports").different())
        .extracting(Left::label, Left::reason)
        .containsExactly(tuple("1", Reason.OTHER_CONTENT));
    assertThat(kind(result, "reports").heldBack())
        .as("revises a report that is another one here")
        .extracting(Left::label, Left::members)
        .containsExactly(tuple("2", List.of("revises")));
  }

  @Test
  void whatBelongsToATakenNameIsHeldBack() throws IOException {
    database.empty();
    jdbc.sql("insert into machine_model values (?, ?, null, '')")
        .params(java.util.UUID.randomUUID(), bench.model.name())
        .update();

    ImportResult result = take(everything);

    assertThat(kind(result, "models").different())
        .extracting(Left::reason, Left::members)
        .containsExactly(tuple(Reason.TAKEN_PLACE, List.of("name")));
    assertThat(kind(result, "instruments").added()).isEqualTo(1);
    for (String kind : List.of("units", "visits", "captures", "readings", "reports")) {
      assertThat(kind(result, kind).added()).as(kind).isZero();
      assertThat(kind(result, kind).heldBack()).as(kind).hasSizeGreaterThan(1);
    }
  }

  @Test
  void aSecondOpenVisitIsNotOpened() throws IOException {
    jdbc.sql("update visit set closed_at = opened_at where closed_at is null").update();
    bench.pastVisit(bench.unit, java.time.Instant.EPOCH);
    jdbc.sql("update visit set closed_at = null where opened_at = ?")
        .param(java.time.Instant.EPOCH.atOffset(java.time.ZoneOffset.UTC))
        .update();
    jdbc.sql("delete from reading_figure").update();
    jdbc.sql("delete from reading_series").update();
    jdbc.sql("delete from reading").update();
    jdbc.sql("delete from refused_channel").update();
    jdbc.sql("delete from left_out_capture").update();
    jdbc.sql("delete from capture").update();
    jdbc.sql("delete from visit where id = ?").param(bench.visit.id().value()).update();

    ImportResult result = take(everything);

    assertThat(kind(result, "visits").different())
        .extracting(Left::id, Left::reason)
        .containsExactly(tuple(bench.visit.id().toString(), Reason.OPEN_VISIT));
    assertThat(kind(result, "captures").heldBack()).hasSize(2);
    assertThat(kind(result, "captures").added()).isEqualTo(1);
  }

  @Test
  void theOrderToMeasureDoesNotTravel() throws IOException {
    jdbc.sql("update capture set state = 'queued' where bench_condition = 'as received'").update();
    String queued = json(Scope.everything());
    assertThat(queued).doesNotContain("\"queued\"").contains("\"recognised\"");
    assertThat(take(queued).complete()).isTrue();
    database.empty();
    take(queued);
    assertThat(json(Scope.everything())).isEqualTo(queued);
  }

  @Test
  void theTableReadsBackWithEveryFigure() throws IOException {
    StringWriter out = new StringWriter();
    export.writeCsv(Scope.unit(bench.unit.id().value()), out);
    List<NamedCsvRecord> rows;
    try (CsvReader<NamedCsvRecord> csv = CsvReader.builder().ofNamedCsvRecord(out.toString())) {
      rows = csv.stream().toList();
    }

    Reading first = SampleReadings.tone(0.37);
    int each = FigurePaths.of(first).size();
    assertThat(rows).hasSize(2 * each);
    assertThat(rows.get(0).getHeader()).isEqualTo(FigureRows.HEADS);
    assertThat(rows).allMatch(r -> r.getFieldCount() == FigureRows.HEADS.size());
    int at = 0;
    for (var figure : FigurePaths.of(first).entrySet()) {
      NamedCsvRecord row = rows.get(at++);
      Figure stated = figure.getValue();
      assertThat(row.getField("figure")).isEqualTo(figure.getKey());
      assertThat(row.getField("value")).isEqualTo(text(stated.value()));
      assertThat(row.getField("expandedUncertainty")).isEqualTo(text(stated.expandedUncertainty()));
      assertThat(row.getField("k")).isEqualTo(text(stated.k()));
      assertThat(row.getField("why")).isEqualTo(stated.why() == null ? "" : stated.why());
      assertThat(row.getField("serialNumber")).isEqualTo("0042");
      assertThat(row.getField("visitClosedAt")).isEmpty();
      assertThat(row.getField("channel")).isEqualTo("1");
    }
    assertThat(out.toString()).contains("\r\n");
  }

  @Test
  void textsSurviveTheTable() throws IOException {
    StringWriter out = new StringWriter();
    export.writeCsv(Scope.everything(), out);
    try (CsvReader<NamedCsvRecord> csv = CsvReader.builder().ofNamedCsvRecord(out.toString())) {
      assertThat(csv.stream().map(r -> r.getField("serialNumber")))
          .contains("0043 " + SampleBooks.ODD);
    }
  }

  private ImportResult take(String file) throws IOException {
    return importer.take(
        new ByteArrayInputStream(file.getBytes(StandardCharsets.UTF_8)), ShopSettings.KEEP);
  }

  private String json(Scope scope) throws IOException {
    StringWriter out = new StringWriter();
    export.writeJson(scope, out);
    return out.toString();
  }

  private static OfKind kind(ImportResult result, String name) {
    return result.kinds().stream().filter(k -> k.kind().equals(name)).findFirst().orElseThrow();
  }

  private static String text(@org.jspecify.annotations.Nullable Double value) {
    return value == null ? "" : value.toString();
  }
}
