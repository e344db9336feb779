package turnsheet.shop;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.Locale;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

class UnitCodeTest {

  private static final String ALPHABET = "23456789ABCDEFGHJKMNPQRSTUVWX";

  @Test
  void isEightCharactersThatDoNotLookAlike() {
    assertThat(Stream.generate(UnitCode::next).limit(500))
        .allMatch(code -> code.letters().matches("[2-9A-HJKMNP-X]{8}"))
        .doesNotHaveDuplicates();
  }

  /**
   * By hand: places 0 to 6 weighted 1 to 7 make 112; 112 + 8 * 15 = 232 = 8 * 29: place 15, that of
   * H.
   */
  @Test
  void checksAsDocumented() {
    assertThat(112 + 8 * ALPHABET.indexOf('H')).isEqualTo(232);
    assertThat(new UnitCode("2345678H").grouped()).isEqualTo("2345-678H");
    assertThatThrownBy(() -> new UnitCode("2345678J")).isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void everySingleSlipIsNoticed() {
    String good = UnitCode.next().letters();
    for (int at = 0; at < UnitCode.LENGTH; at++) {
      for (int i = 0; i < ALPHABET.length(); i++) {
        char other = ALPHABET.charAt(i);
        if (other != good.charAt(at)) {
          String slip = good.substring(0, at) + other + good.substring(at + 1);
          assertThat(UnitCode.in(slip)).as(slip).isEmpty();
        }
      }
    }
  }

  @Test
  void everySwapOfTwoIsNoticed() {
    String good = UnitCode.next().letters();
    for (int i = 0; i < UnitCode.LENGTH; i++) {
      for (int j = i + 1; j < UnitCode.LENGTH; j++) {
        char[] swapped = good.toCharArray();
        swapped[i] = good.charAt(j);
        swapped[j] = good.charAt(i);
        if (good.charAt(i) != good.charAt(j)) {
          assertThat(UnitCode.in(new String(swapped))).isEmpty();
        }
      }
    }
  }

  @Test
  void isReadFromWhatPeopleTypeAndScannersSend() {
    UnitCode code = UnitCode.next();
    assertThat(UnitCode.in(code.letters())).contains(code);
    assertThat(UnitCode.in(" " + code.grouped().toLowerCase(Locale.ROOT) + " ")).contains(code);
    assertThat(UnitCode.in("https://bench.example/u/" + code)).contains(code);
    // a scanner set to another keyboard than the computer's
    assertThat(UnitCode.in("httpsÖ--bench.example-u-" + code)).contains(code);
    assertThat(UnitCode.in("unit " + code)).isEmpty();
    assertThat(UnitCode.in("")).isEmpty();
  }
}
