package turnsheet.core.diagnose.wheel;

import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;

/** The figures of fluctuation that a wheel's pattern can be in. */
public record FlutterTrio(
    Figure weightedTwoSigmaPercent, Figure weightedRmsPercent, Figure unweightedRmsPercent) {

  static FlutterTrio of(Reading reading) {
    Reading.Flutter flutter = reading.flutter();
    return new FlutterTrio(
        flutter.weightedTwoSigmaPercent(),
        flutter.weightedRmsPercent(),
        flutter.unweightedRmsPercent());
  }
}
