package turnsheet.shop.web;

/** One entry of a choice: what is sent and what is read. */
record Choice(String value, String text) {}
