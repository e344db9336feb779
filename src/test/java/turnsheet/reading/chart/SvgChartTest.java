package turnsheet.reading.chart;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.StringReader;
import java.util.ArrayList;
import java.util.List;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import org.xml.sax.InputSource;

class SvgChartTest {

  private static final Axis SECONDS = Axis.linear("Time", "s", 0, 10);
  private static final Axis PERCENT = Axis.linear("Speed", "%", -1, 1);
  private static final List<TimeMarks.Point> DOTS =
      List.of(TimeMarks.Point.of(1, 0, 0), TimeMarks.Point.of(10, 0, 0.5));

  @Test
  void straightLineRunsFromCornerToCorner() {
    // frame of a drawing 258 high without flags: x 64..746, y 12..212
    String svg =
        new SvgChart(SECONDS, PERCENT, 258, "Speed", "A straight line.")
            .curve(Curve.ofSamples(0, 5, new float[] {-1, 0, 1}))
            .toSvg();

    assertThat(paths(svg, "drawn-series series-1")).containsExactly("M64 212L405 112L746 12");
  }

  @Test
  void aLongNameOfTheUprightAxisIsSetSmallerInTheMiddleRatherThanCut() {
    Axis wordy = Axis.linear("A name of the upright axis of forty-seven letters", "%", -1, 1);
    assertThat(wordy.title()).hasSize(52);
    String svg = new SvgChart(SECONDS, wordy, 258, "Speed", "Nothing.").toSvg();

    // 258 - 8 are there for 52 letters of 6.6 each: 12 * 250 / 343.2 = 8.7
    assertThat(svg).contains("font-size=\"8.7\" transform=\"rotate(-90 14 129)\"");
    assertThat(new SvgChart(SECONDS, PERCENT, 258, "Speed", "Nothing.").toSvg())
        .contains("fill=\"currentColor\" transform=\"rotate(-90 14 112)\"");
  }

  @Test
  void bucketsAreDrawnFromLowestToHighest() {
    String svg =
        new SvgChart(SECONDS, PERCENT, 258, "Speed", "Two buckets.")
            .curve(Curve.ofBuckets(0, 10, 4, new float[] {-1, -0.5f}, new float[] {0, 1}))
            .toSvg();

    assertThat(paths(svg, "drawn-series series-1"))
        .containsExactly("M64 212L64 112L746 162L746 12");
  }

  @Test
  void gapsLiftThePen() {
    String svg =
        new SvgChart(SECONDS, PERCENT, 258, "Speed", "A gap.")
            .curve(Curve.ofSamples(0, 5, new float[] {0, Float.NaN, 0}))
            .toSvg();

    assertThat(paths(svg, "drawn-series series-1")).containsExactly("M64 112M746 112");
  }

  @Test
  void logarithmicAxisGivesEachDecadeTheSameRoom() {
    Axis rate = Axis.logarithmic("Rate", "Hz", 0.1, 1000);
    String svg =
        new SvgChart(rate, PERCENT, 258, "Spectrum", "Dots.")
            .mark(TimeMarks.join(DOTS))
            .mark(TimeMarks.dots(1, DOTS))
            .toSvg();

    // four decades over 682 units: 64 + 170.5 and 64 + 341
    assertThat(paths(svg, "drawn-join")).containsExactly("M234.5 112L405 112");
    assertThat(attributes(svg, "circle", "drawn-dot series-1", "cx"))
        .containsExactly("234.5", "405");
    // the bar of 0.5 on either side of the middle is 50 long each way
    assertThat(paths(svg, "drawn-uncertainty")).containsExactly("M401 162h8m-4 0V62m-4 0h8");
    assertThat(rate.ticks(8)).extracting(Axis.Tick::text).contains("0.1", "1", "10", "1000");
  }

