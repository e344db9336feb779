package turnsheet.shop.web;

/** A line of the list of customers. */
record CustomerRow(String id, String name, String contact, int units) {}
