package turnsheet.shop.web;

/**
 * A line of a list of units.
 *
 * @param lastSeen day of the last visit; empty where there was none
 */
record UnitRow(
    String id,
    String serialNumber,
    String model,
    String modelId,
    String customer,
    String customerId,
    int visits,
    String lastSeen,
    boolean onBench) {}
