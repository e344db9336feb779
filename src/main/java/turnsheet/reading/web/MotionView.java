package turnsheet.reading.web;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.stereotype.Component;
import turnsheet.core.diagnose.motion.MovingLine;
import turnsheet.core.diagnose.motion.MovingLines;
import turnsheet.core.diagnose.motion.RateMap;
import turnsheet.core.diagnose.motion.Reel;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Fluctuation;
import turnsheet.reading.CapturePlaces;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.reading.StoredReading;
import turnsheet.shop.MachineModels;
import turnsheet.shop.SpeedSetting;
import turnsheet.web.Numbers;
import turnsheet.web.Shown;
import turnsheet.web.Wording;

/** Gathers what a reading shows over time, and for the ear. */
@Component
class MotionView {

  private static final Numbers.Sign PLAIN = Numbers.Sign.PLAIN;
  private static final int USUAL_FACTOR = 20;
  private static final int MOST_KEPT = 64;

  private final Readings readings;
  private final CapturePlaces places;
  private final MachineModels models;
  private final MessageSource messages;

  /** What was found in the latest readings asked for; a reading never changes. */
  private final Map<ReadingId, Found> kept =
      new LinkedHashMap<>(MOST_KEPT, 0.75f, true) {
        @Override
        protected boolean removeEldestEntry(Map.Entry<ReadingId, Found> eldest) {
          return size() > MOST_KEPT;
        }
      };

  private record Found(List<MovingLine> lines, Optional<RateMap> map) {}

  MotionView(
      Readings readings, CapturePlaces places, MachineModels models, MessageSource messages) {
    this.readings = readings;
    this.places = places;
    this.models = models;
    this.messages = messages;
  }

  /** Lines that move, and the speed of the tape where there is one. */
  record Motion(List<MovingLine> lines, OptionalDouble tapeMetresPerSecond) {}

  /**
   * The section of one reading.
   *
   * @param line rate of the one line to listen to; null for everything
   * @param faster how many times faster; null for the usual
   */
  MotionPage page(ReadingId id, @Nullable Double line, @Nullable Integer faster, Locale locale) {
    Wording words = new Wording(messages, locale);
    StoredReading stored = readings.find(id).orElseThrow();
    Fluctuation fluctuation = readings.fluctuation(id).orElse(null);
    if (fluctuation == null) {
      return new MotionPage(words.text("motion.notKept"), null, "", List.of(), null);
    }
    Found found = found(id, fluctuation);
    Motion motion = new Motion(found.lines(), tapeSpeed(stored));
    Optional<RateMap> map = found.map();
    MotionDrawing drawing = new MotionDrawing(words);
    return new MotionPage(
        sentence(motion, fluctuation, words),
        map.map(m -> drawing.map(m, motion.lines())).orElse(null),
        map.map(drawing::explained).orElse(""),
        motion.lines().stream().map(l -> row(l, motion.tapeMetresPerSecond(), words)).toList(),
        sound(id, stored.reading(), fluctuation, line, faster, words));
  }

  /** Empty where the reading is unknown or its fluctuation was not kept. */
  Optional<Motion> motion(ReadingId id) {
    return readings
        .find(id)
        .flatMap(
            stored ->
                readings
                    .fluctuation(id)
                    .map(f -> new Motion(found(id, f).lines(), tapeSpeed(stored))));
  }

  private Found found(ReadingId id, Fluctuation fluctuation) {
    synchronized (kept) {
      Found before = kept.get(id);
      if (before != null) {
        return before;
      }
    }
    Found now =
        new Found(
            MovingLines.of(fluctuation),
            RateMap.possible(fluctuation)
                ? Optional.of(RateMap.of(fluctuation))
                : Optional.empty());
    synchronized (kept) {
      kept.put(id, now);
    }
    return now;
  }

  private OptionalDouble tapeSpeed(StoredReading stored) {
    return places
        .find(stored.captureId())
        .flatMap(place -> models.find(place.modelId()).flatMap(m -> m.setting(place.settingId())))
        .map(SpeedSetting::tapeSpeedCmPerS)
        .map(cm -> cm.isPresent() ? OptionalDouble.of(cm.getAsDouble() / 100) : cm)
        .orElse(OptionalDouble.empty());
  }

