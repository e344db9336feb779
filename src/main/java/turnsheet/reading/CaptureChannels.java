package turnsheet.reading;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.stereotype.Component;
import turnsheet.capture.CaptureId;
import turnsheet.capture.MeasuredChannels;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.signal.Rejection;

/** How the channels of captures stand. */
@Component
public final class CaptureChannels implements MeasuredChannels {

  private static final int LONGEST_MESSAGE = 2000;

  private final JdbcClient jdbc;
  private final Readings readings;

  public CaptureChannels(JdbcClient jdbc, Readings readings) {
    this.jdbc = jdbc;
    this.readings = readings;
  }

  /** Every channel that was measured or refused, in their order; empty before any measurement. */
  public List<ChannelStanding> of(CaptureId capture) {
    int main = main(capture);
    Map<Integer, ChannelStanding> all = new TreeMap<>();
    for (StoredReading stored : readings.ofChannels(capture)) {
      int channel = stored.reading().source().channel();
      all.put(channel, new ChannelStanding(channel, channel == main, stored, null));
    }
    refused(capture).forEach((c, why) -> all.put(c, new ChannelStanding(c, c == main, null, why)));
    return new ArrayList<>(all.values());
  }

  @Override
  public boolean has(CaptureId capture, MeasureSettings settings) {
    return of(capture).stream()
        .filter(standing -> standing.channel() == settings.channel())
        .map(ChannelStanding::reading)
        .anyMatch(
            stored ->
                stored != null
                    && stored.reading().method().version().equals(Measurement.METHOD_VERSION)
                    && stored.reading().method().settings().equals(settings));
  }

  /** Replaces what is known of channels that give no reading; joins the caller's transaction. */
  void noteRefused(CaptureId capture, Map<Integer, Rejection> refused) {
    jdbc.sql("delete from refused_channel where capture_id = ?").param(capture.value()).update();
    refused.forEach(
        (channel, why) ->
            jdbc.sql(
                    """
                    insert into refused_channel (capture_id, channel, code, message)
                    values (?, ?, ?, ?)
                    """)
                .params(capture.value(), channel, why.code(), cut(why.message()))
                .update());
  }

  private int main(CaptureId capture) {
    return jdbc.sql("select main_channel from capture where id = ?")
        .param(capture.value())
        .query(Integer.class)
        .optional()
        .orElse(1);
  }

  private Map<Integer, Rejection> refused(CaptureId capture) {
    Map<Integer, Rejection> refused = new LinkedHashMap<>();
    jdbc.sql("select channel, code, message from refused_channel where capture_id = ?")
        .param(capture.value())
        .query(
            row -> {
              refused.put(
                  row.getInt("channel"),
                  new Rejection(row.getString("code"), row.getString("message")));
            });
    return refused;
  }

  private static String cut(String message) {
    return message.length() <= LONGEST_MESSAGE ? message : message.substring(0, LONGEST_MESSAGE);
  }
}
