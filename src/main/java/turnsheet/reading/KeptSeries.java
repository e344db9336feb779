package turnsheet.reading;

import java.util.LinkedHashMap;
import java.util.Map;
import turnsheet.core.measure.Series;
import turnsheet.reading.chart.Curve;

/**
 * The curves of a reading as the store keeps them: a few megabytes, however long the recording.
 *
 * @param contents by their name in the store, as {@link SeriesCodec} writes them
 */
record KeptSeries(Map<String, byte[]> contents) {

  static final String FLUCTUATION_BLOCKS = "fluctuation-blocks";
  static final String INDICATION_BLOCKS = "indication-blocks";
  static final String FLUCTUATION = "fluctuation";

  static KeptSeries of(Series series) {
    Map<String, byte[]> contents = new LinkedHashMap<>();
    boolean curves = series.trace().length() > 0; // none of a recording that was too short
    if (curves) {
      contents.put(SeriesName.TRACE.word(), SeriesCodec.encode(Curve.of(series.trace())));
      contents.put(SeriesName.SPECTRUM.word(), SeriesCodec.encode(Curve.of(series.spectrum())));
    }
    Series.Histogram histogram = series.histogram();
    if (histogram != null) {
      contents.put(SeriesName.HISTOGRAM.word(), SeriesCodec.encode(histogram));
    }
    if (curves) {
      contents.put(FLUCTUATION_BLOCKS, SeriesCodec.encode(series.blocks().fluctuation()));
      contents.put(INDICATION_BLOCKS, SeriesCodec.encode(series.blocks().indication()));
      contents.put(FLUCTUATION, SeriesCodec.encode(series.fluctuation().get()));
    }
    return new KeptSeries(contents);
  }
}
