package turnsheet.shop;

import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.parts.Drive;
import turnsheet.core.diagnose.parts.PartKind;
import turnsheet.core.measure.FigureName;
import turnsheet.testing.Database;

/** The repositories on an empty database, and an invented model to fill them with. */
final class ShopFixture {

  static final Instant NOW = Instant.parse("2026-03-02T09:30:00.123456Z");

  final Clock clock = Clock.fixed(NOW, ZoneOffset.UTC);
  final Customers customers;
  final MachineModels models;
  final Units units;
  final Visits visits;
  final Instruments instruments;
  final Media media;

  ShopFixture(Database database) {
    database.empty();
    customers = new Customers(database.jdbc(), clock);
    models = new MachineModels(database.jdbc(), database.transactions());
    units = new Units(database.jdbc(), database.transactions(), clock);
    visits = visitsAt(database, clock);
    instruments = new Instruments(database.jdbc());
    media = new Media(database.jdbc());
  }

  static Visits visitsAt(Database database, Clock clock) {
    return new Visits(database.jdbc(), database.transactions(), clock);
  }

  /** A tape transport with two speeds, a geared take-up and a limit at each speed. */
  static MachineModel transport(String name) {
    SpeedSetting slow = tape("9.5", 9.525, 400.0);
    SpeedSetting fast = tape("19", 19.05, 800.0);
    return MachineModel.named(name, 120, "")
        .withSetting(slow)
        .withSetting(fast)
        .withPart(new RotatingPart("capstan", PartBasis.DIAMETER_MM, 9.096, null))
        .withPart(new RotatingPart("flywheel idler", PartBasis.TURNS_PER_TURN, 0.25, "capstan"))
        .withPart(new RotatingPart("motor", PartBasis.FIXED_PER_MINUTE, 1450, null))
        .withPart(
            new RotatingPart(
                "reel",
                PartKind.REEL,
                PartBasis.DIAMETER_MM,
                250,
                null,
                PartDetails.ofPack(110, Drive.Winding.TAKES_UP)))
        .withPart(
            new RotatingPart(
                "bearing",
                PartKind.BEARING,
                PartBasis.TURNS_PER_TURN,
                1,
                "capstan",
                new PartDetails(2.0, 8, null, null, null, 4.76, 22.0, 12.5, null, null)))
        .withLimit(
            new ServiceLimit(slow.id(), FigureName.WEIGHTED_TWO_SIGMA, 0.12, "rule of the shop"))
        .withLimit(
            new ServiceLimit(fast.id(), FigureName.WEIGHTED_TWO_SIGMA, 0.06, "rule of the shop"));
  }

  static SpeedSetting tape(String label, double cmPerS, @Nullable Double pulsesPerSecond) {
    return new SpeedSetting(
        SpeedSettingId.next(), label, SpeedUnit.CM_PER_S, cmPerS, 3150.0, pulsesPerSecond);
  }

  static SpeedSetting platter(String label, double revPerMin) {
    return new SpeedSetting(
        SpeedSettingId.next(), label, SpeedUnit.REV_PER_MIN, revPerMin, 3150.0, null);
  }

  Unit unit(String serialNumber) {
    MachineModel model = models.add(transport("Transport for " + serialNumber));
    Customer customer = customers.add("Owner of " + serialNumber, "");
    return units.add(model.id(), customer.id(), serialNumber, "");
  }

  static List<String> serials(PageOf<UnitSummary> page) {
    return page.items().stream().map(s -> s.unit().serialNumber()).toList();
  }
}
