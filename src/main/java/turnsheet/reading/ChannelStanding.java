package turnsheet.reading;

import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.Rejection;

/**
 * What the latest measurement made of one channel of a capture; one of the two is there.
 *
 * @param channel counted from 1
 * @param main whether it stands for the capture
 * @param reading the channel's newest
 * @param refusal why it has none
 */
public record ChannelStanding(
    int channel, boolean main, @Nullable StoredReading reading, @Nullable Rejection refusal) {}
