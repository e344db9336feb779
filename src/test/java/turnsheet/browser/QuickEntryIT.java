package turnsheet.browser;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Base64;
import java.util.List;
import java.util.Map;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.By;
import org.openqa.selenium.Keys;
import org.openqa.selenium.WebElement;
import turnsheet.jar.RunningService;
import turnsheet.testing.QrReader;

/**
 * A unit comes in: its label is scanned, three recordings are dropped, one key measures them. Then
 * its books move to another service.
 */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class QuickEntryIT {

  private static final Path SAMPLES = Path.of("sample-uploads").toAbsolutePath();
  private static final String TACHO = "reel-38-tacho-as-received.wav";
  private static final String EDGES = "reel-9-edges-as-received.csv";
  private static final String TONE = "reel-19-tone-as-received.wav";

  private RunningService service;
  private RunningService other;
  private Path folder;
  private Visitor visitor;
  private Hand hand;
  private Audit audit;
  private final List<String> wrong = new ArrayList<>();
  private String unit = "";
  private String code = "";

  @BeforeAll
  void start(@TempDir Path folder) throws Exception {
    this.folder = folder;
    service = RunningService.start("serve", folder.resolve("one"));
    other = RunningService.start("serve", folder.resolve("other"));
    visitor = new Visitor(1280, 900);
    hand = new Hand(visitor);
    audit = new Audit(visitor);
  }

  @AfterAll
  void stop() {
    visitor.close();
    service.close();
    other.close();
  }

  @Test
  void aScannedUnitIsMeasuredAtThreeSpeedsInAFewStrokes() throws Exception {
    aUnitWithThreeSpeedsIsKnown();
    itsLabelIsReadFromTheScreen();
    theCodeTypedOnTheBenchOpensTheUnit();
    threeFilesFindTheirSpeeds();
    oneKeyMeasuresThemAll();
    theBenchShowsWhatWasMeasuredToday();
    labelsPrintInTheirSize();
    new MovedBooks(visitor, audit, folder).move(unit, code, other, wrong);
    // the browser reports the status of the files that are meant to be refused
    visitor.complaints().stream().filter(c -> !c.contains("status of 422")).forEach(wrong::add);
    assertThat(wrong).as(String.join("\n", wrong)).isEmpty();
  }

  private void aUnitWithThreeSpeedsIsKnown() throws Exception {
    FirstRun.of(service, visitor, "Level Turn Bench");
    visitor.open(service.address("/models/new"));
    visitor.fill("name", "Invented three-speed transport");
    visitor.press(visitor.find("form.sheet button"));
    setting("9.5 cm/s", "9.525", "400");
    setting("19 cm/s", "19.05", "800");
    setting("38 cm/s", "38.1", "1600");
    visitor.press(visitor.find("main .actions a.button"));
    visitor.fill("serialNumber", "T-2");
    visitor.fill("customerName", "Customer of the test");
    visitor.find("input[name=newCustomer]").click();
    visitor.pressButton("Enter, then open a visit");
    visitor.press(visitor.all("p.trail a").get(1));
    unit = visitor.address();
    code = visitor.find(".unit-code").getText();
    wrong.addAll(audit.of("/units/{id}, new", 200));
  }

  private void itsLabelIsReadFromTheScreen() throws Exception {
    visitor.press(visitor.find("a[href$='/label']"));
    wrong.addAll(audit.of("/units/{id}/label", 200));
    Object data = visitor.protocol("Page.captureScreenshot", Map.of()).get("data");
    byte[] png = Base64.getDecoder().decode(String.valueOf(data));
    assertThat(QrReader.read(ImageIO.read(new ByteArrayInputStream(png))))
        .endsWith("/u/" + code.replace("-", ""));

    visitor.open(service.address("/u/" + code));
    assertThat(visitor.address()).isEqualTo(unit);
  }

  private void theCodeTypedOnTheBenchOpensTheUnit() {
    visitor.open(service.address("/"));
    WebElement page = visitor.find("html");
    // a scanner types into whatever has the focus and ends with Enter
    visitor.focused().sendKeys(code.toLowerCase(java.util.Locale.ROOT), Keys.ENTER);
    visitor.awaitGone(page);
    assertThat(visitor.address()).isEqualTo(unit);
  }

  private void threeFilesFindTheirSpeeds() {
    WebElement page = visitor.find("html");
    hand.drop(
        visitor.find(".bring"),
        SAMPLES.resolve(TACHO),
        SAMPLES.resolve(EDGES),
        SAMPLES.resolve(TONE));
    visitor.awaitGone(page);

    assertThat(visitor.address()).contains("/visits/");
    assertThat(proposed(TACHO)).isEqualTo("38 cm/s");
    assertThat(proposed(EDGES)).isEqualTo("9.5 cm/s");
    assertThat(proposed(TONE)).isEqualTo("19 cm/s");
    assertThat(row(TONE).getText()).contains("proposed by the name of the file");
    assertThat(row(TACHO).getText()).contains("Proposed by its rate");
    wrong.addAll(audit.of("/visits/{id}, to be confirmed", 200));
  }

  private void oneKeyMeasuresThemAll() {
    WebElement page = visitor.find("html");
    row(TACHO).findElement(By.cssSelector("input[type=text]")).sendKeys(Keys.ENTER);
    visitor.awaitGone(page);

    assertThat(visitor.all("[data-incoming]")).isEmpty();
    visitor.awaitTrue(() -> visitor.all(".item.measured").size() == 3);
    String grid = visitor.find("table.even").getText();
    // the truth of sample-uploads/README.md, to the digits shown whatever the noise
    assertThat(grid).contains("+0.37").contains("\u22120.21").contains("+0.51");
  }

  private void theBenchShowsWhatWasMeasuredToday() {
    visitor.open(service.address("/"));
    assertThat(visitor.find("[aria-labelledby=today]").getText()).contains("T-2").contains("+0.37");
    assertThat(visitor.find("[aria-labelledby=working]").getText())
        .contains("Do the work and note it");
    wrong.addAll(audit.of("/, measured today", 200));
  }

  private void labelsPrintInTheirSize() throws Exception {
    PrintedLabels printed = new PrintedLabels(visitor, code);
    visitor.open(unit + "/label");
    printed.alone("T-2");
    // ISO 216 A4 and ANSI A "Letter" in millimetres
    visitor.open(service.address("/units/labels"));
    printed.sheet(210, 297);
    visitor.open(service.address("/shop/preferences"));
    visitor.choose("paper", "LETTER");
    visitor.press(visitor.find("form.sheet button"));
    visitor.open(service.address("/units/labels"));
    printed.sheet(215.9, 279.4);
  }

  private void setting(String label, String speed, String pulses) {
    if (!visitor.find("input[name=label]").isDisplayed()) {
      visitor.find("#settings summary").click(); // folded once there is a setting
    }
    visitor.fill("label", label);
    visitor.fill("nominalSpeed", speed);
    visitor.fill("toneHz", "3150");
    visitor.fill("pulsesPerSecond", pulses);
    visitor.pressButton("Add a speed setting");
  }

  private String proposed(String file) {
    return row(file).findElement(By.cssSelector("select option:checked")).getText();
  }

  private WebElement row(String file) {
    return visitor.all("[data-incoming]").stream()
        .filter(row -> row.getText().contains(file))
        .findFirst()
        .orElseThrow(() -> new AssertionError("no line of " + file));
  }
}
