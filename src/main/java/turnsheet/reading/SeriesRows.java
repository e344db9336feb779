package turnsheet.reading;

import java.util.Optional;
import org.springframework.jdbc.core.simple.JdbcClient;
import turnsheet.core.measure.Series;
import turnsheet.core.signal.Fluctuation;
import turnsheet.reading.chart.Curve;

/** What readings keep beside their figures: curves, histograms and blocks, one row each. */
final class SeriesRows {

  private final JdbcClient jdbc;

  SeriesRows(JdbcClient jdbc) {
    this.jdbc = jdbc;
  }

  Optional<Curve> curve(ReadingId id, SeriesName name) {
    if (name == SeriesName.HISTOGRAM) {
      throw new IllegalArgumentException("a histogram is no curve");
    }
    return content(id, name.word()).map(SeriesCodec::decodeCurve);
  }

  Optional<Series.Histogram> histogram(ReadingId id) {
    return content(id, SeriesName.HISTOGRAM.word()).map(SeriesCodec::decodeHistogram);
  }

  Optional<Fluctuation> fluctuation(ReadingId id) {
    return content(id, KeptSeries.FLUCTUATION).map(SeriesCodec::decodeFluctuation);
  }

  Optional<Series.Blocks> blocks(ReadingId id) {
    return content(id, KeptSeries.FLUCTUATION_BLOCKS)
        .flatMap(
            fluctuation ->
                content(id, KeptSeries.INDICATION_BLOCKS)
                    .map(
                        indication ->
                            new Series.Blocks(
                                SeriesCodec.decodeBlocks(fluctuation),
                                SeriesCodec.decodeBlocks(indication))));
  }

  /** A reading that came with an import has none before its capture is measured again. */
  void addWhereNone(ReadingId id, KeptSeries series) {
    long kept =
        jdbc.sql("select count(*) from reading_series where reading_id = ?")
            .param(id.value())
            .query(Long.class)
            .single();
    if (kept == 0) {
      series.contents().forEach((name, content) -> addSeries(id, name, content));
    }
  }

  private void addSeries(ReadingId id, String name, byte[] content) {
    jdbc.sql("insert into reading_series values (:reading, :name, :content)")
        .param("reading", id.value())
        .param("name", name)
        .param("content", content)
        .update();
  }

  private Optional<byte[]> content(ReadingId id, String name) {
    return jdbc.sql("select content from reading_series where reading_id = ? and name = ?")
        .params(id.value(), name)
        .query((row, number) -> row.getBytes(1))
        .optional();
  }
}
