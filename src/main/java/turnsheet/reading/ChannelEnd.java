package turnsheet.reading;

import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Rejection;

/** What came of measuring one channel, small enough to be kept for all of them at once. */
sealed interface ChannelEnd {

  record Kept(Reading reading, KeptSeries series) implements ChannelEnd {}

  record Refused(Rejection rejection) implements ChannelEnd {}
}
