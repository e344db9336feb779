package turnsheet.shop;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Clock;
import java.util.List;
import java.util.Optional;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;

/** The customers of the shop. */
@Component
public final class Customers {

  private static final PageQuery.Listing LISTING =
      new PageQuery.Listing(
          "select c.*, (select count(*) from unit u where u.customer_id = c.id) as units",
          "from customer c",
          "",
          List.of(),
          "c.name || ' ' || c.contact",
          "order by lower(c.name), c.id");

  private final JdbcClient jdbc;
  private final Clock clock;

  public Customers(JdbcClient jdbc, Clock clock) {
    this.jdbc = jdbc;
    this.clock = clock;
  }

  public Optional<Customer> find(CustomerId id) {
    return jdbc.sql("select * from customer where id = ?")
        .param(id.value())
        .query(Customers::customer)
        .optional();
  }

  /** Customers whose names are the same but for capitals, eldest first. */
  public List<Customer> named(String name) {
    return jdbc.sql("select * from customer where lower(name) = lower(?) order by created_at, id")
        .param(name.strip())
        .query(Customers::customer)
        .list();
  }

  /** A page in the order of names; words are looked for in name and contact. */
  public PageOf<CustomerSummary> page(PageQuery query) {
    return query.run(
        jdbc, LISTING, (row, n) -> new CustomerSummary(customer(row, n), row.getInt("units")));
  }

  public Customer add(String name, String contact) {
    Customer added = new Customer(CustomerId.next(), name, contact, Columns.kept(clock.instant()));
    jdbc.sql("insert into customer (id, name, contact, created_at) values (?, ?, ?, ?)")
        .params(added.id().value(), name, contact, Columns.time(added.createdAt()))
        .update();
    return added;
  }

  /** Returns the customer as he now is, or nothing where there is no such customer. */
  public Optional<Customer> change(CustomerId id, String name, String contact) {
    return find(id)
        .map(
            old -> {
              Customer changed = new Customer(id, name, contact, old.createdAt());
              jdbc.sql("update customer set name = ?, contact = ? where id = ?")
                  .params(name, contact, id.value())
                  .update();
              return changed;
            });
  }

  private static Customer customer(ResultSet row, int number) throws SQLException {
    return new Customer(
        new CustomerId(Columns.uuid(row, "id")),
        row.getString("name"),
        row.getString("contact"),
        Columns.instant(row, "created_at"));
  }
}
