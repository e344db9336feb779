package turnsheet.reading;

import java.util.UUID;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import turnsheet.core.measure.ChannelMeasurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.signal.Rejection;

/**
 * Keeps readings and reduced curves. A fault of the program on a channel beside the main one must
 * not cost the main one's reading: it is logged and told with a reference. On the main channel it
 * is the job's to try again.
 */
final class ChannelKeeper implements ChannelMeasurement.Keeper<ChannelEnd> {

  private static final Logger log = LoggerFactory.getLogger(ChannelKeeper.class);

  private final int main;

  ChannelKeeper(int main) {
    this.main = main;
  }

  @Override
  public ChannelEnd keep(int channel, Outcome outcome) {
    return outcome instanceof Outcome.Measured measured
        ? new ChannelEnd.Kept(measured.reading(), KeptSeries.of(measured.series()))
        : new ChannelEnd.Refused(((Outcome.Refused) outcome).rejection());
  }

  @Override
  public ChannelEnd broke(int channel, RuntimeException fault) {
    if (channel == main) {
      throw fault;
    }
    String reference = UUID.randomUUID().toString().substring(0, 8);
    log.error("Reference {}: cannot measure channel {}", reference, channel, fault);
    return new ChannelEnd.Refused(
        new Rejection(
            "channelFailed",
            "The service failed on this channel: this is a fault of the service, not of the"
                + " recording. Quote the reference "
                + reference
                + "."));
  }
}
