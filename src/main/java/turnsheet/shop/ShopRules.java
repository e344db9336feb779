package turnsheet.shop;

import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.core.diagnose.DecisionRule;

/** How the shop judges: one row, there from the beginning. */
@Component
public final class ShopRules {

  /** No threshold that matters is larger. */
  public static final double LARGEST_PERCENT = 100;

  private final JdbcClient jdbc;
  private final TransactionOperations transactions;

  public ShopRules(JdbcClient jdbc, TransactionOperations transactions) {
    this.jdbc = jdbc;
    this.transactions = transactions;
  }

  /**
   * The rules in force.
   *
   * @param rule how a verdict is reached
   * @param leastFlutterChangePercent smallest change of a figure of fluctuation that matters, in
   *     percent of the value before
   * @param leastSpeedChangePercent smallest change of a figure of speed that matters, in percentage
   *     points
   */
  public record Rules(
      DecisionRule rule, double leastFlutterChangePercent, double leastSpeedChangePercent) {

    public Rules {
      require("flutter", leastFlutterChangePercent);
      require("speed", leastSpeedChangePercent);
    }

    private static void require(String name, double percent) {
      if (!(percent >= 0 && percent <= LARGEST_PERCENT)) {
        throw new IllegalArgumentException(name + " change of " + percent + " %");
      }
    }
  }

  public Rules get() {
    return jdbc.sql("select * from shop_rules where id = 1")
        .query(
            (row, number) ->
                new Rules(
                    DecisionRule.valueOf(row.getString("decision_rule")),
                    row.getDouble("least_flutter_change_percent"),
                    row.getDouble("least_speed_change_percent")))
        .single();
  }

  /** From now on; what was issued keeps the rules it was issued by. */
  public void put(Rules rules) {
    transactions.executeWithoutResult(
        status ->
            jdbc.sql(
                    """
                    update shop_rules set decision_rule = ?, least_flutter_change_percent = ?,
                      least_speed_change_percent = ? where id = 1
                    """)
                .params(
                    rules.rule().name(),
                    rules.leastFlutterChangePercent(),
                    rules.leastSpeedChangePercent())
                .update());
  }
}
