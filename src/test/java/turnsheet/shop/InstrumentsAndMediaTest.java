package turnsheet.shop;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.time.LocalDate;
import org.junit.jupiter.api.Test;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class InstrumentsAndMediaTest {

  private final Instruments instruments;
  private final Media media;

  InstrumentsAndMediaTest(Database database) {
    ShopFixture shop = new ShopFixture(database);
    instruments = shop.instruments;
    media = shop.media;
  }

  @Test
  void readsBackAnInstrumentWithAndWithoutACheck() {
    BenchInstrument checked =
        instruments.add(
            new BenchInstrument(
                InstrumentId.next(), "Sound card", -12.5, 1.0, LocalDate.of(2026, 2, 1), ""));
    BenchInstrument unchecked =
        instruments.add(new BenchInstrument(InstrumentId.next(), "Logger", 0, null, null, "old"));
    assertThat(instruments.find(checked.id())).contains(checked);
    assertThat(instruments.all()).containsExactly(unchecked, checked);
    assertThat(checked.clockStandardUncertaintyPpm()).isEqualTo(0.5);
    assertThat(unchecked.clockStandardUncertaintyPpm())
        .isEqualTo(MeasureSettings.UNCHECKED_CLOCK_PPM);
  }

  @Test
  void changesAnInstrumentAndRefusesATakenName() {
    BenchInstrument card =
        instruments.add(new BenchInstrument(InstrumentId.next(), "Card", 0, null, null, ""));
    instruments.add(new BenchInstrument(InstrumentId.next(), "Logger", 0, null, null, ""));
    BenchInstrument better = new BenchInstrument(card.id(), "Card", 3, 2.0, null, "checked");
    assertThat(instruments.change(better)).contains(better);
    assertThat(instruments.find(card.id())).contains(better);
    assertThatThrownBy(
            () -> instruments.change(new BenchInstrument(card.id(), "Logger", 0, null, null, "")))
        .hasMessageContaining("instrumentNameTaken");
    assertThat(
            instruments.change(
                new BenchInstrument(InstrumentId.next(), "Ghost", 0, null, null, "")))
        .isEmpty();
  }

  @Test
  void readsBackMediaAndRefusesATakenName() {
    ReferenceMedium tape =
        media.add(new ReferenceMedium(MediumId.next(), "Test tape", 3150.0, 0.2, 0.02, ""));
    ReferenceMedium disc =
        media.add(new ReferenceMedium(MediumId.next(), "Test record", null, 0.5, null, "worn"));
    assertThat(media.all()).containsExactly(disc, tape);
    assertThat(media.find(disc.id())).contains(disc);
    assertThat(media.page(new PageQuery("tape", 1, 5)).items()).containsExactly(tape);
    assertThatThrownBy(
            () -> media.add(new ReferenceMedium(MediumId.next(), "Test tape", null, 1, null, "")))
        .hasMessageContaining("mediumNameTaken");
  }

  /** JCGM 100:2008, 4.3.7: a half width a, rectangular, has the variance a squared over 3. */
  @Test
  void takesTheToleranceOfAMediumAsRectangular() {
    ReferenceMedium tape = new ReferenceMedium(MediumId.next(), "Test tape", 3150.0, 0.2, 0.02, "");
    // a few roundings of double
    assertThat(Math.pow(tape.speedStandardUncertaintyPercent(), 2))
        .isCloseTo(0.04 / 3, within(1e-15));
  }
}
