package turnsheet.capture.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.UUID;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.http.MediaType;
import org.springframework.mock.web.MockMultipartFile;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.assertj.MvcTestResult;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureState;
import turnsheet.capture.Captures;
import turnsheet.capture.SettingFit;
import turnsheet.shop.Customers;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.SpeedUnit;
import turnsheet.shop.UnitId;
import turnsheet.shop.Units;
import turnsheet.shop.Visit;
import turnsheet.shop.Visits;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;

/** Recordings that come in without a speed setting. */
@ServiceTest
@AsTechnician
class DropPagesTest {

  private static final String TACHO = "reel-38-tacho-as-received.wav";
  private static final String EDGES = "reel-9-edges-as-received.csv";
  private static final String TONE = "reel-19-tone-as-received.wav";

  @Autowired private MockMvcTester mvc;
  @Autowired private MachineModels models;
  @Autowired private Customers customers;
  @Autowired private Units units;
  @Autowired private Visits visits;
  @Autowired private Captures captures;
  private final SpeedSetting slow = setting("9.5", 9.525, 400);
  private final SpeedSetting fast = setting("38", 38.1, 1600);
  private UnitId unit = UnitId.next();

  @BeforeEach
  void enterAUnit() {
    String name = UUID.randomUUID().toString();
    MachineModel model =
        models.add(
            MachineModel.named("Dropped on " + name, null, "").withSetting(slow).withSetting(fast));
    unit = units.add(model.id(), customers.add("Owner of " + name, "").id(), name, "").id();
  }

  @Test
  void filesForAUnitOpenAVisitAndArePlacedByTheirRates() throws Exception {
    assertThat(drop("/units/" + unit, TACHO, TACHO)).hasStatus(201);
    MvcTestResult second = drop("/units/" + unit, EDGES, EDGES);
    Visit visit = visits.openOf(unit).orElseThrow();
    assertThat(second).bodyJson().extractingPath("$.visit").isEqualTo("/visits/" + visit.id());
    assertThat(drop("/units/" + unit, "renamed-zip.wav", "a.wav"))
        .bodyJson()
        .extractingPath("$.refusal")
        .asString()
        .containsIgnoringCase("zip");

    assertThat(captures.ofVisit(visit.id()))
        .extracting(c -> c.key().setting(), Capture::fit, c -> c.key().condition())
        .containsExactly(
            tuple(fast, SettingFit.RATE),
            tuple(slow, SettingFit.RATE),
            tuple(slow, SettingFit.NONE));
    assertThat(page(visit))
        .contains("To be confirmed", "Proposed by its rate.", "Measure all as they stand here")
        .doesNotContain("??");
  }

  @Test
  void oneClickConfirmsAllThatHaveASetting() throws Exception {
    Visit visit = visits.open(unit, "");
    drop("/visits/" + visit.id(), TACHO, TACHO);
    drop("/visits/" + visit.id(), TONE, "take.wav");
    List<Capture> dropped = captures.ofVisit(visit.id());
    assertThat(dropped.get(1).fit()).isEqualTo(SettingFit.SEVERAL);
    assertThat(page(visit)).contains("Several have this rate: choose.");

    confirm(
        visit,
        "setting-" + dropped.get(0).id(),
        fast.id().toString(),
        "setting-" + dropped.get(1).id(),
        "");
    assertThat(state(dropped.get(0))).isIn(CaptureState.QUEUED, CaptureState.MEASURED);
    assertThat(captures.find(dropped.get(0).id()).orElseThrow().fit()).isNull();
    assertThat(state(dropped.get(1))).isEqualTo(CaptureState.RECOGNISED);
  }

  @Test
  void aLineConfirmedByItselfIsTakenAsCorrected() {
    Visit visit = visits.open(unit, "");
    drop("/visits/" + visit.id(), TACHO, TACHO);
    drop("/visits/" + visit.id(), EDGES, EDGES);
    List<Capture> dropped = captures.ofVisit(visit.id());
    String id = dropped.get(1).id().toString();
    confirm(
        visit,
        "only",
        id,
        "setting-" + id,
        slow.id().toString(),
        "condition-" + id,
        "warm",
        "setting-" + dropped.get(0).id(),
        fast.id().toString());
    assertThat(captures.find(dropped.get(1).id()).orElseThrow().key().condition())
        .isEqualTo("warm");
    assertThat(state(dropped.get(0))).isEqualTo(CaptureState.RECOGNISED);
  }

