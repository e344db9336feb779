package turnsheet.core.measure;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.signal.Rejection;

class HeapNeedTest {

  private static final long MIB = 1 << 20;

  private static Recognised lasting(double hours) {
    return new Recognised(
        "WAV, 16-bit PCM",
        Contents.WAVEFORM,
        48_000.0,
        Math.round(hours * 3600 * 48_000),
        List.of(new Recognised.Channel("channel 1", null)),
        1,
        List.of(),
        List.of());
  }

  /** Twelve hours in 96 MiB ran out of memory and took the service with them. */
  @Test
  void whatDoesNotFitIsRefusedWithItsNumbers() {
    assertThat(HeapNeed.refusal(lasting(12.4), 96 * MIB))
        .map(Rejection::message)
        .hasValueSatisfying(
            sentence -> assertThat(sentence).contains("12.4 h", "599 MB", "101 MB", "-Xmx"));
  }

  @Test
  void whatABenchRecordsFitsAnywhere() {
    assertThat(HeapNeed.refusal(lasting(1), 128 * MIB)).isEmpty();
    assertThat(HeapNeed.refusal(lasting(6.2), 512 * MIB)).isEmpty();
  }

  /**
   * 60 MiB beside, then 7200 s of 12000 bytes for each channel and 12 MiB for each beside the
   * first: 142 MiB for one, 237 MiB for two.
   */
  @Test
  void asManyChannelsAtOnceAsTheMemoryHolds() {
    assertThat(HeapNeed.channelsAtOnce(lasting(2), 64 * MIB, 2)).isEqualTo(1);
    assertThat(HeapNeed.channelsAtOnce(lasting(2), 236 * MIB, 2)).isEqualTo(1);
    assertThat(HeapNeed.channelsAtOnce(lasting(2), 237 * MIB, 2)).isEqualTo(2);
    assertThat(HeapNeed.channelsAtOnce(lasting(2), 10_000 * MIB, 2)).isEqualTo(2);
    assertThat(HeapNeed.channelsAtOnce(lasting(0.1), 96 * MIB, 2)).isEqualTo(2);
  }
}
