package turnsheet.evidence;

import java.io.IOException;
import org.springframework.core.annotation.Order;
import org.springframework.stereotype.Component;
import turnsheet.core.diagnose.mains.MainsMeter;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Progress;
import turnsheet.core.signal.RejectedException;

/** The mains frequency from the hum; finds a {@link turnsheet.core.diagnose.mains.Mains}. */
@Component
@Order(10)
class MainsGatherer implements Gatherer {

  @Override
  public String name() {
    return "mains";
  }

  @Override
  public boolean appliesTo(CaptureKind kind) {
    return kind != CaptureKind.EDGES;
  }

  @Override
  public Object gather(Material material, Progress progress) throws IOException, RejectedException {
    return new MainsMeter(material.settings(), material.reading())
        .measure(material::openSamples, progress);
  }
}
