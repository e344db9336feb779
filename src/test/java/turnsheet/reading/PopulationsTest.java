package turnsheet.reading;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.Clock;
import java.time.Instant;
import java.util.List;
import org.junit.jupiter.api.Test;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.Unit;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class PopulationsTest {

  private static final Instant THEN = Instant.parse("2024-05-01T10:00:00Z");
  private static final Instant LATER = Instant.parse("2025-05-01T10:00:00Z");

  private final Readings readings;
  private final Populations populations;
  private final SampleBench bench;

  PopulationsTest(Database database) {
    database.empty();
    Clock clock = Clock.systemUTC();
    readings = new Readings(database.jdbc(), database.transactions(), clock);
    populations = new Populations(database.jdbc());
    bench = new SampleBench(database.jdbc(), database.transactions(), clock);
  }

  @Test
  void countsTheNewestReadingOfEachUnitOnce() {
    for (int i = 1; i <= 4; i++) {
      Unit unit = bench.anotherUnit("10" + i);
      measured(unit, THEN, 0.9);
      measured(unit, LATER, 0.01 * i);
    }
    bench.capture("as received", "recognised");

    List<Population> ofSetting = populations.ofSetting(bench.setting);
    Population found = Populations.of(ofSetting, FigureName.WEIGHTED_TWO_SIGMA).orElseThrow();
    assertThat(found.values()).containsExactly(0.01, 0.02, 0.03, 0.04);
    // by hand for 1, 2, 3, 4: quartiles at 1.75 and 3.25
    assertThat(found.lowerQuartile()).isCloseTo(0.0175, within(1e-15));
    assertThat(found.median()).isCloseTo(0.025, within(1e-15));
    assertThat(found.upperQuartile()).isCloseTo(0.0325, within(1e-15));
    assertThat(populations.ofModel(bench.model.id())).isEqualTo(ofSetting);
    // a figure that no reading has
    assertThat(Populations.of(ofSetting, FigureName.DRIFT)).isEmpty();
    assertThat(populations.ofSetting(SpeedSettingId.next())).isEmpty();
  }

  @Test
  void aNewMethodsReadingTakesThePlaceOfTheOldOne() {
    var capture = bench.capture(bench.pastVisit(bench.unit, THEN), "as received", "measured", THEN);
    readings.add(capture, SampleReadings.tone(0.1, 0.05), SampleReadings.series());
    readings.add(capture, SampleReadings.tone(0.1, 0.06), SampleReadings.series());

    Population found =
        Populations.of(populations.ofSetting(bench.setting), FigureName.WEIGHTED_TWO_SIGMA)
            .orElseThrow();
    assertThat(found.values()).containsExactly(0.06);
    assertThat(found.hasQuartiles()).isFalse();
  }

  private void measured(Unit unit, Instant at, double twoSigmaPercent) {
    readings.add(
        bench.capture(bench.pastVisit(unit, at), "as received", "measured", at),
        SampleReadings.tone(0.1, twoSigmaPercent),
        SampleReadings.series());
  }
}
