package turnsheet.capture.web;

import java.util.Arrays;
import java.util.List;
import org.springframework.stereotype.Component;
import turnsheet.capture.CaptureKey;
import turnsheet.capture.ToneMethod;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.Instruments;
import turnsheet.shop.Media;
import turnsheet.shop.ReferenceMedium;

/** What the upload fragment offers; templates know it as {@code @uploads}. */
@Component("uploads")
public class Uploads {

  private final Instruments instruments;
  private final Media media;

  Uploads(Instruments instruments, Media media) {
    this.instruments = instruments;
    this.media = media;
  }

  /** Asked once a page, handed to each cell. */
  public Choices choices() {
    return new Choices(instruments.all(), media.all());
  }

  /** Conditions that every visit has; a bench may add labels of its own. */
  public List<String> conditions() {
    return List.of(CaptureKey.AS_RECEIVED, CaptureKey.AFTER_REPAIR);
  }

  /** Words of the ways that a tone comes onto what is played. */
  public List<String> toneMethods() {
    return Arrays.stream(ToneMethod.values()).map(ToneMethod::word).toList();
  }

  /** Instruments and media to choose from. */
  public record Choices(List<BenchInstrument> instruments, List<ReferenceMedium> media) {}
}