  @Test
  void anUnclearSettingIsNotMeasuredUntilItIsSaid() {
    Visit visit = visits.open(unit, "");
    drop("/visits/" + visit.id(), TONE, "take.wav");
    Capture tone = captures.ofVisit(visit.id()).get(0);
    assertThat(mvc.post().uri("/captures/{id}/measure", tone.id().value()).with(csrf()))
        .hasStatus(422)
        .bodyText()
        .contains("does not tell its speed setting");
    assertThat(
            mvc.put()
                .uri("/api/v1/captures/{id}/place", tone.id().value())
                .contentType(MediaType.APPLICATION_JSON)
                .content(
                    "{\"speedSettingId\":\"%s\",\"condition\":\"after repair\"}"
                        .formatted(fast.id())))
        .hasStatusOk()
        .bodyJson()
        .extractingPath("$.settingProposal")
        .isNull();
    assertThat(mvc.post().uri("/captures/{id}/measure", tone.id().value()).with(csrf()))
        .hasStatus(302);
  }

  @Test
  void theConditionFollowsTheNotesOfTheVisit() {
    Visit visit = visits.open(unit, "");
    visits.recordWork(visit.id(), "", "belt renewed");
    drop("/visits/" + visit.id(), TACHO, TACHO);
    assertThat(captures.ofVisit(visit.id()).get(0).key().condition()).isEqualTo("after repair");
  }

  @Test
  void aRecordingBroughtByMistakeCanBeRemovedUntilItIsMeasured() throws Exception {
    Visit visit = visits.open(unit, "");
    drop("/visits/" + visit.id(), TACHO, TACHO);
    drop("/visits/" + visit.id(), EDGES, EDGES);
    List<Capture> dropped = captures.ofVisit(visit.id());
    String first = "/captures/" + dropped.get(0).id();
    assertThat(mvc.get().uri(first)).bodyText().contains(first + "/remove");
    assertThat(mvc.get().uri(first + "/remove"))
        .bodyText()
        .contains(TACHO, "cannot be undone")
        .doesNotContain("??");
    assertThat(mvc.post().uri(first + "/remove").with(csrf())).hasStatus(302);
    assertThat(mvc.get().uri(first)).hasStatus(404);

    String second = "/captures/" + dropped.get(1).id();
    mvc.post().uri(second + "/measure").with(csrf()).exchange();
    assertThat(mvc.post().uri(second + "/remove").with(csrf())).hasStatus(422);
    assertThat(mvc.get().uri(second)).hasStatusOk();
  }

  @Test
  void theFormWithoutScriptTakesSeveralFilesToo() {
    var request = mvc.post().uri("/units/{id}/captures", unit.value()).multipart();
    request.file(new MockMultipartFile("file", TACHO, "audio/wav", sample(TACHO)));
    request.file(new MockMultipartFile("file", EDGES, "text/csv", sample(EDGES)));
    MvcTestResult answer = request.param("condition", "").with(csrf()).exchange();
    Visit visit = visits.openOf(unit).orElseThrow();
    assertThat(answer).hasStatus3xxRedirection();
    assertThat(answer.getResponse().getRedirectedUrl()).isEqualTo("/visits/" + visit.id());
    assertThat(captures.ofVisit(visit.id())).hasSize(2);
  }

  @Test
  void nothingIsTakenForAClosedVisitOrAnUnknownUnit() {
    Visit visit = visits.open(unit, "");
    visits.close(visit.id());
    assertThat(drop("/visits/" + visit.id(), TACHO, TACHO)).hasStatus(422);
    assertThat(drop("/units/" + UnitId.next(), TACHO, TACHO)).hasStatus(404);
  }

  private static org.assertj.core.groups.Tuple tuple(SpeedSetting setting, SettingFit fit) {
    return org.assertj.core.groups.Tuple.tuple(setting.id(), fit, "as received");
  }

  private CaptureState state(Capture capture) {
    return captures.find(capture.id()).orElseThrow().state();
  }

  private String page(Visit visit) throws Exception {
    return mvc.get()
        .uri("/visits/{id}", visit.id().value())
        .exchange()
        .getResponse()
        .getContentAsString();
  }

  private void confirm(Visit visit, String... fields) {
    var request = mvc.post().uri("/visits/{id}/captures/confirm", visit.id().value()).with(csrf());
    for (int i = 0; i < fields.length; i += 2) {
      request = request.param(fields[i], fields[i + 1]);
    }
    assertThat(request).hasStatus3xxRedirection();
  }

  private MvcTestResult drop(String place, String sample, String name) {
    return mvc.post()
        .uri(place + "/captures?fileName={n}", name)
        .with(csrf())
        .contentType(MediaType.APPLICATION_OCTET_STREAM)
        .content(sample(sample))
        .exchange();
  }

  private static byte[] sample(String name) {
    try {
      return Files.readAllBytes(Path.of("sample-uploads", name));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static SpeedSetting setting(String label, double cm, double pulses) {
    return new SpeedSetting(SpeedSettingId.next(), label, SpeedUnit.CM_PER_S, cm, 3150.0, pulses);
  }
}
