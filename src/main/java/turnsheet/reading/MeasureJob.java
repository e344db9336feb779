package turnsheet.reading;

import java.io.IOException;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.stereotype.Component;
import org.springframework.transaction.support.TransactionOperations;
import turnsheet.access.ShopPreferences;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.CaptureId;
import turnsheet.capture.CaptureState;
import turnsheet.capture.CaptureStore;
import turnsheet.capture.Captures;
import turnsheet.capture.Looked;
import turnsheet.core.measure.ChannelMeasurement;
import turnsheet.core.measure.HeapNeed;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Rejection;
import turnsheet.job.JobHandler;
import turnsheet.job.JobRun;
import turnsheet.shop.MachineModels;
import turnsheet.shop.SpeedSettingId;

/**
 * Measures the channels of a confirmed capture. Run twice, it leaves one reading of each: the core
 * gives the same document for the same bytes and choices, and the store keeps the same document
 * once.
 */
@Component
class MeasureJob implements JobHandler {

  private static final Logger log = LoggerFactory.getLogger(MeasureJob.class);

  private final Captures captures;
  private final CaptureStore store;
  private final ChannelThreads threads;
  private final MachineModels models;
  private final Readings readings;
  private final CaptureChannels channels;
  private final ShopPreferences preferences;
  private final TransactionOperations transactions;

  MeasureJob(
      Captures captures,
      CaptureStore store,
      ChannelThreads threads,
      MachineModels models,
      Readings readings,
      CaptureChannels channels,
      ShopPreferences preferences,
      TransactionOperations transactions) {
    this.captures = captures;
    this.store = store;
    this.threads = threads;
    this.models = models;
    this.readings = readings;
    this.channels = channels;
    this.preferences = preferences;
    this.transactions = transactions;
  }

  @Override
  public String name() {
    return "measure";
  }

  @Override
  public void run(JobRun run) throws IOException {
    CaptureId id = new CaptureId(run.subject());
    Capture capture = captures.find(id).orElse(null);
    CaptureChoices choices = capture == null ? null : capture.choices();
    if (capture == null || choices == null || capture.state() != CaptureState.QUEUED) {
      log.info("capture {} does not wait to be measured", id.value());
      return;
    }
    Looked looked = capture.looked();
    long heapBytes = Runtime.getRuntime().maxMemory();
    Optional<Rejection> tooLong =
        looked == null ? Optional.empty() : HeapNeed.refusal(looked.recognised(), heapBytes);
    if (tooLong.isPresent()) {
      captures.refused(id, tooLong.get());
      return;
    }
    int main = choices.settings().channel();
    Map<Integer, ChannelEnd> ends =
        threads
            .measurement()
            .measure(
                new ChannelMeasurement.Order(
                    store.open(capture.bytes()),
                    capture.bytes().sha256(),
                    choices.options(),
                    choices.settings()),
                looked == null
                    ? List.of(main)
                    : ChannelMeasurement.chosen(looked.recognised().channels().size(), main),
                looked == null
                    ? 1
                    : HeapNeed.channelsAtOnce(looked.recognised(), heapBytes, threads.count()),
                new ChannelKeeper(main),
                shares -> ChannelWords.tell(run, shares));
    transactions.executeWithoutResult(status -> store(capture, looked, choices, ends));
  }

  /**
   * Where the main channel gave nothing, the first that did stands for the capture, and says so.
   */
  private void store(
      Capture capture,
      @Nullable Looked looked,
      CaptureChoices choices,
      Map<Integer, ChannelEnd> ends) {
    CaptureId id = capture.id();
    Map<Integer, Rejection> refused = new TreeMap<>();
    ends.forEach(
        (channel, end) -> {
          if (end instanceof ChannelEnd.Refused why) {
            refused.put(channel, why.rejection());
          }
        });
    int main = choices.settings().channel();
    Rejection why = refused.get(main);
    boolean waited;
    if (why == null) {
      waited = captures.measured(id);
    } else if (looked == null || refused.size() == ends.size()) {
      waited = captures.refused(id, why);
    } else {
      int other =
          ends.keySet().stream().filter(c -> !refused.containsKey(c)).findFirst().orElseThrow();
      waited =
          captures.measuredOn(
              id,
              looked.onChannel(other, ChannelWords.inPlaceOf(main, other, why)),
              choices.onChannel(other));
    }
    if (waited) {
      channels.noteRefused(id, refused);
      ends.values()
          .forEach(
              end -> {
                if (end instanceof ChannelEnd.Kept one) {
                  readings.add(
                      id, withSuspects(one.reading(), capture.key().setting()), one.series());
                }
              });
    }
  }

  @Override
  public void gaveUp(UUID subject, String sentence) {
    captures.failed(new CaptureId(subject), sentence);
  }

  private Reading withSuspects(Reading reading, SpeedSettingId settingId) {
    return models
        .ofSetting(settingId)
        .flatMap(m -> MachineInCapture.of(m, settingId, reading, preferences.get().mainsHz()))
        .map(machine -> machine.suspectsIn(reading))
        .orElse(reading);
  }
}
