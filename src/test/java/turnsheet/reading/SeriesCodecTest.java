package turnsheet.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalStateException;

import org.junit.jupiter.api.Test;
import turnsheet.core.measure.Series;
import turnsheet.reading.chart.Curve;

class SeriesCodecTest {

  @Test
  void shortCurveComesBackBitForBit() {
    Curve curve = Curve.ofSamples(0.25, 0.001, new float[] {0.1f, -0.2f, Float.NaN, 1e-30f});
    Curve back = SeriesCodec.decodeCurve(SeriesCodec.encode(curve));

    assertThat(back.start()).isEqualTo(0.25);
    assertThat(back.step()).isEqualTo(0.001);
    assertThat(back.isExact()).isTrue();
    assertThat(back.size()).isEqualTo(4);
    for (int i = 0; i < 4; i++) {
      assertThat(Float.floatToIntBits(back.low(i))).isEqualTo(Float.floatToIntBits(curve.low(i)));
      assertThat(Float.floatToIntBits(back.high(i))).isEqualTo(Float.floatToIntBits(curve.low(i)));
    }
  }

  @Test
  void longCurveIsKeptAsLowestAndHighest() {
    float[] values = new float[SeriesCodec.MOST_POINTS + 1];
    values[77] = 5;
    values[200_000] = -4;
    byte[] content = SeriesCodec.encode(Curve.ofSamples(0, 1, values));
    Curve back = SeriesCodec.decodeCurve(content);

    assertThat(content.length).isLessThan(2 * 1024 * 1024 + 64);
    assertThat(back.samplesPerPoint()).isEqualTo(2);
    assertThat(back.high(38)).isEqualTo(5);
    assertThat(back.low(100_000)).isEqualTo(-4);
  }

  @Test
  void histogramComesBack() {
    Series.Histogram back =
        SeriesCodec.decodeHistogram(
            SeriesCodec.encode(new Series.Histogram(1666.5, 0.25, new long[] {0, 7, 1L << 40})));

    assertThat(back.fromMicroseconds()).isEqualTo(1666.5);
    assertThat(back.widthMicroseconds()).isEqualTo(0.25);
    assertThat(back.size()).isEqualTo(3);
    assertThat(back.count(2)).isEqualTo(1L << 40);
  }

  @Test
  void doesNotTakeAHistogramForACurve() {
    byte[] histogram = SeriesCodec.encode(new Series.Histogram(0, 1, new long[] {1}));

    assertThatIllegalStateException().isThrownBy(() -> SeriesCodec.decodeCurve(histogram));
  }
}
