package turnsheet.browser;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Base64;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.By;
import org.openqa.selenium.WebElement;
import turnsheet.jar.RunningService;

/** The way of a shop from an empty service to the sheet in the customer's hands. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class MainPathIT {

  private static final Path SAMPLES = Path.of("sample-uploads").toAbsolutePath();
  private static final String BEFORE = "reel-19-tone-as-received.wav";
  private static final String AFTER = "reel-19-tone-after-repair.wav";
  private static final String PASSWORD = "a long road home 47";

  private RunningService service;
  private Visitor visitor;
  private Hand hand;
  private Audit audit;
  private final List<String> wrong = new ArrayList<>();
  private String report = "";
  private String visit = "";

  @BeforeAll
  void start(@TempDir Path folder) throws Exception {
    service = RunningService.start("serve", folder);
    visitor = new Visitor(1280, 900);
    hand = new Hand(visitor);
    audit = new Audit(visitor);
  }

  @AfterAll
  void stop() {
    visitor.close();
    service.close();
  }

  @Test
  void aShopGetsFromAnEmptyServiceToASheetInTheCustomersHands() throws Exception {
    theFirstAddressSetsUpTheOwner();
    aUnitIsEnteredWithItsCustomerModelAndLimit();
    aRecordingIsMeasuredWhileTheVisitorLooksOn();
    theCurveIsLookedAtCloserByHand();
    theRepairIsDroppedOnThePageWithAnotherFile();
    theSheetComparesAndPrintsOnBothPapers();
    theOwnerIssuesTheReport();
    theUnitTellsWhatBecameOfIt();
    aShareLinkOpensTheReportToAnyoneUntilItIsWithdrawn();
    aFileOfAnotherKindIsRefusedWithItsReason();
    everythingNeededWorksWithoutScript();
    wrong.addAll(visitor.complaints());
    assertThat(wrong).as(String.join("\n", wrong)).isEmpty();
  }

  private void theFirstAddressSetsUpTheOwner() throws Exception {
    // Spring's word for bean definitions made at build time; without them the start takes longer
    service.printed(Pattern.compile("Starting AOT-processed Turnsheet"), Duration.ofMinutes(1));
    String door =
        service.printed(
            Pattern.compile("Set up the owner's account: (\\S+)"), Duration.ofMinutes(3));
    visitor.open(service.address("/"));
    assertThat(visitor.address()).endsWith("/not-set-up");
    wrong.addAll(audit.of("/not-set-up", 200));

    visitor.open(door);
    wrong.addAll(audit.of("/first-run", 200));
    visitor.fill("name", "bench");
    visitor.fill("displayName", "Bench Owner");
    visitor.fill("password", PASSWORD);
    visitor.fill("again", PASSWORD);
    visitor.fill("shopName", "Level Turn Bench");
    visitor.fill("shopAddress", "2 Invented Lane");
    visitor.pressButton("Set up and sign in");

    assertThat(visitor.heading()).isEqualTo("On the bench");
  }

  private void aUnitIsEnteredWithItsCustomerModelAndLimit() {
    visitor.open(service.address("/customers/new"));
    visitor.fill("name", "Customer of the test");
    visitor.press(visitor.find("form.sheet button"));

    visitor.open(service.address("/models/new"));
    visitor.fill("name", "Invented reel transport");
    visitor.press(visitor.find("form.sheet button"));
    visitor.fill("label", "19");
    visitor.fill("nominalSpeed", "19.05");
    visitor.fill("toneHz", "3150");
    visitor.pressButton("Add a speed setting");
    visitor.find("#limits summary").click();
    visitor.choose("figure", "flutter.weightedTwoSigmaPercent");
    visitor.fill("upperBound", "0.06");
    visitor.fill("origin", "invented manual");
    visitor.pressButton("Add a limit");
    assertThat(visitor.find("#limits tbody").getText()).contains("0.06").contains("invented");

    visitor.press(visitor.find("main .actions a.button"));
    visitor.fill("serialNumber", "T-1");
    visitor.fill("customerName", "Customer of the test");
    visitor.pressButton("Enter, then open a visit");
    visitor.fill("complaint", "sounds sour");
    visitor.pressButton("Open the visit");

    visit = visitor.address();
    assertThat(visit).contains("/visits/");
    wrong.addAll(audit.of("/visits/{id}, empty", 200));
  }

  private void aRecordingIsMeasuredWhileTheVisitorLooksOn() throws Exception {
    measure("as received", BEFORE);

    visitor.awaitVisible("figure.plot.live canvas");
    assertThat(visitor.find("main .lead").getText()).contains("outside");
    readsAsDocumented(BEFORE);
  }

  private void theCurveIsLookedAtCloserByHand() {
    WebElement curve = visitor.find("[data-plot=trace] canvas");
    double[] whole = shown();

    hand.draw(curve, 0.4, 0.6, false);
    double[] closer = shownAfter(whole);
    // the drawn fifth, in a plot that is somewhat narrower than its picture
    assertThat(width(closer) / width(whole)).isBetween(0.19, 0.25);

    hand.draw(curve, 0.6, 0.3, true);
    double[] later = shownAfter(closer);
    assertThat(later[0]).isGreaterThan(closer[0]);
    assertThat(width(later)).isCloseTo(width(closer), within(1e-6 * width(whole)));
  }

  private void theRepairIsDroppedOnThePageWithAnotherFile() throws Exception {
    visitor.open(visit);
    WebElement page = visitor.find("html");
    hand.drop(cell("after repair"), SAMPLES.resolve(AFTER), SAMPLES.resolve("renamed-zip.wav"));
    visitor.awaitGone(page);

    assertThat(visitor.address()).isEqualTo(visit);
    assertThat(cell("after repair").getText()).contains("Refused").contains(AFTER);
    visitor.press(cell("after repair").findElement(css(".item.recognised a")));
    visitor.pressButton("Measure");
    visitor.awaitAddress("/readings/");
    assertThat(visitor.find("main .lead").getText()).contains("within");
    readsAsDocumented(AFTER);
  }

  private void theSheetComparesAndPrintsOnBothPapers() {
    visitor.open(visit + "/sheet");
    assertThat(visitor.find("table.compare").getText()).contains("improved");

    // inches: ISO 216 A4 is 210 mm x 297 mm, ANSI A "Letter" is 8.5 in x 11 in
    printsOn(210 / 25.4, 297 / 25.4);
    printsOn(8.5, 11);
  }

  private void theOwnerIssuesTheReport() {
    visitor.press(visitor.find("a[href$='/report']"));
    visitor.fill("conditions", "230 V, 50 Hz; warmed up for half an hour");
    wrong.addAll(audit.of("/visits/{id}/report", 200));
    visitor.pressButton("Issue");

    report = visitor.address();
    assertThat(visitor.heading()).isEqualTo("Report 00001");
    assertThat(visitor.find("table.compare").getText()).contains("improved");
    assertThat(visitor.find("main").getText()).contains("warmed up for half an hour");
    wrong.addAll(audit.of("/reports/{number}", 200));
    printsOn(210 / 25.4, 297 / 25.4);
    printsOn(8.5, 11);
  }

  private void theUnitTellsWhatBecameOfIt() {
    visitor.open(visit);
    visitor.press(visitor.find("nav[aria-label] a[href*='/units/'], .trail a[href*='/units/']"));
    assertThat(visitor.awaitVisible("figure.plot svg").isDisplayed()).isTrue();
    // before and after of one visit are joined in the drawing and stand in its table
    assertThat(visitor.find("details.numbers tbody").getText())
        .contains("as received")
        .contains("outside")
        .contains("after repair")
        .contains("within");
    assertThat(visitor.find("main").getText()).contains("No trend is shown");
    visitor.choose("figure", "speed.deviationPercent");
    visitor.pressButton("Show");
    assertThat(visitor.find("#history ~ h3").getText()).contains("Speed deviation");
  }

  private void aShareLinkOpensTheReportToAnyoneUntilItIsWithdrawn() {
    visitor.open(report + "/links");
    visitor.pressButton("Make a link");
    String shared = String.valueOf(visitor.find("#address").getDomProperty("value"));

    visitor.press(visitor.find(".visitor button"));
    visitor.forgetSession();
    visitor.open(shared);
    assertThat(visitor.find("table.compare").getText()).contains("improved");
    assertThat(visitor.all("nav, .masthead")).isEmpty();
    visitor.open(visit);
    assertThat(visitor.heading()).isEqualTo("Sign in");

    visitor.fill("name", "bench");
    visitor.fill("password", PASSWORD);
    visitor.pressButton("Sign in");
    visitor.open(report + "/links");
    visitor.pressButton("Withdraw");
    visitor.open(shared);
    assertThat(visitor.heading()).isEqualTo("This link opens nothing");
    wrong.addAll(audit.of("/s/{token}, withdrawn", 404));
  }

  private void aFileOfAnotherKindIsRefusedWithItsReason() {
    visitor.open(visit);
    upload("as received", "renamed-zip.wav");
    visitor.awaitAddress("/captures/");

    assertThat(visitor.awaitVisible("[role=alert]").getText()).containsIgnoringCase("zip");
    wrong.addAll(audit.of("/captures/{id}, refused", 200));
  }

  private void everythingNeededWorksWithoutScript() throws Exception {
    visitor.protocol("Emulation.setScriptExecutionDisabled", Map.of("value", true));
    visitor.open(visit);
    WebElement cell = cell("after repair");
    open(cell);
    cell.findElement(css("input[type=file]")).sendKeys(SAMPLES.resolve(AFTER).toString());
    visitor.press(cell.findElement(css("form.upload button")));
    assertThat(visitor.address()).contains("/captures/");

    visitor.pressButton("Measure");
    // the page renews itself; once measured, it links to the reading
    String reading = visitor.awaitVisible("main .lead a[href$='/reading']").getDomProperty("href");
    visitor.open(reading);

    readsAsDocumented(AFTER);
    assertThat(visitor.awaitVisible(".plot-drawn svg").isDisplayed()).isTrue();
    assertThat(visitor.all(".plot.live")).isEmpty();
    visitor.protocol("Emulation.setScriptExecutionDisabled", Map.of("value", false));
  }

  private void measure(String condition, String file) {
    visitor.open(visit);
    upload(condition, file);
    visitor.awaitAddress("/captures/");
    assertThat(visitor.script("return sessionStorage.getItem('progress')")).isEqualTo("shown");

    visitor.pressButton("Measure");
    visitor.awaitAddress("/readings/");
  }

  private void upload(String condition, String file) {
    WebElement cell = cell(condition);
    open(cell);
    // the next page comes too fast to look: the page itself notes that the progress was shown
    visitor.script(
        """
        const shown = arguments[0].querySelector(".upload-progress");
        sessionStorage.removeItem("progress");
        new MutationObserver(() => {
          if (shown.checkVisibility()) sessionStorage.setItem("progress", "shown");
        }).observe(shown, { attributes: true });
        """,
        cell);
    cell.findElement(css("input[type=file]")).sendKeys(SAMPLES.resolve(file).toString());
    cell.findElement(css("form.upload button")).click();
  }

  private WebElement cell(String condition) {
    return visitor.find("td[data-label='" + condition + "']");
  }

  /** The form of a cell that holds a recording already is folded away. */
  private static void open(WebElement cell) {
    if (!cell.findElement(css("input[type=file]")).isDisplayed()) {
      cell.findElement(css("details.add > summary")).click();
    }
  }

  /** The stretch of time that the curve shows, in seconds. */
  private double[] shown() {
    List<?> ends =
        (List<?>)
            visitor.script(
                "const x = Chart.getChart(document.querySelector('[data-plot=trace] canvas'))"
                    + ".scales.x; return [x.min, x.max].map(String)");
    return ends.stream().mapToDouble(end -> Double.parseDouble(String.valueOf(end))).toArray();
  }

  private double[] shownAfter(double[] before) {
    visitor.awaitTrue(() -> !Arrays.equals(shown(), before));
    return shown();
  }

  private static double width(double[] ends) {
    return ends[1] - ends[0];
  }

  private void readsAsDocumented(String file) throws IOException {
    double[] truth = truth(file);
    readsNear("Speed deviation", truth[0]);
    readsNear("Weighted flutter, two-sigma", truth[1]);
    readsNear("Unweighted flutter, rms", truth[2]);
  }

  /** 2 % is the bar for flutter figures; half of the last digit shown is lost to rounding. */
  private void readsNear(String figure, double truth) {
    String shown =
        visitor.all(".figures tbody tr").stream()
            .filter(row -> row.findElement(css("th")).getText().startsWith(figure))
            .map(row -> row.findElement(css("td.number .num")))
            .map(number -> number.getText().replaceAll("\\s", "").replace('−', '-'))
            .findFirst()
            .orElseThrow(() -> new AssertionError("no row of " + figure));
    int decimals = shown.length() - 1 - shown.indexOf('.');
    assertThat(shown).as(figure).contains(".");
    assertThat(Double.parseDouble(shown))
        .as(figure)
        .isCloseTo(truth, within(0.02 * Math.abs(truth) + 0.5 * Math.pow(10, -decimals)));
  }

  /** The three last columns of the table in sample-uploads/README.md, computed there. */
  private static double[] truth(String file) throws IOException {
    String row =
        Files.readAllLines(SAMPLES.resolve("README.md")).stream()
            .filter(line -> line.startsWith("| " + file + " |"))
            .findFirst()
            .orElseThrow();
    String[] cells = row.split("\\|", -1);
    double[] truth = new double[3];
    for (int i = 0; i < 3; i++) {
      truth[i] = Double.parseDouble(cells[cells.length - 4 + i].strip());
    }
    return truth;
  }

  private void printsOn(double widthInches, double heightInches) {
    // side margins of print.css, 15 mm each; 96 CSS pixels to the inch
    int textWidth = (int) ((widthInches - 30 / 25.4) * 96);
    visitor.protocol("Emulation.setEmulatedMedia", Map.of("media", "print"));
    visitor.size(textWidth, 1000);
    wrong.addAll(audit.spills("sheet on " + textWidth + " px of paper"));
    visitor.anySize();
    visitor.protocol("Emulation.setEmulatedMedia", Map.of("media", ""));

    Object data =
        visitor
            .protocol(
                "Page.printToPDF", Map.of("paperWidth", widthInches, "paperHeight", heightInches))
            .get("data");
    String pdf =
        new String(Base64.getDecoder().decode(String.valueOf(data)), StandardCharsets.ISO_8859_1);
    assertThat(pdf).startsWith("%PDF-");
    Matcher page = Pattern.compile("/MediaBox\\s*\\[0 0 ([0-9.]+) ([0-9.]+)]").matcher(pdf);
    assertThat(page.find()).as("a page").isTrue();
    // points, 72 to the inch; the browser rounds to whole CSS pixels
    assertThat(Double.parseDouble(page.group(1))).isCloseTo(72 * widthInches, within(1.0));
    assertThat(Double.parseDouble(page.group(2))).isCloseTo(72 * heightInches, within(1.0));
  }

  private static By css(String selector) {
    return By.cssSelector(selector);
  }
}
