package turnsheet.shop.web;

import static org.assertj.core.api.Assertions.assertThat;

import com.jayway.jsonpath.JsonPath;
import java.util.UUID;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.http.MediaType;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.assertj.MvcTestResult;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

/** Every test uses names of its own, because the service is shared. */
@ServiceTest
@AsTechnician
class ShopApiTest {

  private static final String MODEL =
      """
      {"name": "%s", "pulsesPerTurn": 120, "note": "",
       "speedSettings": [
         {"label": "9.5", "speedCmPerS": 9.525, "toneHz": 3150, "pulsesPerSecond": 400},
         {"label": "19", "speedCmPerS": 19.05, "toneHz": 3150, "pulsesPerSecond": 800}],
       "rotatingParts": [
         {"name": "capstan", "diameterMm": 8},
         {"name": "motor", "turnsPerTurn": 4, "turnsOf": "capstan"},
         {"name": "fan", "turnsPerMinute": 1450}],
       "serviceLimits": [
         {"speedSetting": "19", "figure": "flutter.weightedTwoSigmaPercent",
          "upperBound": 0.06, "origin": "rule of the shop"}]}
      """;

  private final MockMvcTester mvc;

  @Autowired
  ShopApiTest(MockMvcTester mvc) {
    this.mvc = mvc;
  }

  @Test
  void keepsACustomer() throws Exception {
    String added = created("/api/v1/customers", "{\"name\": \"Larch Radio\"}");
    String address = "/api/v1/customers/" + JsonPath.read(added, "$.id");
    assertThat(JsonPath.<String>read(added, "$.contact")).isEmpty();
    assertThat(put(address, "{\"name\": \"Larch Sound\", \"contact\": \"Quay 1\"}")).hasStatusOk();
    String listed = body(get("/api/v1/customers?q=larch&size=5"));
    assertThat(JsonPath.<Integer>read(listed, "$.total")).isEqualTo(1);
    assertThat(JsonPath.<String>read(listed, "$.items[0].name")).isEqualTo("Larch Sound");
    assertThat(body(get(address))).contains("Quay 1");
  }

  @Test
  void keepsAModelWithAllThatBelongsToIt() throws Exception {
    String added = created("/api/v1/models", MODEL.formatted("Maple transport"));
    // v/(pi d) at 19.05 cm/s and 8 mm is 7.580 Hz (textbook, computed), printed to 0.001
    assertThat(JsonPath.<Double>read(added, "$.rotatingParts[0].rates[1].rateHz"))
        .isCloseTo(7.580, org.assertj.core.api.Assertions.within(0.0005));
    assertThat(JsonPath.<String>read(added, "$.rotatingParts[0].rates[1].speedSetting"))
        .isEqualTo("19");
    String address = "/api/v1/models/" + JsonPath.read(added, "$.id");
    assertThat(body(get(address))).isEqualTo(added);
    // what was read can be sent back, and changes nothing
    assertThat(body(put(address, added))).isEqualTo(added);
    // settings without an id are known by their labels
    String again = body(put(address, MODEL.formatted("Maple transport")));
    assertThat(again).isEqualTo(added);
    String listed = body(get("/api/v1/models?q=maple"));
    assertThat(JsonPath.<Integer>read(listed, "$.items[0].speedSettings.length()")).isEqualTo(2);
  }

