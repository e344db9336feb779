package turnsheet.shop.web;

import org.jspecify.annotations.Nullable;
import turnsheet.shop.ReferenceMedium;
import turnsheet.web.Numbers;
import turnsheet.web.Shown;

/** A line of the list of media; no tone and no flutter where they are unknown. */
record MediumRow(
    String id, String name, String toneHz, Shown tolerancePercent, @Nullable Shown flutterPercent) {

  static MediumRow of(ReferenceMedium medium) {
    return new MediumRow(
        medium.id().toString(),
        medium.name(),
        Numbers.onPage(Typed.number(medium.toneHz())),
        Typed.cell(medium.speedTolerancePercent()),
        Typed.cellOrNone(medium.ownFlutterPercent()));
  }
}