  private static String sentence(Motion motion, Fluctuation fluctuation, Wording words) {
    if (fluctuation.durationSeconds() < MovingLines.SHORTEST_SECONDS) {
      return words.text("motion.tooShort", words.numbers().plain(MovingLines.SHORTEST_SECONDS));
    }
    long reels =
        motion.lines().stream()
            .filter(l -> l.motion() != MovingLine.Motion.WANDERING)
            .filter(l -> reel(l, motion.tapeMetresPerSecond()).isPresent())
            .count();
    int moving = motion.lines().size();
    if (moving == 0) {
      return words.text("motion.none", words.numbers().plain(MovingLines.HIGHEST_HERTZ));
    }
    return reels > 0
        ? words.text("motion.reels", Integer.toString(moving), Long.toString(reels))
        : words.text("motion.moving", Integer.toString(moving));
  }

  private static Optional<Reel> reel(MovingLine line, OptionalDouble tapeMetresPerSecond) {
    return tapeMetresPerSecond.isPresent()
        ? Reel.of(line, tapeMetresPerSecond.getAsDouble())
        : Optional.empty();
  }

  private static MotionPage.Line row(MovingLine line, OptionalDouble tape, Wording words) {
    Numbers numbers = words.numbers();
    Optional<Reel> reel = reel(line, tape);
    String about =
        reel.map(
                r ->
                    words.text(
                        r.emptying() ? "motion.reel.supply" : "motion.reel.takeUp",
                        Integer.toString(r.harmonic()),
                        numbers.show(r.radiusMm(), r.radiusU(), "mm", PLAIN).text(),
                        numbers.show(r.thicknessUm(), r.thicknessU(), "µm", PLAIN).text()))
            .orElse(
                words.text(
                    line.motion() == MovingLine.Motion.WANDERING
                        ? "motion.wanders"
                        : tape.isPresent() ? "motion.noReel" : "motion.noTape"));
    return new MotionPage.Line(
        hertz(line.startHertz(), null, numbers),
        hertz(line.middleHertz(), line.hertzU(), numbers),
        hertz(line.endHertz(), null, numbers),
        numbers.show(line.peakPercent(), null, "%", PLAIN),
        words.text("motion.how." + line.motion().name().toLowerCase(Locale.ROOT)),
        about);
  }

  private static Shown hertz(double value, @Nullable Double u, Numbers numbers) {
    return numbers.show(value, u, "Hz", PLAIN);
  }

  private static MotionPage.Sound sound(
      ReadingId id,
      Reading reading,
      Fluctuation fluctuation,
      @Nullable Double line,
      @Nullable Integer faster,
      Wording words) {
    Numbers numbers = words.numbers();
    int factor = SoundFactors.offered(fluctuation, faster == null ? USUAL_FACTOR : faster);
    List<MotionPage.ChoiceOf> bands = new ArrayList<>();
    bands.add(new MotionPage.ChoiceOf("", words.text("motion.sound.whole"), line == null));
    for (Reading.Line l : reading.lines()) {
      Double rate = l.rateHz().value();
      Double peak = l.peakPercent().value();
      if (rate != null && peak != null) {
        String value = String.format(Locale.ROOT, "%.3f", rate);
        bands.add(
            new MotionPage.ChoiceOf(
                value,
                words.text(
                    "motion.sound.line",
                    numbers.show(rate, null, "Hz", PLAIN).valueAndUnit(),
                    numbers.show(peak, null, "%", PLAIN).valueAndUnit()),
                line != null && Math.abs(line - rate) < 0.001));
      }
    }
    String address =
        "/readings/" + id + "/sound.wav?faster=" + factor + (line == null ? "" : "&line=" + line);
    double example = line == null ? 4 : line;
    return new MotionPage.Sound(
        address,
        words.text(
            "motion.sound.explained",
            Integer.toString(factor),
            numbers.show(example, null, "Hz", PLAIN).valueAndUnit(),
            numbers.show(example * factor, null, "Hz", PLAIN).valueAndUnit(),
            numbers.fixed(fluctuation.durationSeconds() / factor, 1)),
        bands,
        SoundFactors.of(fluctuation).stream()
            .map(
                f ->
                    new MotionPage.ChoiceOf(
                        Integer.toString(f),
                        words.text("motion.sound.factor", Integer.toString(f)),
                        f == factor))
            .toList());
  }
}
