package turnsheet.shop.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.UUID;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import turnsheet.shop.Customers;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.ModelId;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.VisitId;
import turnsheet.shop.Visits;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

/** Every test uses names of its own, because the service is shared. */
@ServiceTest
@AsTechnician
class ShopPagesTest {

  private final Browser browser;
  private final Customers customers;
  private final MachineModels models;
  private final Visits visits;

  @Autowired
  ShopPagesTest(MockMvcTester mvc, Customers customers, MachineModels models, Visits visits) {
    this.browser = new Browser(mvc);
    this.customers = customers;
    this.models = models;
    this.visits = visits;
  }

  @Test
  void entersFindsAndChangesACustomer() throws Exception {
    String page = browser.sendOn("/customers/new", "name", "Alder Sound", "contact", "Mill Lane 3");
    assertThat(browser.read(page)).contains("Alder Sound", "Mill Lane 3", "No unit yet");
    assertThat(browser.read("/customers?q=alder mill")).contains("Alder Sound");
    assertThat(browser.read("/customers?q=alder zzz"))
        .contains("Nothing holds all the words")
        .doesNotContain("<table");
    assertThat(browser.read("/units?q=alder zzz")).doesNotContain("<table");
    browser.sendOn(page + "/edit", "name", "Alder & Sons", "contact", "");
    assertThat(browser.read(page)).contains("Alder &amp; Sons");
  }

  @Test
  void sendsACustomerWithoutANameBack() throws Exception {
    browser.sendBack(
        "/customers/new",
        "This must not be empty.",
        "Mill Lane 4",
        "name",
        " ",
        "contact",
        "Mill Lane 4");
  }

  @Test
  void buildsAModelOnItsPage() throws Exception {
    String page = model("Birch transport", "120");
    assertThat(browser.read(page)).contains("Add at least one speed setting");
    addSlowSetting(page);
    browser.sendOn(
        page + "/parts", "part", "capstan", "basis", "DIAMETER_MM", "amount", "2.0", "turnsOf", "");
    browser.sendOn(
        page + "/parts",
        "part",
        "motor",
        "basis",
        "TURNS_PER_TURN",
        "amount",
        "4",
        "turnsOf",
        "capstan");
    browser.sendOn(
        page + "/limits",
        "setting",
        settingOf(page).id().toString(),
        "figure",
        "flutter.weightedTwoSigmaPercent",
        "upperBound",
        "0.12",
        "origin",
        "rule of the shop");
    // v/(pi d) at 4.7625 cm/s and 2.0 mm is 7.580 Hz (textbook, computed); the motor turns 4 times
    assertThat(browser.text(page))
        .contains("4.7625", "1.875", "7.580", "30.319", "4 per turn of capstan")
        .contains("Weighted flutter, two-sigma", "0.12", "rule of the shop");
  }

  @Test
  void asksForTheNumbersOfAKindAndForNoOthers() throws Exception {
    String page = model("Dogwood transport", "");
    addSlowSetting(page);
    assertThat(browser.read(page + "/parts/new?kind=REEL"))
        .contains("name=\"empty\"", "name=\"winding\"")
        .doesNotContain("name=\"ball\"", "name=\"slipLow\"", "name=\"turnsOf\"");
    assertThat(browser.read(page + "/parts/new?kind=BEARING"))
        .contains("name=\"ball\"", "name=\"pitch\"", "name=\"angle\"");
    browser.sendBack(
        page + "/parts",
        "the bare hub is smaller than the full pack",
        "supply reel",
        "part",
        "supply reel",
        "kind",
        "REEL",
        "basis",
        "DIAMETER_MM",
        "amount",
        "100",
        "empty",
        "250",
        "winding",
        "GIVES");
    browser.sendOn(
        page + "/parts",
        "part",
        "supply reel",
        "kind",
        "REEL",
        "basis",
        "DIAMETER_MM",
        "amount",
        "250",
        "empty",
        "100",
        "winding",
        "GIVES");
    // v/(pi d) at 4.7625 cm/s: 0.0606 Hz full, 0.1516 Hz bare (computed)
    assertThat(browser.text(page)).contains("0.061 \u2013 0.152", "250 mm full, 100 mm bare");
    String edit = page + "/parts/edit?name=supply reel";
    assertThat(browser.read(edit)).contains("value=\"250\"", "value=\"100\"");
    // as another kind it keeps what that kind has
    assertThat(browser.read(edit + "&kind=ROLLER"))
        .contains("supply reel", "value=\"250\"")
        .doesNotContain("name=\"empty\"");
  }

