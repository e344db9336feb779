package turnsheet.shop;

import static java.util.Objects.requireNonNull;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Clock;
import java.time.Duration;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class UnitsTest {

  private final Database database;
  private final ShopFixture shop;
  private final Units units;

  UnitsTest(Database database) {
    this.database = database;
    shop = new ShopFixture(database);
    units = shop.units;
  }

  @Test
  void readsBackWhatWasAdded() {
    Unit added = shop.unit("1001");
    assertThat(units.find(added.id())).contains(added);
    assertThat(units.find(UnitId.next())).isEmpty();
  }

  @Test
  void isFoundByItsCodeWhichStaysThroughAChange() {
    Unit unit = shop.unit("1001");
    units.change(unit.id(), unit.modelId(), unit.customerId(), "1002", "");
    assertThat(units.coded(unit.code())).map(Unit::serialNumber).contains("1002");
    assertThat(units.coded(UnitCode.next())).isEmpty();
  }

  @Test
  void refusesASerialNumberThatTheModelHas() {
    Unit first = shop.unit("A-1001");
    assertThatThrownBy(() -> units.add(first.modelId(), first.customerId(), "a-1001", ""))
        .isInstanceOf(RefusedChangeException.class)
        .hasMessageContaining("serialTaken");
    MachineModel other = shop.models.add(ShopFixture.transport("Another model"));
    units.add(other.id(), first.customerId(), "A-1001", "");
    assertThat(units.page(PageQuery.first(10)).total()).isEqualTo(2);
  }

  @Test
  void refusesToTakeTheSerialNumberOfAnother() {
    Unit first = shop.unit("1001");
    Unit second = units.add(first.modelId(), first.customerId(), "1002", "");
    assertThatThrownBy(
            () -> units.change(second.id(), first.modelId(), first.customerId(), "1001", ""))
        .isInstanceOf(RefusedChangeException.class);
    assertThat(units.find(second.id())).contains(second);
  }

  @Test
  void keepsItsOwnSerialNumberThroughAChange() {
    Unit unit = shop.unit("1001");
    units.change(unit.id(), unit.modelId(), unit.customerId(), "1001", "new heads");
    assertThat(units.find(unit.id())).map(Unit::note).contains("new heads");
  }

  @Test
  void searchesSerialModelAndCustomerTogether() {
    shop.unit("1001");
    shop.unit("2002");
    assertThat(found("transport 1001")).containsExactly("1001");
    assertThat(found("owner 2002")).containsExactly("2002");
    assertThat(found("of")).hasSize(2);
    assertThat(found("1001 2002")).isEmpty();
  }

  @Test
  void showsTheUnitLastSeenFirst() {
    Unit first = shop.unit("1001");
    shop.unit("1002");
    Clock later = Clock.offset(shop.clock, Duration.ofDays(1));
    ShopFixture.visitsAt(database, later).open(first.id(), "runs slow");
    PageOf<UnitSummary> page = units.page(PageQuery.first(10));
    assertThat(ShopFixture.serials(page)).containsExactly("1001", "1002");
    UnitSummary seen = page.items().get(0);
    assertThat(seen.onBench()).isTrue();
    assertThat(seen.visits()).isEqualTo(1);
    assertThat(seen.lastOpenedAt()).isEqualTo(later.instant());
    assertThat(seen.modelName()).isEqualTo("Transport for 1001");
    assertThat(units.summary(first.id())).contains(seen);
    assertThat(page.items().get(1).lastOpenedAt()).isNull();
  }

  @Test
  void listsTheUnitsOfACustomerAndOfAModel() {
    Unit first = shop.unit("1001");
    shop.unit("1002");
    PageQuery query = PageQuery.first(10);
    assertThat(ShopFixture.serials(units.ofCustomer(first.customerId(), query)))
        .containsExactly("1001");
    assertThat(ShopFixture.serials(units.ofModel(first.modelId(), query))).containsExactly("1001");
  }

  @Test
  void refusesAnotherModelOnceThereAreCaptures() {
    Unit unit = shop.unit("1001");
    MachineModel other = shop.models.add(ShopFixture.transport("Another model"));
    Captures.insertOne(database, shop, unit);
    assertThatThrownBy(() -> units.change(unit.id(), other.id(), unit.customerId(), "1001", ""))
        .isInstanceOf(RefusedChangeException.class)
        .hasMessageContaining("modelHasCaptures");
  }

  @Test
  void aChangeOfModelWaitsForARecordingThatIsComingIn() throws Exception {
    Unit unit = shop.unit("1001");
    MachineModel other = shop.models.add(ShopFixture.transport("Another model"));
    Visit visit = shop.visits.open(unit.id(), "");
    ExecutorService colleague = Executors.newSingleThreadExecutor();
    try {
      Future<?> change =
          requireNonNull(
              database
                  .transactions()
                  .execute(
                      status -> {
                        shop.visits.lock(visit.id());
                        Future<?> started =
                            colleague.submit(
                                () ->
                                    units.change(
                                        unit.id(), other.id(), unit.customerId(), "1001", ""));
                        // it would be through long before, if it did not wait
                        assertThatThrownBy(() -> started.get(300, TimeUnit.MILLISECONDS))
                            .isInstanceOf(TimeoutException.class);
                        Captures.insertOne(database, shop, unit, visit);
                        return started;
                      }));
      assertThatThrownBy(() -> change.get(20, TimeUnit.SECONDS))
          .hasRootCauseInstanceOf(RefusedChangeException.class)
          .hasMessageContaining("modelHasCaptures");
    } finally {
      colleague.shutdown();
    }
    assertThat(units.find(unit.id())).contains(unit);
  }

  @Test
  void findsAPageAmongAThousandUnits() {
    Unit first = shop.unit("0000");
    StringBuilder rows = new StringBuilder();
    var codes = Stream.generate(UnitCode::next).distinct().iterator();
    for (int i = 1; i < 1000; i++) {
      rows.append(i == 1 ? "" : ", ")
          .append(
              "('%s', '%s', '%s', '%s', '%04d', '', timestamp with time zone '2026-01-01 12:00:00Z')"
                  .formatted(UnitId.next(), codes.next(), first.modelId(), first.customerId(), i));
    }
    database
        .jdbc()
        .sql(
            "insert into unit (id, code, model_id, customer_id, serial_number, note, created_at)"
                + " values "
                + rows)
        .update();
    PageOf<UnitSummary> page = units.page(new PageQuery("", 20, 50));
    assertThat(page.items()).hasSize(50);
    assertThat(page.total()).isEqualTo(1000);
    assertThat(found("0999")).containsExactly("0999");
  }

  private java.util.List<String> found(String words) {
    return ShopFixture.serials(units.page(new PageQuery(words, 1, 10)));
  }
}
