package turnsheet.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.Test;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.format.api.Recognised;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Reading;
import turnsheet.core.signal.Warning;
import turnsheet.core.stats.Budget;

class ReadingDocumentTest {

  private static final Figure KNOWN = Figure.of(0.0625, 0.0025);

  @Test
  void writesTheContractToTheLetter() throws IOException {
    assertThat(ReadingDocument.toPrettyJson(edges()) + "\n").isEqualTo(resource("edges.json"));
  }

  @Test
  void givesBackWhatWasWritten() {
    assertThat(ReadingDocument.fromJson(ReadingDocument.toJson(edges()))).isEqualTo(edges());
    assertThat(ReadingDocument.fromJson(ReadingDocument.toPrettyJson(edges()))).isEqualTo(edges());
    assertThat(ReadingDocument.fromJson(ReadingDocument.toJson(tone()))).isEqualTo(tone());
  }

  @Test
  void writesAFigureInFourShapes() {
    assertThat(CoreJson.toJson(KNOWN))
        .isEqualTo("{\"value\":0.0625,\"expandedUncertainty\":0.0025,\"k\":2}");
    assertThat(CoreJson.toJson(new Figure(1.5, 0.25, 2.13, null, List.of())))
        .isEqualTo("{\"value\":1.5,\"expandedUncertainty\":0.25,\"k\":2.13}");
    assertThat(CoreJson.toJson(Figure.withoutUncertainty(1.5, "single value")))
        .isEqualTo(
            "{\"value\":1.5,\"expandedUncertainty\":null,\"k\":null,\"why\":\"single value\"}");
    assertThat(CoreJson.toJson(Figure.absent("too short")))
        .isEqualTo(
            "{\"value\":null,\"expandedUncertainty\":null,\"k\":null,\"why\":\"too short\"}");
  }

  @Test
  void keepsWhatAnUncertaintyIsMadeOf() {
    Figure figure = Figure.of(1.5, Budget.empty().plus("recording clock", 0.25).plus("noise", 0));
    String json = CoreJson.toJson(figure);
    assertThat(json)
        .isEqualTo(
            "{\"value\":1.5,\"expandedUncertainty\":0.5,\"k\":2,\"budget\":["
                + "{\"cause\":\"recording clock\",\"standardUncertainty\":0.25},"
                + "{\"cause\":\"noise\",\"standardUncertainty\":0.0}]}");
    assertThat(CoreJson.fromJson(json, Figure.class)).isEqualTo(figure);
  }

  @Test
  void keepsEveryBitOfANumber() {
    double third = 1.0 / 3;
    Figure figure = Figure.of(third, Double.MIN_NORMAL);
    assertThat(CoreJson.fromJson(CoreJson.toJson(figure), Figure.class)).isEqualTo(figure);
  }

  @Test
  void leavesEdgesNullForATone() {
    assertThat(ReadingDocument.toJson(tone()))
        .contains("\"edges\":null")
        .contains("\"kind\":\"tone\"");
  }

  @Test
  void writesWhatWasRecognisedAndWhatWasDecided() {
    var recognised =
        new Recognised(
            "period list",
            Contents.PERIODS,
            null,
            null,
            List.of(new Recognised.Channel("period", "us")),
            1,
            List.of(new Recognised.Guess("timeUnitSeconds", "microseconds, from the size")),
            List.of());
    String json = CoreJson.toJson(recognised);
    assertThat(json).contains("\"contents\":\"periods\"");
    assertThat(CoreJson.fromJson(json, Recognised.class)).isEqualTo(recognised);

    var options = new ReadOptions(2, Contents.EDGE_TIMES, 1e-6, null);
    assertThat(CoreJson.toJson(options))
        .isEqualTo(
            "{\"channel\":2,\"contents\":\"edgeTimes\",\"timeUnitSeconds\":1.0E-6,"
                + "\"sampleStepSeconds\":null}");
    assertThat(CoreJson.fromJson(CoreJson.toJson(options), ReadOptions.class)).isEqualTo(options);
  }

  @Test
  void passesOverMembersOfALaterVersion() {
    assertThat(
            CoreJson.fromJson(
                "{\"code\":\"a\",\"message\":\"b\",\"since\":{\"deep\":[1]}}", Warning.class))
        .isEqualTo(new Warning("a", "b"));
  }

  @Test
  void refusesWhatIsNoReading() {
    assertThatThrownBy(() -> ReadingDocument.fromJson("{\"source\":"))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageStartingWith("not a Reading");
    assertThatThrownBy(() -> ReadingDocument.fromJson("null"))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> CoreJson.fromJson("{\"startSeconds\":1}", Reading.Dropout.class))
        .isInstanceOf(IllegalArgumentException.class);
  }

  private static Reading edges() {
    Figure none = Figure.absent("the capture is shorter than 5 s");
    return new Reading(
        new Reading.Source("ab".repeat(32), "edge list", CaptureKind.EDGES, 1, null, 60.5),
        new Reading.Method("1", MeasureSettings.edges(1600, 120)),
        new Reading.Speed(
            1600,
            Figure.of(1601, 0.25),
            KNOWN,
            KNOWN,
            KNOWN,
            Figure.withoutUncertainty(0.125, "one stretch only")),
        new Reading.Flutter(
            KNOWN, KNOWN, KNOWN, none, List.of(new Reading.Band("wow", 0.5, 6, KNOWN))),
        List.of(
            new Reading.Line(
                Figure.of(13.25, 0.02), KNOWN, List.of(new Reading.Suspect("capstan", 1, 13.333)))),
        new Reading.Edges(
            96000,
            1,
            2,
            Figure.of(625, 0.5),
            KNOWN,
            KNOWN,
            null,
            KNOWN,
            new Reading.Wheel(120, KNOWN),
            List.of(new Reading.Stability(0.5, KNOWN))),
        new Reading.Signal(
            none,
            List.of(new Reading.MainsLine(50, -42.5)),
            3,
            List.of(new Reading.Dropout(1.5, 0.005)),
            KNOWN),
        List.of(new Warning("quantised", "Edges sit on a grid of 1 \u00b5s.")));
  }

  private static Reading tone() {
    Reading edges = edges();
    return new Reading(
        new Reading.Source("cd".repeat(32), "WAV", CaptureKind.TONE, 2, 48000.0, 30),
        new Reading.Method("1", MeasureSettings.tone(3150).onChannel(2)),
        edges.speed(),
        edges.flutter(),
        List.of(),
        null,
        edges.signal(),
        List.of());
  }

  private static String resource(String name) throws IOException {
    try (InputStream in = ReadingDocumentTest.class.getResourceAsStream(name)) {
      assertThat(in).as(name).isNotNull();
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    }
  }
}
