package turnsheet.reading.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.web.Shown;

/**
 * The channels of a recording side by side.
 *
 * @param standing which channel the page shows and which one stands for the recording
 * @param mainId reading of the main channel; null where the page shows that channel itself, or the
 *     main channel has none
 * @param more says that not all channels were measured; null where they were
 */
record ChannelTable(
    String standing,
    @Nullable String mainId,
    @Nullable String more,
    List<String> columns,
    List<Row> rows) {

  /**
   * One channel.
   *
   * @param note main, shown here, or nothing
   * @param readingId null where it could not be measured, or is the one shown
   * @param figures empty where it could not be measured
   * @param refusal why it could not be measured; null where it was
   */
  record Row(
      String name,
      String note,
      @Nullable String readingId,
      List<Shown> figures,
      @Nullable String refusal) {}
}
