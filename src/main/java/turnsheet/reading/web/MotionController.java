package turnsheet.reading.web;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.http.CacheControl;
import org.springframework.http.MediaType;
import org.springframework.http.ResponseEntity;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.core.diagnose.motion.MovingLine;
import turnsheet.core.diagnose.motion.Reel;
import turnsheet.core.diagnose.motion.SpeedSound;
import turnsheet.core.signal.Fluctuation;
import turnsheet.core.synth.WavWriter;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** The speed as sound, and the lines that move, for programs. */
@RestController
class MotionController {

  private static final MediaType WAVE = MediaType.parseMediaType("audio/wav");

  private final Readings readings;
  private final MotionView view;

  MotionController(Readings readings, MotionView view) {
    this.readings = readings;
    this.view = view;
  }

  /**
   * The fluctuation as a sound file, 16 bits, one channel.
   *
   * @param faster how many times faster than it was
   * @param line rate in Hz of the one line to hear; everything without
   */
  @GetMapping({"/readings/{id}/sound.wav", "/api/v1/readings/{id}/sound.wav"})
  ResponseEntity<byte[]> sound(
      @PathVariable UUID id,
      @RequestParam(defaultValue = "20") int faster,
      @RequestParam(required = false) @Nullable Double line)
      throws IOException {
    Fluctuation fluctuation =
        readings.fluctuation(new ReadingId(id)).orElseThrow(() -> new NotFoundException("sound"));
    List<Integer> factors = SoundFactors.of(fluctuation);
    if (!factors.contains(faster)) {
      throw new RefusedRequestException("faster", "Ask for one of " + factors + " times faster.");
    }
    if (line != null && !(line > 0 && line < fluctuation.rateHertz() / 2)) {
      throw new RefusedRequestException(
          "line", "Ask for a line above 0 and below " + fluctuation.rateHertz() / 2 + " Hz.");
    }
    SpeedSound sound =
        line == null
            ? SpeedSound.whole(fluctuation, faster)
            : SpeedSound.line(fluctuation, faster, line);
    double[] samples = new double[sound.length()];
    for (int i = 0; i < samples.length; i++) {
      samples[i] = sound.sample(i);
    }
    ByteArrayOutputStream out = new ByteArrayOutputStream(44 + 2 * samples.length);
    WavWriter.write(out, sound.rateHertz(), 16, samples);
    return ResponseEntity.ok()
        .contentType(WAVE)
        .cacheControl(CacheControl.noCache().cachePrivate())
        .body(out.toByteArray());
  }

  /** The lines that move. */
  @GetMapping("/api/v1/readings/{id}/motion")
  List<MovingEntry> motion(@PathVariable UUID id) {
    MotionView.Motion motion =
        view.motion(new ReadingId(id)).orElseThrow(() -> new NotFoundException("reading"));
    return motion.lines().stream().map(l -> MovingEntry.of(l, motion)).toList();
  }

  /**
   * A line that moves.
   *
   * @param reel what reel would move so; null where none would, or no tape runs
   */
  record MovingEntry(MovingLine line, @Nullable Reel reel) {
    static MovingEntry of(MovingLine line, MotionView.Motion motion) {
      return new MovingEntry(
          line,
          motion.tapeMetresPerSecond().isPresent()
              ? Reel.of(line, motion.tapeMetresPerSecond().getAsDouble()).orElse(null)
              : null);
    }
  }
}
