package turnsheet.reading.web;

import java.time.Instant;
import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.http.MediaType;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestMapping;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.capture.CaptureId;
import turnsheet.core.signal.Rejection;
import turnsheet.document.ReadingDocument;
import turnsheet.reading.CaptureChannels;
import turnsheet.reading.ChannelStanding;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.reading.StoredReading;
import turnsheet.web.NotFoundException;

/** Readings for programs. */
@RestController
@RequestMapping("/api/v1")
class ReadingApi {

  private final Readings readings;
  private final CaptureChannels channels;

  ReadingApi(Readings readings, CaptureChannels channels) {
    this.readings = readings;
    this.channels = channels;
  }

  /** The result contract. */
  @GetMapping(path = "/readings/{id}", produces = MediaType.APPLICATION_JSON_VALUE)
  String reading(@PathVariable UUID id) {
    return readings
        .find(new ReadingId(id))
        .map(stored -> ReadingDocument.toJson(stored.reading()))
        .orElseThrow(() -> new NotFoundException("reading"));
  }

  /**
   * Which readings a capture has: those of the channel that stands for it first, then by channel,
   * the newest first.
   */
  @GetMapping("/captures/{id}/readings")
  List<ReadingEntry> ofCapture(@PathVariable UUID id) {
    return readings.versionsOf(new CaptureId(id)).stream()
        .map(v -> new ReadingEntry(v.id().value(), v.version(), v.madeAt(), v.channel(), v.main()))
        .toList();
  }

  /** What the latest measurement made of each channel of a capture. */
  @GetMapping("/captures/{id}/channels")
  List<ChannelEntry> channels(@PathVariable UUID id) {
    return channels.of(new CaptureId(id)).stream().map(ChannelEntry::of).toList();
  }

  /**
   * One reading of a capture.
   *
   * @param channel counted from 1
   * @param main whether that channel stands for the capture
   */
  record ReadingEntry(
      UUID readingId, String methodVersion, Instant madeAt, int channel, boolean main) {}

  /**
   * One channel of a capture.
   *
   * @param main whether it stands for the capture
   * @param readingId its newest reading; null where it could not be measured
   * @param refusal why it could not be measured; null where it was
   */
  record ChannelEntry(
      int channel, boolean main, @Nullable UUID readingId, @Nullable Rejection refusal) {

    static ChannelEntry of(ChannelStanding standing) {
      StoredReading stored = standing.reading();
      return new ChannelEntry(
          standing.channel(),
          standing.main(),
          stored == null ? null : stored.id().value(),
          standing.refusal());
    }
  }
}
