package turnsheet.shop;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class FittedPartTest {

  @Test
  void linesAreReadAsPeopleWriteThem() {
    assertThat(FittedPart.read("2 x drive belt\n\n  3× screw M2\n10*washer\ngrease"))
        .containsExactly(
            new FittedPart("drive belt", 2),
            new FittedPart("screw M2", 3),
            new FittedPart("washer", 10),
            new FittedPart("grease", null));
  }

  @Test
  void aNumberThatCountsNothingStaysInTheName() {
    assertThat(FittedPart.read("6205 bearing\n0 x nothing\n2x\nXLR plug"))
        .extracting(FittedPart::name)
        .containsExactly("6205 bearing", "0 x nothing", "2x", "XLR plug");
  }

  @Test
  void whatIsWrittenIsReadBack() {
    List<FittedPart> parts = FittedPart.read("2 x belt\ngrease");
    assertThat(FittedPart.written(parts)).isEqualTo("2 × belt\ngrease");
    assertThat(FittedPart.read(FittedPart.written(parts))).isEqualTo(parts);
  }
}
