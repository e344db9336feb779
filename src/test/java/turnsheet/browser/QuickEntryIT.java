package turnsheet.browser;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Base64;
import java.util.List;
import java.util.Map;
import java.util.regex.Pattern;
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
  private static final String PASSWORD = "a long road home 47";

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
    theBooksOfTheUnitMoveToAnotherService();
    // the browser reports the status of the files that are meant to be refused
    visitor.complaints().stream().filter(c -> !c.contains("status of 422")).forEach(wrong::add);
    assertThat(wrong).as(String.join("\n", wrong)).isEmpty();
  }

  private void aUnitWithThreeSpeedsIsKnown() throws Exception {
    setUp(service, "Level Turn Bench");
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

  private void theBooksOfTheUnitMoveToAnotherService() throws Exception {
    visitor.open(unit);
    visitor.press(visitor.find("main .actions a[href*='/export']"));
    visitor.protocol(
        "Browser.setDownloadBehavior",
        Map.of("behavior", "allow", "downloadPath", folder.toString()));
    visitor.find("dl.facts a[href*='/export.json']").click();
    String id = unit.substring(unit.lastIndexOf('/') + 1);
    Path books = folder.resolve("turnsheet-" + id + ".json");
    // the browser gives the file its name once it is whole
    visitor.awaitTrue(() -> Files.exists(books));
    Path torn = folder.resolve("torn.json");
    String whole = Files.readString(books);
    Files.writeString(torn, whole.substring(0, whole.indexOf("\"readings\"") + 500));

    visitor.forgetSession(); // a browser keeps one session for all ports of a host
    setUp(other, "Second Bench");
    visitor.open(other.address("/shop"));
    visitor.press(visitor.find("main a[href='/export']"));
    bring(SAMPLES.resolve("renamed-zip.wav"));
    assertThat(visitor.find("[role=alert]").getText())
        .contains("This is no export of this service")
        .contains("Nothing of the file was taken in");
    wrong.addAll(audit.of("/import, refused", 422));
    bring(torn);
    assertThat(visitor.find("[role=alert]").getText())
        .contains("breaks off")
        .contains("Nothing of the file was taken in");
    visitor.open(other.address("/units"));
    assertThat(visitor.all("main .empty")).hasSize(1);
    visitor.open(other.address("/models"));
    assertThat(visitor.all("main .empty")).hasSize(1);

    visitor.open(other.address("/import"));
    bring(books);
    assertThat(visitor.find("[role=status]").getText()).contains("Everything in");
    visitor.open(other.address("/units/" + id));
    assertThat(visitor.find(".unit-code").getText()).isEqualTo(code);
    visitor.press(visitor.find("main a[href*='/visits/']"));
    assertThat(visitor.find("table.even").getText()).contains("+0.37", "\u22120.21", "+0.51");
    bring(other.address("/import"), torn);
    visitor.open(other.address("/units/" + id));
    assertThat(visitor.find(".unit-code").getText()).isEqualTo(code);
  }

  private void bring(String page, Path file) {
    visitor.open(page);
    bring(file);
  }

  private void bring(Path file) {
    visitor.find("input[name=file]").sendKeys(file.toString());
    visitor.pressButton("Import");
  }

  private void setUp(RunningService one, String shop) throws InterruptedException {
    visitor.open(
        one.printed(Pattern.compile("Set up the owner's account: (\\S+)"), Duration.ofMinutes(3)));
    visitor.fill("name", "bench");
    visitor.fill("displayName", "Bench Owner");
    visitor.fill("password", PASSWORD);
    visitor.fill("again", PASSWORD);
    visitor.fill("shopName", shop);
    visitor.pressButton("Set up and sign in");
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