  @Test
  void sendsWhatIsNoNumberBackAsTyped() throws Exception {
    String page = model("Cedar transport", "");
    browser.sendBack(
        page + "/settings",
        "comma could mean thousands",
        "9,525",
        "label",
        "9.5",
        "nominalSpeed",
        "9,525",
        "speedUnit",
        "CM_PER_S",
        "toneHz",
        "",
        "pulsesPerSecond",
        "");
    browser.sendBack(
        page + "/settings",
        "must be more than zero",
        "value=\"0\"",
        "label",
        "9.5",
        "nominalSpeed",
        "0",
        "speedUnit",
        "CM_PER_S",
        "toneHz",
        "",
        "pulsesPerSecond",
        "");
    browser.sendBack(
        "/models/new",
        "whole number",
        "12.5",
        "name",
        "Cedar player",
        "pulsesPerTurn",
        "12.5",
        "note",
        "");
  }

  @Test
  void takesInchesAndVulgarFractions() throws Exception {
    String page = model("Damson transport", "");
    browser.sendOn(
        page + "/settings",
        "label",
        "3 3/4",
        "nominalSpeed",
        "3 3/4",
        "speedUnit",
        "IN_PER_S",
        "toneHz",
        "3150",
        "pulsesPerSecond",
        "400");
    // an inch is 2.54 cm by definition, and 3.75 times 2.54 is 9.525
    assertThat(settingOf(page).nominalSpeed()).isEqualTo(9.525);
    assertThat(browser.read(page)).contains("9.525", "3.75");
  }

  @Test
  void changesAndRemovesWhatBelongsToAModel() throws Exception {
    String page = model("Elder transport", "");
    addSlowSetting(page);
    browser.sendOn(
        page + "/parts",
        "part",
        "cap/stan & co",
        "basis",
        "DIAMETER_MM",
        "amount",
        "2",
        "turnsOf",
        "");
    browser.sendOn(
        page + "/parts",
        "part",
        "idler",
        "basis",
        "TURNS_PER_TURN",
        "amount",
        "2",
        "turnsOf",
        "cap/stan & co");
    String part = "?name=cap/stan %26 co";
    assertThat(browser.read(page + "/parts/edit" + part)).contains("cap/stan &amp; co");
    browser.sendBack(
        page + "/parts/edit" + part,
        "would follow from itself",
        "idler",
        "part",
        "cap/stan & co",
        "basis",
        "TURNS_PER_TURN",
        "amount",
        "2",
        "turnsOf",
        "idler");
    assertThat(browser.read(page + "/parts/remove" + part)).contains("Remove cap/stan &amp; co");
    assertThat(browser.send(page + "/parts/remove", "name", "cap/stan & co"))
        .hasStatus(422)
        .bodyText()
        .contains("the rate of idler follows from it");
    browser.sendOn(page + "/parts/remove", "name", "idler");
    browser.sendOn(page + "/parts/remove", "name", "cap/stan & co");
    String setting = page + "/settings/" + settingOf(page).id();
    browser.sendOn(
        page + "/limits",
        "setting",
        settingOf(page).id().toString(),
        "figure",
        "speed.deviationPercent",
        "upperBound",
        "0.3",
        "origin",
        "manual");
    String limit = page + "/limits/" + settingOf(page).id() + "/DEVIATION";
    assertThat(browser.read(limit)).contains("manual");
    browser.sendOn(
        limit,
        "setting",
        settingOf(page).id().toString(),
        "figure",
        "speed.deviationPercent",
        "upperBound",
        "0.2",
        "origin",
        "manual, page 7");
    assertThat(browser.read(page)).contains("manual, page 7");
    assertThat(browser.read(limit + "/remove")).contains("Remove Speed deviation, slow");
    assertThat(browser.read(setting + "/remove")).contains("Its service limits go with it: 1.");
    browser.sendOn(setting + "/remove");
    assertThat(browser.read(page)).contains("No speed yet", "No part yet");
  }

  @Test
  void saysThatAModelNameIsTaken() throws Exception {
    model("Fir transport", "");
    browser.sendBack(
        "/models/new",
        "There is a model named Fir transport already.",
        "Fir transport",
        "name",
        "Fir transport",
        "pulsesPerTurn",
        "",
        "note",
        "");
  }

