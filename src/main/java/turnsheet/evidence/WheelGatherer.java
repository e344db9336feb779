package turnsheet.evidence;

import java.io.IOException;
import org.springframework.core.annotation.Order;
import org.springframework.stereotype.Component;
import turnsheet.core.diagnose.wheel.WheelFinding;
import turnsheet.core.diagnose.wheel.WheelLook;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.EdgeTimes;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Progress;
import turnsheet.core.signal.RejectedException;

/** Looks at the sensor wheel. */
@Component
@Order(40)
class WheelGatherer implements Gatherer {

  /** Name of the section. */
  static final String NAME = "wheel";

  /** What reading the edges takes of all the work, about. */
  private static final double READ = 0.3;

  @Override
  public String name() {
    return NAME;
  }

  @Override
  public boolean appliesTo(CaptureKind kind) {
    return kind != CaptureKind.TONE;
  }

  @Override
  public WheelEvidence gather(Material material, Progress progress)
      throws IOException, RejectedException {
    MeasureSettings settings = material.settings();
    EdgeTimes edges =
        settings.kind() == CaptureKind.TACHOMETER
            ? EdgeTimes.ofWaveform(material::openSamples, settings, WheelLook.MOST_EDGES)
            : EdgeTimes.of(material::openEdges, settings, WheelLook.MOST_EDGES);
    progress.reached(READ);
    try {
      WheelFinding finding =
          WheelLook.find(
              edges,
              settings.teeth(),
              material.reading(),
              done -> progress.reached(READ + (1 - READ) * done));
      return new WheelEvidence(finding, null, settings.teeth());
    } catch (RejectedException e) {
      // kept with what was stated, so that the page can ask for the number of teeth
      return new WheelEvidence(null, e.rejection(), settings.teeth());
    }
  }
}
