package turnsheet.core.measure;

import java.io.IOException;
import turnsheet.core.signal.RejectedException;

/** Measures samples at hand as a tone. */
final class Tones {

  private Tones() {}

  static TonePlan.Result measured(double[] samples, double rateHertz, MeasureSettings settings) {
    try {
      return new TonePlan(settings).measure(() -> new ArrayReader(samples, rateHertz, 5000));
    } catch (IOException | RejectedException e) {
      throw new AssertionError(e);
    }
  }
}
