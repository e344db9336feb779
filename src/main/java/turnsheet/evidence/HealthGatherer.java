package turnsheet.evidence;

import java.io.IOException;
import org.springframework.core.annotation.Order;
import org.springframework.stereotype.Component;
import turnsheet.core.diagnose.sensor.HealthMeter;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Progress;
import turnsheet.core.signal.RejectedException;

/**
 * The health of a tachometer's waveform; finds a {@link
 * turnsheet.core.diagnose.sensor.SensorHealth}.
 */
@Component
@Order(20)
class HealthGatherer implements Gatherer {

  @Override
  public String name() {
    return "health";
  }

  @Override
  public boolean appliesTo(CaptureKind kind) {
    return kind == CaptureKind.TACHOMETER;
  }

  @Override
  public Object gather(Material material, Progress progress) throws IOException, RejectedException {
    return new HealthMeter(
            material.measurement(),
            material.bytes(),
            material.sha256(),
            material.options(),
            material.settings())
        .judge(progress);
  }
}