  @Test
  void aBandRunsAboutItsLineAndStaysInTheFrame() {
    String svg =
        new SvgChart(SECONDS, PERCENT, 258, "Speed", "A band.")
            .mark(TimeMarks.band(0, 10, x -> -1 + x / 5, x -> 0.5))
            .mark(TimeMarks.visits(-1, List.of(5.0)))
            .toSvg();

    // the line from corner to corner; the band half the height about it, cut at the frame
    assertThat(paths(svg, "drawn-trend")).containsExactly("M64 212L746 12");
    assertThat(paths(svg, "drawn-band").get(0)).startsWith("M64 162L").endsWith("L64 212Z");
    assertThat(paths(svg, "drawn-band").get(0)).contains("L746 12L746 62L");
    assertThat(paths(svg, "drawn-visit")).containsExactly("M405 212l-4 -8h8z");
  }

  @Test
  void ticksAreRoundAndInsideTheAxis() {
    assertThat(Axis.linear("a", "%", -0.07, 0.23).ticks(6))
        .extracting(Axis.Tick::text)
        .containsExactly("\u22120.05", "0", "0.05", "0.10", "0.15", "0.20");
    assertThat(Axis.linear("a", "s", 0, 3600).ticks(8))
        .extracting(Axis.Tick::text)
        .containsExactly("0", "500", "1000", "1500", "2000", "2500", "3000", "3500");
  }

  @Test
  void axisAroundEqualValuesStillHasAnExtent() {
    assertThat(Axis.around("a", "%", 0.5, 0.5).holds(0.5)).isTrue();
    assertThat(Axis.around("a", "%", 0, 0).to()).isEqualTo(1);
    assertThat(Axis.around("a", "%", Double.NaN).from()).isEqualTo(0);
  }

  @Test
  void limitOutsideTheDrawingIsLeftOut() {
    SvgChart chart = new SvgChart(SECONDS, PERCENT, 258, "Speed", "Limits.");
    String svg = chart.limit(0.5, "upper limit").limit(2, "far away").toSvg();

    assertThat(paths(svg, "drawn-limit")).containsExactly("M64 62H746");
    assertThat(svg).doesNotContain("far away");
  }

  @Test
  void neighbouringFlagsStandInDifferentRows() {
    SvgChart chart = new SvgChart(SECONDS, PERCENT, 300, "Spectrum", "Flags.");
    chart.flag(2, 0, "2.00 Hz motor shaft").flag(2.2, 0, "2.20 Hz idler").flag(9, 0, "9 Hz");

    assertThat(texts(chart.toSvg(), "drawn-flag")).containsExactly("12", "27", "12");
  }

  @Test
  void namesWithMarkupStayText() throws Exception {
    String svg =
        new SvgChart(SECONDS, PERCENT, 258, "<script>", "a & \"b\"").limit(0, "x < y").toSvg();

    assertThat(svg).doesNotContain("<script>");
    assertThat(parse(svg).getElementsByTagName("title").item(0).getTextContent())
        .isEqualTo("<script>");
    assertThat(svg).doesNotContain("style=");
  }

  private static List<String> paths(String svg, String look) {
    return attributes(svg, "path", look, "d");
  }

  private static List<String> texts(String svg, String look) {
    return attributes(svg, "text", look, "y");
  }

  private static List<String> attributes(String svg, String tag, String look, String name) {
    List<String> found = new ArrayList<>();
    NodeList elements = parse(svg).getElementsByTagName(tag);
    for (int i = 0; i < elements.getLength(); i++) {
      Element element = (Element) elements.item(i);
      if (look.equals(element.getAttribute("class"))) {
        found.add(element.getAttribute(name));
      }
    }
    return found;
  }

  private static Element parse(String svg) {
    try {
      return DocumentBuilderFactory.newInstance()
          .newDocumentBuilder()
          .parse(new InputSource(new StringReader(svg)))
          .getDocumentElement();
    } catch (Exception e) {
      throw new AssertionError("not well formed: " + svg, e);
    }
  }
}
