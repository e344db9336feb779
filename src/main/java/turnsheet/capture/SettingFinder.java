package turnsheet.capture;

import java.io.IOException;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.stereotype.Component;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.KindGuess;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.shop.MachineModel;
import turnsheet.shop.ReferenceMedium;
import turnsheet.shop.SpeedSetting;

/** Finds the speed setting of a recording by how often it swings. */
@Component
class SettingFinder {

  private static final Logger log = LoggerFactory.getLogger(SettingFinder.class);

  /** As far as the measurement itself looks for the rate when nobody says otherwise. */
  private static final double REACH = Proposal.SEARCH_PERCENT / 100;

  /** Some seconds of a slow wheel. */
  private static final int EDGES = 2000;

  private static final Pattern NUMBER = Pattern.compile("(\\d+)(?:[.,]\\d+)?");

  private final CaptureStore store;
  private final CaptureFormats formats;

  SettingFinder(CaptureStore store, CaptureFormats formats) {
    this.store = store;
    this.formats = formats;
  }

  /** A setting and why it. */
  record Found(SpeedSetting setting, SettingFit fit) {}

  /**
   * Finds it.
   *
   * @param looked null where the file could not be used
   * @param model with one setting at least
   */
  Found find(
      StoredBytes bytes,
      @Nullable Looked looked,
      String fileName,
      MachineModel model,
      @Nullable ReferenceMedium medium) {
    List<SpeedSetting> settings = model.settings();
    if (settings.size() == 1) {
      return new Found(settings.get(0), SettingFit.ONLY);
    }
    Double rate = looked == null ? null : rateHertz(bytes, looked);
    if (looked != null && rate != null) {
      for (CaptureKind kind : likelyKinds(looked)) {
        List<SpeedSetting> near = near(rate, kind, model, medium);
        if (!near.isEmpty()) {
          return among(near, fileName);
        }
      }
    }
    return new Found(settings.get(0), SettingFit.NONE);
  }

  private static Found among(List<SpeedSetting> near, String fileName) {
    if (near.size() == 1) {
      return new Found(near.get(0), SettingFit.RATE);
    }
    List<SpeedSetting> named = near.stream().filter(s -> isNamed(s, fileName)).toList();
    return named.size() == 1
        ? new Found(named.get(0), SettingFit.NAME)
        : new Found(near.get(0), SettingFit.SEVERAL);
  }

  /** The guessed kind first; a pickup that gives a sine looks like a tone. */
  private static List<CaptureKind> likelyKinds(Looked looked) {
    KindGuess guess = looked.guess();
    if (guess == null) {
      return List.of(CaptureKind.EDGES);
    }
    return guess.kind() == CaptureKind.TONE
        ? List.of(CaptureKind.TONE, CaptureKind.TACHOMETER)
        : List.of(CaptureKind.TACHOMETER, CaptureKind.TONE);
  }

  /** The settings within reach of the rate, the nearest first. */
  private static List<SpeedSetting> near(
      double rate, CaptureKind kind, MachineModel model, @Nullable ReferenceMedium medium) {
    record Off(SpeedSetting setting, double share) {}
    List<Off> near = new ArrayList<>();
    for (SpeedSetting setting : model.settings()) {
      Double nominal = nominal(kind, model, setting, medium);
      if (nominal != null && Math.abs(rate / nominal - 1) <= REACH) {
        near.add(new Off(setting, Math.abs(rate / nominal - 1)));
      }
    }
    return near.stream().sorted(Comparator.comparingDouble(Off::share)).map(Off::setting).toList();
  }

  private static @Nullable Double nominal(
      CaptureKind kind,
      MachineModel model,
      SpeedSetting setting,
      @Nullable ReferenceMedium medium) {
    if (kind == CaptureKind.TONE) {
      Double ofMedium = medium == null ? null : medium.toneHz();
      return ofMedium == null ? setting.toneHz() : ofMedium;
    }
    var pulses = model.pulsesPerSecond(setting);
    return pulses.isPresent() ? pulses.getAsDouble() : null;
  }

  /** Whether the name holds the first number of the label, or its whole part: 9 or 9.5. */
  private static boolean isNamed(SpeedSetting setting, String fileName) {
    Matcher label = NUMBER.matcher(setting.label());
    if (!label.find()) {
      return false;
    }
    Set<String> numbers = new HashSet<>();
    Matcher inName = NUMBER.matcher(fileName);
    while (inName.find()) {
      numbers.add(inName.group().replace(',', '.'));
    }
    return numbers.contains(label.group().replace(',', '.')) || numbers.contains(label.group(1));
  }

  private @Nullable Double rateHertz(StoredBytes bytes, Looked looked) {
    KindGuess guess = looked.guess();
    return guess == null ? edgeRateHertz(bytes, looked) : guess.rateHertz();
  }

  private @Nullable Double edgeRateHertz(StoredBytes bytes, Looked looked) {
    try (EdgeReader in =
        formats.openEdges(
            store.open(bytes), looked.options().withChannel(looked.recognised().channel()))) {
      double[] times = new double[EDGES];
      boolean[] rising = new boolean[EDGES];
      int n = in.read(times, rising);
      int last = 0;
      int periods = 0;
      for (int i = 1; i < n; i++) {
        if (rising[i] == rising[0]) {
          last = i;
          periods++;
        }
      }
      return periods < 2 || !(times[last] > times[0]) ? null : periods / (times[last] - times[0]);
    } catch (IOException | RejectedException | RuntimeException e) {
      log.debug("no rate of {}", bytes.sha256(), e);
      return null;
    }
  }
}