  @Test
  void keepsPartsOfAllKinds() throws Exception {
    String sent =
        MODEL
            .formatted("Sorrel transport")
            .replace(
                "{\"name\": \"fan\", \"turnsPerMinute\": 1450}",
                """
                {"name": "drive", "kind": "motor", "mainsPolePairs": 2,
                 "details": {"slipLowPercent": 2, "slipHighPercent": 6}},
                {"name": "belt", "kind": "belt", "lengthMm": 500, "turnsOf": "drive",
                 "details": {"rimMm": 20, "tolerancePercent": 2}},
                {"name": "reel", "kind": "reel", "diameterMm": 250,
                 "details": {"emptyMm": 100, "winding": "gives"}},
                {"name": "ball race", "kind": "bearing", "turnsPerTurn": 1, "turnsOf": "capstan",
                 "details": {"count": 8, "ballMm": 4.76, "pitchMm": 22}}
                """);
    String added = created("/api/v1/models", sent);
    assertThat(JsonPath.<String>read(added, "$.rotatingParts[2].kind")).isEqualTo("motor");
    // 50 Hz on two pole pairs, 2 to 6 % behind
    assertThat(JsonPath.<Double>read(added, "$.rotatingParts[2].rates[0].lowHz"))
        .isCloseTo(23.5, org.assertj.core.api.Assertions.within(1e-9));
    assertThat(JsonPath.<Double>read(added, "$.rotatingParts[2].rates[0].highHz"))
        .isCloseTo(24.5, org.assertj.core.api.Assertions.within(1e-9));
    String address = "/api/v1/models/" + JsonPath.read(added, "$.id");
    assertThat(body(put(address, added))).isEqualTo(added);
    assertProblem(
        put(address, sent.replace("\"pitchMm\": 22", "\"pitchMm\": 2")), 422, "partBalls", "race");
    assertProblem(
        put(address, sent.replace("\"belt\", \"lengthMm\"", "\"strap\", \"lengthMm\"")),
        422,
        "partKindUnknown",
        "strap");
  }

  @Test
  void answersWithAProblemWhatTheRulesForbid() throws Exception {
    created("/api/v1/models", MODEL.formatted("Nettle transport"));
    assertProblem(
        post("/api/v1/models", MODEL.formatted("Nettle transport")),
        422,
        "modelNameTaken",
        "There is a model named Nettle transport already.");
    assertProblem(
        post("/api/v1/models", MODEL.formatted("Nettle II").replace("\"capstan\"}", "\"none\"}")),
        422,
        "partUnknown",
        "motor refers to none");
    assertProblem(
        post(
            "/api/v1/models",
            MODEL
                .formatted("Nettle II")
                .replace("\"diameterMm\": 8", "\"turnsPerTurn\": 1, \"turnsOf\": \"motor\"")),
        422,
        "partCircle",
        "would follow from itself");
    assertProblem(
        post(
            "/api/v1/models",
            MODEL
                .formatted("Nettle II")
                .replace("\"diameterMm\": 8", "\"diameterMm\": 8, \"turnsPerMinute\": 3")),
        422,
        "partOnce",
        "capstan");
    assertProblem(
        post("/api/v1/models", MODEL.formatted("Nettle II").replace("weightedTwoSigma", "loud")),
        422,
        "figureUnknown",
        "flutter.loudPercent");
    assertProblem(
        post("/api/v1/models", MODEL.formatted("Nettle II").replace("speedCmPerS", "speed")),
        422,
        "speedOnce",
        "9.5");
  }

  @Test
  void namesTheFieldsThatAreWrong() throws Exception {
    MvcTestResult answer =
        post("/api/v1/media", "{\"name\": \"\", \"toneHz\": -1, \"speedTolerancePercent\": 0.1}");
    assertProblem(answer, 422, "invalid", "");
    assertThat(JsonPath.<java.util.List<String>>read(body(answer), "$.fields[*].field"))
        .containsExactlyInAnyOrder("name", "toneHz");
  }

  @Test
  void answersWithAProblemWhatIsNotJsonOrNotThere() throws Exception {
    assertProblem(post("/api/v1/customers", "{\"name\": "), 400, "unreadable", "");
    assertProblem(get("/api/v1/units/" + UUID.randomUUID()), 404, "notFound", "no such unit");
    assertProblem(
        put("/api/v1/models/" + UUID.randomUUID(), MODEL.formatted("Nobody")),
        404,
        "notFound",
        "machine model");
  }

