package turnsheet.web;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PlainTextTest {

  @ParameterizedTest
  @ValueSource(
      strings = {
        "\0", "\u0001", "\u000b", "\u001b", "\u007f", "\u0085", "\ufffe", "\uffff", "\ud83d"
      })
  void dropsWhatXmlOrADatabaseCannotHold(String odd) {
    assertThat(PlainText.typed("belt" + odd + " slack")).isEqualTo("belt slack");
  }

  @Test
  void keepsLinesTabsAndEveryScript() {
    String text = "größer\n\tβ ≤ 0,1 %\n車 \ud83d\udd27";
    assertThat(PlainText.typed(text)).isEqualTo(text);
  }

  @Test
  void takesLineEndsOfAllSystemsForOne() {
    assertThat(PlainText.typed(" a\r\nb\rc\n ")).isEqualTo("a\nb\nc");
  }

  @Test
  void nothingSentIsEmpty() {
    assertThat(PlainText.typed(null)).isEmpty();
  }
}
