package turnsheet.capture;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MediumId;
import turnsheet.shop.ReferenceMedium;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.SpeedUnit;

/** On the sample recordings, which come from transports of known speeds. */
class SettingFinderTest {

  @TempDir Path data;
  private @Nullable CaptureStore store;

  @BeforeEach
  void open() throws IOException {
    store = new CaptureStore(data, new IncomingFolder(data, Clock.systemUTC()));
  }

  @Test
  void tachometersTellTheSettingByTheirRate() throws IOException {
    MachineModel model = transport(3150.0, 3150.0, 3150.0);
    assertThat(find("reel-38-tacho-as-received.wav", "take.wav", model)).isEqualTo("38 RATE");
    assertThat(find("reel-9-edges-as-received.csv", "take.csv", model)).isEqualTo("9.5 RATE");
    assertThat(find("reel-9-periods-after-repair.txt", "take.txt", model)).isEqualTo("9.5 RATE");
  }

  @Test
  void aToneThatEverySettingPlaysIsToldByTheNameOrNotAtAll() throws IOException {
    MachineModel model = transport(3150.0, 3150.0, 3150.0);
    String file = "reel-19-tone-as-received.wav";
    assertThat(find(file, file, model)).isEqualTo("19 NAME");
    assertThat(find(file, "tape 9,5 left.wav", model)).isEqualTo("9.5 NAME");
    assertThat(find(file, "take.wav", model)).isEqualTo("9.5 SEVERAL");
    assertThat(find(file, "9 and 19.wav", model)).isEqualTo("9.5 SEVERAL");
    // 190 is another number than 19
    assertThat(find(file, "take 190.wav", model)).isEqualTo("9.5 SEVERAL");
  }

  @Test
  void tonesThatDifferTellTheSetting() throws IOException {
    String file = "reel-19-tone-as-received.wav";
    assertThat(find(file, "take.wav", transport(1575.0, 3150.0, 6300.0))).isEqualTo("19 RATE");
    assertThat(find(file, "38.wav", transport(1575.0, 3150.0, 6300.0))).isEqualTo("19 RATE");
    // 11.9 % from the recorded 3161.65 Hz, and 12.1 % from it
    assertThat(find(file, "a.wav", transport(100.0, 2825.4, 9000.0))).isEqualTo("19 RATE");
    assertThat(find(file, "a.wav", transport(100.0, 2820.4, 9000.0))).isEqualTo("9.5 NONE");
  }

  @Test
  void theToneOfTheMediumCountsBeforeTheSettings() throws IOException {
    ReferenceMedium tape =
        new ReferenceMedium(MediumId.next(), "Another tape", 1000.0, 0.1, null, "");
    assertThat(
            find("reel-19-tone-as-received.wav", "a.wav", transport(1575.0, 3150.0, 6300.0), tape))
        .isEqualTo("9.5 NONE");
  }

  @Test
  void theOnlySettingIsTheOne() throws IOException {
    MachineModel single = MachineModel.named("One", null, "").withSetting(setting("4.7", 4.7625));
    assertThat(find("reel-38-tacho-as-received.wav", "a.wav", single)).isEqualTo("4.7 ONLY");
  }

  @Test
  void nothingIsFoundForWhatCannotBeUsed() throws IOException {
    MachineModel model = transport(3150.0, 3150.0, 3150.0);
    StoredBytes bytes = keep("renamed-zip.wav");
    assertThat(text(finder().find(bytes, null, "19.wav", model, null))).isEqualTo("9.5 NONE");
  }

  private String find(String sample, String called, MachineModel model) throws IOException {
    return find(sample, called, model, null);
  }

  private String find(
      String sample, String called, MachineModel model, @Nullable ReferenceMedium medium)
      throws IOException {
    StoredBytes bytes = keep(sample);
    Looker.Result result =
        new Looker(store(), CaptureFormats.standard()).look(bytes, ReadOptions.none(), null, null);
    Looked looked = ((Looker.Seen) result).looked();
    return text(finder().find(bytes, looked, called, model, medium));
  }

  private static String text(SettingFinder.Found found) {
    return found.setting().label() + " " + found.fit();
  }

  private SettingFinder finder() {
    return new SettingFinder(store(), CaptureFormats.standard());
  }

  private StoredBytes keep(String sample) throws IOException {
    try (InputStream in = Files.newInputStream(Path.of("sample-uploads", sample))) {
      return store().receive(in);
    }
  }

  private CaptureStore store() {
    return java.util.Objects.requireNonNull(store);
  }

  private static MachineModel transport(double slow, double middle, double fast) {
    return MachineModel.named("Three speeds", null, "")
        .withSetting(setting("9.5", 9.525, slow, 400))
        .withSetting(setting("19", 19.05, middle, 800))
        .withSetting(setting("38", 38.1, fast, 1600));
  }

  private static SpeedSetting setting(String label, double cm, double tone, double pulses) {
    return new SpeedSetting(SpeedSettingId.next(), label, SpeedUnit.CM_PER_S, cm, tone, pulses);
  }

  private static SpeedSetting setting(String label, double cm) {
    return new SpeedSetting(SpeedSettingId.next(), label, SpeedUnit.CM_PER_S, cm, null, null);
  }
}
