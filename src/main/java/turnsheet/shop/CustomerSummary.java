package turnsheet.shop;

/** A customer as a list shows him. */
public record CustomerSummary(Customer customer, int units) {}
