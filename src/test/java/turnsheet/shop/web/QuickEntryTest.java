package turnsheet.shop.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.UUID;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.beans.factory.annotation.Value;
import org.springframework.security.test.context.support.WithAnonymousUser;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import turnsheet.shop.Customers;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.Unit;
import turnsheet.shop.Units;
import turnsheet.shop.Visit;
import turnsheet.shop.Visits;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.QrReader;
import turnsheet.testing.ServiceTest;

@ServiceTest
@AsTechnician
class QuickEntryTest {

  private static final Pattern DRAWING =
      Pattern.compile("viewBox=\"0 0 (\\d+) \\1\".*? d=\"([^\"]+)\"", Pattern.DOTALL);

  @Autowired private MachineModels models;
  @Autowired private Customers customers;
  @Autowired private Units units;
  @Autowired private Visits visits;

  @Value("${turnsheet.public-address}")
  private String publicAddress = "";

  private final Browser browser;
  private Unit unit;

  @Autowired
  QuickEntryTest(MockMvcTester mvc, MachineModels models, Customers customers, Units units) {
    browser = new Browser(mvc);
    unit = enter(models, customers, units);
  }

  @BeforeEach
  void enterAUnit() {
    unit = enter(models, customers, units);
  }

  @Test
  void aCodeOpensTheUnitOrTheVisitItIsHereFor() {
    assertThat(place("/find?q=" + unit.code())).isEqualTo("/units/" + unit.id());
    Visit visit = visits.open(unit.id(), "");
    assertThat(place("/find?q=" + unit.code().grouped().toLowerCase(java.util.Locale.ROOT)))
        .isEqualTo("/visits/" + visit.id());
    assertThat(place("/find?q=" + publicAddress + "/u/" + unit.code()))
        .isEqualTo("/visits/" + visit.id());
    visits.close(visit.id());
    assertThat(place("/find?q=" + unit.code())).isEqualTo("/units/" + unit.id());
  }

  @Test
  void otherWordsOpenTheOnlyUnitThatHasThemOrTheList() {
    assertThat(place("/find?q=" + unit.serialNumber())).isEqualTo("/units/" + unit.id());
    units.add(unit.modelId(), unit.customerId(), unit.serialNumber() + "b", "");
    assertThat(place("/find?q=" + unit.serialNumber()))
        .isEqualTo("/units?q=" + unit.serialNumber());
    assertThat(place("/find?q=")).isEqualTo("/units");
  }

  @Test
  void theAddressOnTheLabelLeadsToTheUnit() {
    assertThat(place("/u/" + unit.code())).isEqualTo("/units/" + unit.id());
    assertThat(browser.open("/u/2345678H")).hasStatus(404);
    assertThat(browser.open("/u/nonsense")).hasStatus(404);
  }

  @Test
  @WithAnonymousUser
  void aStrangerSignsInFirst() {
    assertThat(place("/u/" + unit.code())).isEqualTo("/sign-in");
  }

  @Test
  void theLabelHoldsTheAddress() throws Exception {
    String page = browser.read("/units/" + unit.id() + "/label");
    assertThat(page).contains(unit.code().grouped(), unit.serialNumber()).doesNotContain("??");
    assertThat(drawn(page)).isEqualTo(publicAddress + "/u/" + unit.code());
    assertThat(browser.read("/units/" + unit.id()))
        .contains(unit.code().grouped(), "/units/" + unit.id() + "/label");
  }

  @Test
  void theSheetHasTheLabelsOfTheList() throws Exception {
    Unit other = units.add(unit.modelId(), unit.customerId(), unit.serialNumber() + "b", "");
    String page = browser.read("/units/labels?q=" + unit.serialNumber());
    assertThat(page).contains(unit.code().grouped(), other.code().grouped()).doesNotContain("??");
    assertThat(page.split("class=\"unit-label\"", -1)).hasSize(3);
    assertThat(browser.text("/units/labels?q=nobody-has-this")).contains("No unit is in this list");
  }

  private static String drawn(String page) throws Exception {
    Matcher drawing = DRAWING.matcher(page);
    assertThat(drawing.find()).isTrue();
    return QrReader.read(Integer.parseInt(drawing.group(1)), drawing.group(2));
  }

  private String place(String address) {
    return String.valueOf(browser.open(address).getResponse().getRedirectedUrl());
  }

  private static Unit enter(MachineModels models, Customers customers, Units units) {
    String name = UUID.randomUUID().toString();
    return units.add(
        models.add(MachineModel.named("Scanned deck " + name, null, "")).id(),
        customers.add("Owner of " + name, "").id(),
        "Q0" + name.substring(0, 8),
        "");
  }
}
