package turnsheet.shop;

/** How often a rotating part turns at a speed setting. */
public record PartRate(String part, double rateHertz) {}
