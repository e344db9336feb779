package turnsheet.shop;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class CustomersTest {

  private final ShopFixture shop;
  private final Customers customers;

  CustomersTest(Database database) {
    shop = new ShopFixture(database);
    customers = shop.customers;
  }

  @Test
  void readsBackWhatWasAdded() {
    Customer added = customers.add("Harbour Radio", "Quay 4\nSomewhere");
    assertThat(customers.find(added.id())).contains(added);
    assertThat(added.createdAt()).isEqualTo(ShopFixture.NOW);
  }

  @Test
  void findsNothingUnderAnUnknownId() {
    assertThat(customers.find(CustomerId.next())).isEmpty();
    assertThat(customers.change(CustomerId.next(), "Nobody", "")).isEmpty();
  }

  @Test
  void changesNameAndContact() {
    Customer added = customers.add("Harbour Radio", "");
    customers.change(added.id(), "Harbour Sound", "Quay 5");
    assertThat(customers.find(added.id()))
        .contains(new Customer(added.id(), "Harbour Sound", "Quay 5", added.createdAt()));
  }

  @Test
  void searchesEveryWordInNameAndContactWhateverTheCapitals() {
    customers.add("Harbour Radio", "Quay 4");
    customers.add("Hill Archive", "Quay 9");
    assertThat(names("QUAY harb")).containsExactly("Harbour Radio");
    assertThat(names("quay")).containsExactly("Harbour Radio", "Hill Archive");
    assertThat(names("river")).isEmpty();
  }

  @Test
  void takesSignsOfPatternsAsTheyAre() {
    customers.add("Fifty % Sound", "");
    customers.add("Under_score!", "");
    assertThat(names("%")).containsExactly("Fifty % Sound");
    assertThat(names("_")).containsExactly("Under_score!");
    assertThat(names("!")).containsExactly("Under_score!");
  }

  @Test
  void countsUnitsInTheList() {
    Unit unit = shop.unit("1001");
    shop.units.add(unit.modelId(), unit.customerId(), "1002", "");
    assertThat(customers.page(PageQuery.first(10)).items())
        .singleElement()
        .satisfies(s -> assertThat(s.units()).isEqualTo(2));
  }

  @Test
  void cutsTheListIntoPages() {
    for (int i = 0; i < 5; i++) {
      customers.add("Customer " + i, "");
    }
    PageOf<CustomerSummary> last = customers.page(new PageQuery("", 3, 2));
    assertThat(last.items()).extracting(s -> s.customer().name()).containsExactly("Customer 4");
    assertThat(last.total()).isEqualTo(5);
    assertThat(last.lastNumber()).isEqualTo(3);
    assertThat(customers.page(new PageQuery("", 4, 2)).items()).isEmpty();
  }

  private java.util.List<String> names(String words) {
    return customers.page(new PageQuery(words, 1, 10)).items().stream()
        .map(s -> s.customer().name())
        .toList();
  }
}
