package turnsheet.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;
import turnsheet.testing.QrReader;

class QrDrawingTest {

  @Test
  void theDrawnPathIsReadBack() throws Exception {
    for (String text :
        new String[] {
          "x", "https://bench.example/u/2345678H", "https://a.example/" + "b".repeat(900)
        }) {
      QrDrawing drawing = QrDrawing.of(text);
      assertThat(QrReader.read(drawing.modules(), drawing.path())).isEqualTo(text);
    }
  }

  @Test
  void refusesWhatItCannotHold() {
    assertThatThrownBy(() -> QrDrawing.of("\u00e4")).isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> QrDrawing.of("x".repeat(4000)))
        .isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void leavesTheBorderEmptyThatTheStandardAsksFor() {
    QrDrawing drawing = QrDrawing.of("https://bench.example/u/2345678H");
    boolean[][] dark = QrReader.pixels(drawing.modules(), drawing.path());
    for (int i = 0; i < drawing.modules(); i++) {
      for (int border = 0; border < 4; border++) {
        assertThat(dark[border][i] || dark[i][border]).isFalse();
        assertThat(dark[drawing.modules() - 1 - border][i]).isFalse();
        assertThat(dark[i][drawing.modules() - 1 - border]).isFalse();
      }
    }
    assertThat(dark[4][4]).isTrue();
  }
}