  @Test
  void entersAUnitWithANewCustomerAndOpensAVisit() throws Exception {
    String model = idOf(model("Gorse transport", ""));
    browser.sendBack(
        "/units/new",
        "No customer has this name",
        "Gorse Radio",
        "model",
        model,
        "serialNumber",
        "G-1",
        "customer",
        "",
        "customerName",
        "Gorse Radio",
        "note",
        "");
    String next =
        browser.sendOn(
            "/units/new",
            "model",
            model,
            "serialNumber",
            "G-1",
            "customer",
            "",
            "customerName",
            "Gorse Radio",
            "newCustomer",
            "yes",
            "note",
            "");
    assertThat(next).matches("/units/[0-9a-f-]{36}/visits/new");
    assertThat(browser.read(next)).contains("Gorse transport G-1, Gorse Radio");
    String visit = browser.sendOn(next, "complaint", "runs slow");
    assertThat(visit).matches("/visits/[0-9a-f-]{36}");
    assertThat(browser.read(next)).contains("on the bench already");
    assertThat(browser.read("/units?q=gorse g-1")).contains("G-1", "on the bench");
    browser.sendOn(
        visit + "/edit", "verb", "close", "complaint", "runs slow", "workDone", "belt renewed");
    VisitId id = new VisitId(UUID.fromString(visit.substring("/visits/".length())));
    assertThat(visits.find(id).orElseThrow().isOpen()).isFalse();
    assertThat(browser.read(visit + "/edit")).contains("belt renewed", "Closed on");
    browser.sendBack(
        visit + "/edit",
        "The visit is closed.",
        "other",
        "verb",
        "save",
        "complaint",
        "",
        "workDone",
        "other");
    assertThat(visits.find(id).orElseThrow().workDone()).isEqualTo("belt renewed");
    assertThat(browser.sendOn(visit + "/edit", "verb", "reopen")).isEqualTo(visit + "/edit");
    assertThat(visits.find(id).orElseThrow().workDone()).isEqualTo("belt renewed");
    browser.sendOn(visit + "/edit", "verb", "close", "complaint", "", "workDone", "belt");
    browser.sendOn(
        visit + "/edit", "verb", "reopenAndSave", "complaint", "", "workDone", "belt and idler");
    assertThat(visits.find(id).orElseThrow().workDone()).isEqualTo("belt and idler");
  }

  @Test
  void notesThatSomebodyElseChangedMeanwhileAreNotWrittenOver() throws Exception {
    String unit =
        browser.sendOn(
            "/units/new",
            "model",
            idOf(model("Rowan transport", "")),
            "serialNumber",
            "R-9",
            "customer",
            "",
            "customerName",
            "Rowan Radio",
            "newCustomer",
            "yes",
            "note",
            "");
    String visit = browser.sendOn(unit, "complaint", "");
    VisitId id = new VisitId(UUID.fromString(visit.substring(visit.lastIndexOf('/') + 1)));
    String mine = seen(visit);
    browser.sendOn(visit + "/edit", "seen", seen(visit), "workDone", "capstan cleaned");

    browser.sendBack(
        visit + "/edit",
        "capstan cleaned",
        "belt renewed",
        "seen",
        mine,
        "workDone",
        "belt renewed");
    assertThat(visits.find(id).orElseThrow().workDone()).isEqualTo("capstan cleaned");

    browser.sendOn(
        visit + "/edit", "seen", seen(visit), "workDone", "capstan cleaned, belt renewed");
    assertThat(visits.find(id).orElseThrow().workDone()).isEqualTo("capstan cleaned, belt renewed");
  }

  /** What the form says of the notes that it was opened with. */
  private String seen(String visit) throws Exception {
    var field =
        Pattern.compile("name=\"seen\" value=\"([^\"]+)\"").matcher(browser.read(visit + "/edit"));
    assertThat(field.find()).isTrue();
    return field.group(1);
  }

  @Test
  void keepsTheCustomerOutWhenTheUnitIsRefused() throws Exception {
    String model = idOf(model("Hazel transport", ""));
    browser.sendOn(
        "/units/new",
        "model",
        model,
        "serialNumber",
        "H-1",
        "customer",
        "",
        "customerName",
        "Hazel Radio",
        "newCustomer",
        "yes",
        "note",
        "");
    browser.sendBack(
        "/units/new",
        "This model has a unit with serial number H-1 already.",
        "Hazel Archive",
        "model",
        model,
        "serialNumber",
        "H-1",
        "customer",
        "",
        "customerName",
        "Hazel Archive",
        "newCustomer",
        "yes",
        "note",
        "");
    assertThat(customers.named("Hazel Archive")).isEmpty();
    assertThat(customers.named("hazel radio")).hasSize(1);
  }

