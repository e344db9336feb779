package turnsheet.core.format.audio;

import java.util.ArrayList;
import java.util.List;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.signal.RejectedException;

/** Which channel of an audio file is read: the one asked for, else the first, told as a guess. */
final class Channels {

  private Channels() {}

  static int chosen(int count, ReadOptions options) throws RejectedException {
    Integer asked = options.channel();
    if (asked == null) {
      return 1;
    }
    if (asked > count) {
      throw new RejectedException(
          "noSuchChannel",
          "Channel "
              + asked
              + " was asked for, but the recording has "
              + (count == 1 ? "only one channel" : count + " channels")
              + ": choose another channel.");
    }
    return asked;
  }

  static List<Recognised.Channel> named(int count) {
    List<Recognised.Channel> channels = new ArrayList<>(count);
    for (int i = 1; i <= count; i++) {
      channels.add(new Recognised.Channel("channel " + i, null));
    }
    return channels;
  }

  static List<Recognised.Guess> guesses(int count, ReadOptions options) {
    return count == 1 || options.channel() != null
        ? List.of()
        : List.of(
            new Recognised.Guess(
                "channel", "Channel 1 of " + count + ", because none was chosen."));
  }
}
