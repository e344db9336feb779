package turnsheet.shop.web;

import turnsheet.shop.ReferenceMedium;

/** A line of the list of media; empty where a number is unknown. */
record MediumRow(
    String id, String name, String toneHz, String tolerancePercent, String flutterPercent) {

  static MediumRow of(ReferenceMedium medium) {
    return new MediumRow(
        medium.id().toString(),
        medium.name(),
        Typed.number(medium.toneHz()),
        Typed.number(medium.speedTolerancePercent()),
        Typed.number(medium.ownFlutterPercent()));
  }
}