  @Test
  void asksWhichOfTwoCustomersIsMeant() throws Exception {
    String model = idOf(model("Ivy transport", ""));
    customers.add("Ivy Twins", "one");
    String second = customers.add("Ivy Twins", "other").id().toString();
    browser.sendBack(
        "/units/new",
        "Several customers have this name",
        "Ivy Twins",
        "model",
        model,
        "serialNumber",
        "I-1",
        "customer",
        "",
        "customerName",
        "Ivy Twins",
        "note",
        "");
    assertThat(browser.read("/units/new?customer=" + second + "&model=" + model))
        .contains("Ivy Twins", second);
    browser.sendOn(
        "/units/new",
        "model",
        model,
        "serialNumber",
        "I-1",
        "customer",
        second,
        "customerName",
        "Ivy Twins",
        "note",
        "");
    assertThat(browser.read("/customers/" + second)).contains("I-1");
  }

  @Test
  void changesAUnit() throws Exception {
    String model = idOf(model("Juniper transport", ""));
    String next =
        browser.sendOn(
            "/units/new",
            "model",
            model,
            "serialNumber",
            "J-1",
            "customer",
            "",
            "customerName",
            "Juniper Radio",
            "newCustomer",
            "yes",
            "note",
            "");
    String edit = next.replace("/visits/new", "/edit");
    assertThat(browser.read(edit)).contains("J-1", "Juniper Radio", "selected=\"selected\"");
    assertThat(
            browser.sendOn(
                edit,
                "model",
                model,
                "serialNumber",
                "J-2",
                "customer",
                "",
                "customerName",
                "Juniper Radio",
                "note",
                "new heads"))
        .isEqualTo(next.replace("/visits/new", ""));
    browser.sendBack(
        edit,
        "This must not be empty.",
        "new heads",
        "model",
        model,
        "serialNumber",
        "",
        "customer",
        "",
        "customerName",
        "Juniper Radio",
        "note",
        "new heads");
  }

  @Test
  void entersInstrumentsAndMedia() throws Exception {
    browser.sendOn(
        "/instruments/new",
        "name",
        "Kestrel card",
        "clockErrorPpm",
        "-12.5",
        "clockExpandedUncertaintyPpm",
        "1",
        "checkedOn",
        "2026-02-01",
        "note",
        "");
    browser.sendOn(
        "/media/new",
        "name",
        "Kestrel tape",
        "toneHz",
        "3150",
        "speedTolerancePercent",
        "0.2",
        "ownFlutterPercent",
        "",
        "note",
        "");
    assertThat(browser.text("/instruments"))
        .contains("Kestrel card", "\u221212.5", "2026-02-01", "Kestrel tape", "0.2", "unknown");
    browser.sendBack(
        "/instruments/new",
        "There is an instrument named Kestrel card already.",
        "Kestrel card",
        "name",
        "Kestrel card",
        "clockErrorPpm",
        "0",
        "clockExpandedUncertaintyPpm",
        "",
        "checkedOn",
        "",
        "note",
        "");
    browser.sendBack(
        "/instruments/new",
        "Write the day like",
        "1 March",
        "name",
        "Kestrel other",
        "clockErrorPpm",
        "0",
        "clockExpandedUncertaintyPpm",
        "-1",
        "checkedOn",
        "1 March",
        "note",
        "");
    browser.sendBack(
        "/media/new",
        "A number is needed here.",
        "Kestrel record",
        "name",
        "Kestrel record",
        "toneHz",
        "",
        "speedTolerancePercent",
        "",
        "ownFlutterPercent",
        "",
        "note",
        "");
  }

  @Test
  void knowsNothingAtUnknownAddresses() {
    String nobody = UUID.randomUUID().toString();
    for (String address :
        new String[] {
          "/customers/" + nobody,
          "/models/" + nobody,
          "/models/" + nobody + "/parts/edit?name=x",
          "/units/" + nobody + "/edit",
          "/units/" + nobody + "/visits/new",
          "/visits/" + nobody + "/edit",
          "/instruments/" + nobody + "/edit",
          "/media/" + nobody + "/edit",
          "/customers/not-an-id"
        }) {
      assertThat(browser.open(address)).as(address).hasStatus(404);
    }
  }

  private String model(String name, String pulsesPerTurn) {
    return browser.sendOn("/models/new", "name", name, "pulsesPerTurn", pulsesPerTurn, "note", "");
  }

  private void addSlowSetting(String page) {
    browser.sendOn(
        page + "/settings",
        "label",
        "slow",
        "nominalSpeed",
        "4.7625",
        "speedUnit",
        "CM_PER_S",
        "toneHz",
        "3150",
        "pulsesPerSecond",
        "");
  }

  private SpeedSetting settingOf(String page) {
    MachineModel model = models.find(new ModelId(UUID.fromString(idOf(page)))).orElseThrow();
    return model.settings().get(0);
  }

  private static String idOf(String page) {
    return page.substring(page.lastIndexOf('/') + 1);
  }
}
