package turnsheet.shop;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import turnsheet.core.measure.FigureName;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class MachineModelsTest {

  private final Database database;
  private final ShopFixture shop;
  private final MachineModels models;

  MachineModelsTest(Database database) {
    this.database = database;
    shop = new ShopFixture(database);
    models = shop.models;
  }

  @Test
  void readsBackWhatWasAdded() {
    MachineModel added = models.add(ShopFixture.transport("Transport"));
    assertThat(models.find(added.id())).contains(added);
    assertThat(models.ofSetting(added.settings().get(1).id())).contains(added);
    assertThat(models.find(ModelId.next())).isEmpty();
  }

  @Test
  void refusesANameThatIsTaken() {
    models.add(ShopFixture.transport("Transport"));
    MachineModel other = models.add(ShopFixture.transport("Other"));
    assertRefused("modelNameTaken", () -> models.add(ShopFixture.transport("Transport")));
    assertRefused(
        "modelNameTaken", () -> models.change(other.id(), m -> m.describe("Transport", null, "")));
    assertThat(models.find(other.id())).contains(other);
  }

  @Test
  void replacesPartsAndLimitsAndKeepsSettings() {
    MachineModel old = models.add(ShopFixture.transport("Transport"));
    SpeedSettingId slow = old.settings().get(0).id();
    MachineModel changed =
        models
            .change(
                old.id(),
                m ->
                    m.describe("Transport II", null, "no wheel")
                        .changePart(
                            "capstan", new RotatingPart("shaft", PartBasis.DIAMETER_MM, 9, null))
                        .withSetting(ShopFixture.tape("38", 38.1, null))
                        .withoutLimit(m.limits().get(0))
                        .withLimit(new ServiceLimit(slow, FigureName.DEVIATION, 0.3, "manual")))
            .orElseThrow();
    assertThat(models.find(old.id())).contains(changed);
    assertThat(changed.part("flywheel idler")).map(RotatingPart::referencePart).contains("shaft");
  }

  @Test
  void letsTwoSettingsSwapTheirLabels() {
    MachineModel old = models.add(ShopFixture.transport("Transport"));
    SpeedSetting slow = old.settings().get(0);
    SpeedSetting fast = old.settings().get(1);
    MachineModel swapped =
        new MachineModel(
            old.id(),
            old.name(),
            old.pulsesPerTurn(),
            old.note(),
            List.of(labelled(slow, fast.label()), labelled(fast, slow.label())),
            old.parts(),
            old.limits());
    models.change(old.id(), m -> swapped);
    assertThat(models.find(old.id())).contains(swapped);
  }

  @Test
  void keepsASettingThatCapturesWereMadeAt() {
    Unit unit = shop.unit("1001");
    Captures.insertOne(database, shop, unit);
    MachineModel model = models.find(unit.modelId()).orElseThrow();
    assertRefused(
        "settingHasCaptures",
        () -> models.change(model.id(), m -> m.withoutSetting(m.settings().get(0).id())));
    assertThat(models.find(model.id())).contains(model);
    MachineModel smaller =
        models.change(model.id(), m -> m.withoutSetting(m.settings().get(1).id())).orElseThrow();
    assertThat(models.find(model.id())).contains(smaller);
    assertThat(smaller.limits()).hasSize(1);
  }

  @Test
  void losesNoPartWhenTwoPeopleAddAtOnce() throws Exception {
    MachineModel model = models.add(MachineModel.named("Transport", null, ""));
    ExecutorService people = Executors.newFixedThreadPool(2);
    for (int i = 0; i < 8; i++) {
      RotatingPart part = new RotatingPart("roller " + i, PartBasis.DIAMETER_MM, 8, null);
      people.execute(() -> models.change(model.id(), m -> m.withPart(part)));
    }
    people.shutdown();
    assertThat(people.awaitTermination(30, TimeUnit.SECONDS)).isTrue();
    assertThat(models.find(model.id()).orElseThrow().parts()).hasSize(8);
  }

  @Test
  void listsModelsWithWhatBelongsToThem() {
    Unit unit = shop.unit("1001");
    models.add(MachineModel.named("A bare one", 12, ""));
    assertThat(models.page(PageQuery.first(10)).items())
        .extracting(
            ModelSummary::name,
            ModelSummary::settings,
            ModelSummary::parts,
            ModelSummary::limits,
            ModelSummary::units)
        .containsExactly(
            org.assertj.core.groups.Tuple.tuple("A bare one", 0, 0, 0, 0),
            org.assertj.core.groups.Tuple.tuple("Transport for 1001", 2, 5, 2, 1));
    assertThat(models.wholePage(new PageQuery("transport", 1, 10)).items())
        .containsExactly(models.find(unit.modelId()).orElseThrow());
  }

  private static SpeedSetting labelled(SpeedSetting setting, String label) {
    return new SpeedSetting(
        setting.id(),
        label,
        setting.unit(),
        setting.nominalSpeed(),
        setting.toneHz(),
        setting.pulsesPerSecond());
  }

  private static void assertRefused(
      String code, org.assertj.core.api.ThrowableAssert.ThrowingCallable call) {
    assertThatThrownBy(call)
        .isInstanceOfSatisfying(
            RefusedChangeException.class, e -> assertThat(e.code()).isEqualTo(code));
  }
}