  @Test
  void opensClosesAndReopensAVisitOfAUnit() throws Exception {
    String model = id(created("/api/v1/models", MODEL.formatted("Osier transport")));
    String customer = id(created("/api/v1/customers", "{\"name\": \"Osier Radio\"}"));
    String unitJson =
        "{\"modelId\": \"%s\", \"customerId\": \"%s\", \"serialNumber\": \"O-1\"}"
            .formatted(model, customer);
    String unit = id(created("/api/v1/units", unitJson));
    assertProblem(post("/api/v1/units", unitJson), 422, "serialTaken", "O-1");
    assertProblem(
        post("/api/v1/units", unitJson.replace(customer, UUID.randomUUID().toString())),
        422,
        "customerUnknown",
        "no customer");
    assertThat(put("/api/v1/units/" + unit, unitJson.replace("O-1", "O-2"))).hasStatusOk();

    String visitJson = "{\"unitId\": \"%s\", \"complaint\": \"hums\"}".formatted(unit);
    String visit = "/api/v1/visits/" + id(created("/api/v1/visits", visitJson));
    assertProblem(post("/api/v1/visits", visitJson), 422, "visitStillOpen", "still open");
    String closing =
        "{\"unitId\": \"%s\", \"open\": false, \"workDone\": \"belt\"}".formatted(unit);
    String closed = body(put(visit, closing));
    assertThat(JsonPath.<Boolean>read(closed, "$.open")).isFalse();
    assertThat(JsonPath.<String>read(closed, "$.closedAt")).isNotEmpty();
    assertProblem(put(visit, closing), 422, "visitClosed", "closed");
    String reopened = body(put(visit, closing.replace("false", "true")));
    assertThat(JsonPath.<Boolean>read(reopened, "$.open")).isTrue();
    assertThat(body(get("/api/v1/visits?unitId=" + unit))).contains("belt");
    assertThat(body(get("/api/v1/visits?unitId=" + UUID.randomUUID()))).contains("\"total\":0");
  }

  @Test
  void keepsInstrumentsAndMedia() throws Exception {
    String card =
        created(
            "/api/v1/instruments",
            "{\"name\": \"Poplar card\", \"clockErrorPpm\": -3.5, \"checkedOn\": \"2026-02-01\"}");
    assertThat(body(get("/api/v1/instruments/" + id(card)))).isEqualTo(card);
    assertProblem(
        post("/api/v1/instruments", "{\"name\": \"Poplar card\", \"clockErrorPpm\": 0}"),
        422,
        "instrumentNameTaken",
        "Poplar card");
    String tape =
        created(
            "/api/v1/media",
            "{\"name\": \"Poplar tape\", \"toneHz\": 3150, \"speedTolerancePercent\": 0.2}");
    assertThat(body(put("/api/v1/media/" + id(tape), tape.replace("0.2", "0.3")))).contains("0.3");
    assertThat(body(get("/api/v1/media?q=poplar"))).contains("Poplar tape");
  }

  private String created(String address, String json) throws Exception {
    MvcTestResult answer = post(address, json);
    assertThat(answer).hasStatus(201);
    String added = body(answer);
    assertThat(answer).headers().hasValue("Location", address + "/" + id(added));
    return added;
  }

  private static void assertProblem(MvcTestResult answer, int status, String code, String words)
      throws Exception {
    assertThat(answer).hasStatus(status).hasContentType(MediaType.APPLICATION_PROBLEM_JSON);
    assertThat(JsonPath.<String>read(body(answer), "$.code")).isEqualTo(code);
    assertThat(JsonPath.<String>read(body(answer), "$.detail")).contains(words);
  }

  private MvcTestResult get(String address) {
    return mvc.get().uri(address).exchange();
  }

  private MvcTestResult post(String address, String json) {
    return mvc.post().uri(address).contentType(MediaType.APPLICATION_JSON).content(json).exchange();
  }

  private MvcTestResult put(String address, String json) {
    return mvc.put().uri(address).contentType(MediaType.APPLICATION_JSON).content(json).exchange();
  }

  private static String body(MvcTestResult answer) throws Exception {
    return answer.getResponse().getContentAsString();
  }

  private static String id(String json) {
    return JsonPath.read(json, "$.id");
  }
}
