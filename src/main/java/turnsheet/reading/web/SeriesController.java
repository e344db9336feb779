package turnsheet.reading.web;

import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RequestParam;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.core.measure.Series;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.reading.SeriesName;
import turnsheet.reading.chart.Curve;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** Windows of the curves of a reading, for the charts of the pages and for programs. */
@RestController
class SeriesController {

  static final int MOST_POINTS = 4000;

  private final Readings readings;

  SeriesController(Readings readings) {
    this.readings = readings;
  }

  /**
   * One window of a curve; the whole where neither edge is given.
   *
   * @param from left edge in the unit of the axis
   * @param to right edge
   * @param points most points wanted
   */
  @GetMapping({"/readings/{id}/series/{name}", "/api/v1/readings/{id}/series/{name}"})
  SeriesDocument window(
      @PathVariable UUID id,
      @PathVariable String name,
      @RequestParam(required = false) @Nullable Double from,
      @RequestParam(required = false) @Nullable Double to,
      @RequestParam(defaultValue = "1000") int points) {
    if (points < 2 || points > MOST_POINTS) {
      throw new RefusedRequestException(
          "points", "Ask for between 2 and " + MOST_POINTS + " points.");
    }
    ReadingId reading = new ReadingId(id);
    SeriesName series = SeriesName.of(name).orElseThrow(() -> new NotFoundException("series"));
    if (series == SeriesName.HISTOGRAM) {
      return readings
          .histogram(reading)
          .map(SeriesDocument::of)
          .orElseThrow(() -> new NotFoundException("series"));
    }
    Curve whole =
        readings.curve(reading, series).orElseThrow(() -> new NotFoundException("series"));
    double left = from == null ? whole.start() : from;
    double right = to == null ? Math.max(left, whole.end()) : to;
    if (!(left <= right)) {
      throw new RefusedRequestException("window", "The window must not end before it starts.");
    }
    return SeriesDocument.of(series, whole.window(left, right, points));
  }

  /**
   * A curve or histogram in JSON. Point k lies at {@code start + k * step}.
   *
   * @param samplesPerPoint 1 where the points are samples
   * @param low values, or the lowest of each bucket; null marks a point without a value
   * @param high the highest of each bucket; null where the points are samples
   * @param counts of a histogram, whose class k begins at {@code start + k * step}; null otherwise
   */
  record SeriesDocument(
      String name,
      String xUnit,
      String yUnit,
      double start,
      double step,
      long samplesPerPoint,
      @Nullable List<@Nullable Float> low,
      @Nullable List<@Nullable Float> high,
      @Nullable List<Long> counts) {

    static SeriesDocument of(SeriesName name, Curve curve) {
      return new SeriesDocument(
          name.word(),
          name.xUnit(),
          name.yUnit(),
          curve.start(),
          curve.step(),
          curve.samplesPerPoint(),
          values(curve, false),
          curve.isExact() ? null : values(curve, true),
          null);
    }

    static SeriesDocument of(Series.Histogram histogram) {
      return new SeriesDocument(
          SeriesName.HISTOGRAM.word(),
          SeriesName.HISTOGRAM.xUnit(),
          SeriesName.HISTOGRAM.yUnit(),
          histogram.fromMicroseconds(),
          histogram.widthMicroseconds(),
          1,
          null,
          null,
          java.util.stream.IntStream.range(0, histogram.size())
              .mapToObj(histogram::count)
              .toList());
    }

    private static List<@Nullable Float> values(Curve curve, boolean high) {
      List<@Nullable Float> values = new java.util.ArrayList<>(curve.size());
      for (int i = 0; i < curve.size(); i++) {
        float value = high ? curve.high(i) : curve.low(i);
        values.add(Float.isNaN(value) ? null : value);
      }
      return values;
    }
  }
}
