package turnsheet.shop.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.web.Shown;

/**
 * A machine model as its page shows it; every number is text already.
 *
 * @param settings with the speeds of the selector, also the columns of the table of parts
 */
record ModelPage(
    String id,
    String name,
    String pulsesPerTurn,
    String note,
    int units,
    List<SettingRow> settings,
    List<PartRow> parts,
    List<LimitRow> limits) {

  /**
   * @param pulsesPerSecond empty where unknown
   * @param computed whether the pulse rate follows from the pulses per turn
   */
  record SettingRow(
      String id,
      String label,
      String speed,
      String toneHz,
      String pulsesPerSecond,
      boolean computed) {}

  /**
   * @param turnsOf the part whose turns are counted; null where none is
   * @param empty diameter of the bare hub of a reel; empty where there is none
   * @param ratesHz at each setting; a dash where unknown
   */
  record PartRow(
      String name,
      String kind,
      String basis,
      String amount,
      @Nullable String turnsOf,
      String empty,
      List<String> ratesHz) {}

  record LimitRow(
      String settingId,
      String setting,
      String figure,
      String figurePath,
      Shown bound,
      String unit,
      String origin) {}
}
