package turnsheet.reading;

import java.util.List;
import java.util.stream.Collectors;
import turnsheet.core.measure.ChannelMeasurement.Share;
import turnsheet.core.signal.Rejection;
import turnsheet.job.JobRun;

/** Sentences about channels. */
final class ChannelWords {

  private ChannelWords() {}

  /** Tells the mean of all channels and, where there are several, each of them. */
  static void tell(JobRun run, List<Share> shares) {
    double mean = shares.stream().mapToDouble(Share::fraction).average().orElse(0);
    run.progress(mean, shares.size() == 1 ? "" : each(shares));
  }

  static String each(List<Share> shares) {
    return shares.stream()
        .map(share -> "channel " + share.channel() + ": " + (int) (100 * share.fraction()) + " %")
        .collect(Collectors.joining(", ", "Is being measured, ", "."));
  }

  static String inPlaceOf(int main, int other, Rejection why) {
    return "channel "
        + other
        + ", as channel "
        + main
        + " could not be measured ("
        + why.message().replaceAll("\\.$", "")
        + ")";
  }
}
