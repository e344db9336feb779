package turnsheet.shop;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Clock;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.Test;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class VisitsTest {

  private final Database database;
  private final ShopFixture shop;
  private final Visits visits;

  VisitsTest(Database database) {
    this.database = database;
    shop = new ShopFixture(database);
    visits = shop.visits;
  }

  @Test
  void opensRecordsAndCloses() {
    Unit unit = shop.unit("1001");
    Visit opened = visits.open(unit.id(), "runs slow");
    assertThat(visits.find(opened.id())).contains(opened);
    visits.recordWork(opened.id(), "runs slow when warm", "belt renewed");
    Visit closed = visits.close(opened.id()).orElseThrow();
    assertThat(closed.closedAt()).isEqualTo(ShopFixture.NOW);
    assertThat(visits.find(opened.id()))
        .contains(
            new Visit(
                opened.id(),
                unit.id(),
                ShopFixture.NOW,
                ShopFixture.NOW,
                "runs slow when warm",
                "belt renewed"));
  }

  @Test
  void rewritesAClosedVisitOnlyAfterReopening() {
    Visit visit = visits.open(shop.unit("1001").id(), "");
    visits.close(visit.id());
    assertRefused("visitClosed", () -> visits.recordWork(visit.id(), "", "more"));
    assertRefused("visitClosed", () -> visits.close(visit.id()));
    visits.reopen(visit.id());
    assertRefused("visitOpen", () -> visits.reopen(visit.id()));
    assertThat(visits.recordWork(visit.id(), "", "more")).map(Visit::workDone).contains("more");
  }

  @Test
  void keepsPartsAndTheSensorWithTheVisit() {
    Unit unit = shop.unit("1001");
    Visit visit = visits.open(unit.id(), "hums");
    VisitNotes notes =
        new VisitNotes(
            "hums",
            "",
            List.of(new FittedPart("drive belt 40 mm", 2), new FittedPart("grease", null)),
            true,
            "Hall sensor instead of the coil");
    assertThat(visits.record(visit.id(), notes)).map(Visit::notes).contains(notes);
    assertThat(visits.find(visit.id())).map(Visit::notes).contains(notes);
    assertThat(visits.ofUnit(unit.id())).extracting(Visit::notes).containsExactly(notes);
    assertThat(visits.open(PageQuery.first(10)).items())
        .extracting(s -> s.visit().notes())
        .containsExactly(notes);
    assertThat(visits.recordWork(visit.id(), "hums", "cleaned"))
        .map(v -> v.notes().parts())
        .contains(notes.parts());
    visits.record(visit.id(), VisitNotes.complaint("hums"));
    assertThat(visits.find(visit.id()).orElseThrow().notes().parts()).isEmpty();
  }

  @Test
  void aVisitOpenedByMistakeCanBeRemovedUntilItHasACapture() {
    Unit unit = shop.unit("1001");
    Visit visit = visits.open(unit.id(), "");
    visits.record(
        visit.id(), new VisitNotes("", "", List.of(new FittedPart("belt", 1)), false, ""));
    assertThat(visits.remove(visit.id())).isTrue();
    assertThat(visits.find(visit.id())).isEmpty();
    assertThat(visits.remove(visit.id())).isFalse();

    Captures.insertOne(database, shop, unit);
    Visit used = visits.openOf(unit.id()).orElseThrow();
    assertRefused("visitHasCaptures", () -> visits.remove(used.id()));
  }

  @Test
  void aVisitThatALinkOpensStays() {
    Visit visit = visits.open(shop.unit("1001").id(), "");
    database
        .jdbc()
        .sql(
            """
            insert into share_link (id, token_sha256, visit_id, created_at, created_by, expires_at,
              views)
            values (?, ?, ?, ?, 'bench', ?, 0)
            """)
        .params(
            java.util.UUID.randomUUID(),
            "0".repeat(64),
            visit.id().value(),
            Columns.time(ShopFixture.NOW),
            Columns.time(ShopFixture.NOW))
        .update();
    assertRefused("visitInUse", () -> visits.remove(visit.id()));
    assertThat(visits.find(visit.id())).isPresent();
  }

  @Test
  void keepsAUnitOnTheBenchOnce() {
    Unit unit = shop.unit("1001");
    Visit first = visits.open(unit.id(), "");
    assertRefused("visitStillOpen", () -> visits.open(unit.id(), ""));
    visits.close(first.id());
    visits.open(unit.id(), "");
    assertRefused("visitStillOpen", () -> visits.reopen(first.id()));
  }

  @Test
  void opensOneVisitWhenTwoPeopleOpenAtOnce() throws Exception {
    Unit unit = shop.unit("1001");
    Callable<Boolean> opening =
        () -> {
          try {
            visits.open(unit.id(), "");
            return true;
          } catch (RefusedChangeException e) {
            return false;
          }
        };
    ExecutorService people = Executors.newFixedThreadPool(2);
    try {
      Future<Boolean> one = people.submit(opening);
      Future<Boolean> other = people.submit(opening);
      assertThat(one.get() ^ other.get()).isTrue();
    } finally {
      people.shutdownNow();
    }
    assertThat(visits.ofUnit(unit.id())).hasSize(1);
  }

  @Test
  void listsTheVisitsOfAUnitNewestFirst() {
    Unit unit = shop.unit("1001");
    Visit first = visits.open(unit.id(), "");
    visits.close(first.id());
    Clock later = Clock.offset(shop.clock, Duration.ofDays(400));
    Visit second = ShopFixture.visitsAt(database, later).open(unit.id(), "");
    assertThat(visits.ofUnit(unit.id()))
        .extracting(Visit::id)
        .containsExactly(second.id(), first.id());
  }

  @Test
  void listsWhatIsOnTheBench() {
    Unit here = shop.unit("1001");
    Visit open = visits.open(here.id(), "hums");
    Visit gone = visits.open(shop.unit("1002").id(), "");
    visits.close(gone.id());
    assertThat(visits.open(PageQuery.first(10)).items())
        .containsExactly(
            new VisitSummary(
                open,
                "1001",
                here.modelId(),
                "Transport for 1001",
                here.customerId(),
                "Owner of 1001",
                null,
                null));
    assertThat(visits.openSince(open.openedAt(), PageQuery.first(9)).total()).isEqualTo(2);
    assertThat(visits.openSince(Instant.parse("2100-01-01T00:00:00Z"), PageQuery.first(9)).items())
        .extracting(VisitSummary::serialNumber)
        .containsExactly("1001");
    assertThat(visits.page(PageQuery.first(10)).total()).isEqualTo(2);
    assertThat(visits.summary(gone.id())).map(VisitSummary::serialNumber).contains("1002");
  }

  @Test
  void knowsNothingOfAnUnknownVisit() {
    assertThat(visits.find(VisitId.next())).isEmpty();
    assertThat(visits.summary(VisitId.next())).isEmpty();
    assertThat(visits.close(VisitId.next())).isEmpty();
  }

  private static void assertRefused(
      String code, org.assertj.core.api.ThrowableAssert.ThrowingCallable call) {
    assertThatThrownBy(call)
        .isInstanceOfSatisfying(
            RefusedChangeException.class, e -> assertThat(e.code()).isEqualTo(code));
  }
}
