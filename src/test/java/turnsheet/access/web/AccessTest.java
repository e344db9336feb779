package turnsheet.access.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.get;
import static org.springframework.test.web.servlet.request.MockMvcRequestBuilders.post;

import java.time.Duration;
import java.util.UUID;
import org.junit.jupiter.api.Test;
import org.springframework.beans.factory.annotation.Autowired;
import org.springframework.http.MediaType;
import org.springframework.jdbc.core.simple.JdbcClient;
import org.springframework.mock.web.MockHttpSession;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.assertj.MvcTestResult;
import turnsheet.access.Account;
import turnsheet.access.Accounts;
import turnsheet.access.ApiKeys;
import turnsheet.access.AuditTrail;
import turnsheet.access.OneTimeAddresses;
import turnsheet.access.OneTimeAddresses.Purpose;
import turnsheet.access.Role;
import turnsheet.testing.Answers;
import turnsheet.testing.AsOwner;
import turnsheet.testing.AsTechnician;
import turnsheet.testing.ServiceTest;
import turnsheet.testing.TestPeople;

@ServiceTest
class AccessTest {
  @Autowired MockMvcTester mvc;
  @Autowired Accounts accounts;
  @Autowired ApiKeys keys;
  @Autowired OneTimeAddresses addresses;
  @Autowired AuditTrail audit;
  @Autowired JdbcClient jdbc;

  @Test
  void strangersAreSentToSignIn() {
    assertThat(mvc.get().uri("/")).hasRedirectedUrl("/sign-in");
    assertThat(mvc.get().uri("/shop")).hasRedirectedUrl("/sign-in");
    assertThat(mvc.get().uri("/sign-in")).hasStatusOk();
    assertThat(mvc.get().uri("/css/app.css")).hasStatusOk();
    assertThat(mvc.get().uri("/actuator/health")).hasStatusOk();
  }

  @Test
  void nameAndPasswordSignIn() {
    assertThat(signIn("OWNER ", TestPeople.PASSWORD)).hasRedirectedUrl("/");
    assertThat(signIn("owner", "not the password")).hasRedirectedUrl("/sign-in?wrong");
    assertThat(signIn("nobody", TestPeople.PASSWORD)).hasRedirectedUrl("/sign-in?wrong");
  }

  @Test
  void guessingIsSlowed() {
    accounts.create("guessed", "Guessed", Role.TECHNICIAN, TestPeople.PASSWORD);
    for (int i = 0; i < 5; i++) {
      assertThat(signIn("guessed", "guess number " + i)).hasRedirectedUrl("/sign-in?wrong");
    }
    assertThat(signIn("guessed", TestPeople.PASSWORD).getResponse().getRedirectedUrl())
        .startsWith("/sign-in?wait=");
    assertThat(mvc.get().uri("/sign-in?wait=8")).bodyText().contains("Wait 8 seconds");
  }

  @Test
  void pagesCarryTheHeaders() {
    assertThat(mvc.get().uri("/sign-in"))
        .hasHeader(
            "Content-Security-Policy",
            "default-src 'self'; img-src 'self' data:; style-src 'self'; script-src 'self';"
                + " frame-ancestors 'none'; form-action 'self'; base-uri 'none'")
        .hasHeader("Referrer-Policy", "same-origin")
        .hasHeader("X-Content-Type-Options", "nosniff")
        .hasHeader("Cache-Control", "no-cache, no-store, max-age=0, must-revalidate");
  }

  @Test
  @AsOwner
  void postWithoutTheFormsTokenIsForbidden() {
    assertThat(mvc.perform(post("/shop/keys").param("label", "x"))).hasStatus(403);
  }

  @Test
  void uploadByAStrangerIsTurnedAwayBeforeItIsRead() {
    assertThat(
            mvc.perform(post("/anything").contentType(MediaType.MULTIPART_FORM_DATA).content("x")))
        .hasRedirectedUrl("/sign-in");
  }

  @Test
  @AsTechnician
  void technicianMayNotManagePeople() {
    assertThat(mvc.get().uri("/shop/people/new")).hasStatus(403);
    assertThat(mvc.perform(post("/shop/people/" + UUID.randomUUID() + "/disable").with(csrf())))
        .hasStatus(403);
    assertThat(mvc.get().uri("/shop/profile")).hasStatus(403);
    assertThat(mvc.get().uri("/shop")).hasStatusOk().bodyText().doesNotContain("Test Owner");
  }

  @Test
  @AsTechnician
  void keysOfOthersDoNotExistForATechnician() {
    Account owner = accounts.bySignInName("owner").orElseThrow();
    String key = keys.make(owner.id(), "the owner's own");
    UUID id =
        keys.all().stream()
            .filter(k -> k.label().equals("the owner's own"))
            .findFirst()
            .orElseThrow()
            .id();
    assertThat(mvc.perform(post("/shop/keys/" + id + "/withdraw").with(csrf()))).hasStatus(404);
    assertThat(keys.holder(key)).isPresent();
  }

  @Test
  @AsTechnician
  void aNewKeyIsShownOnceAndOnlyItsHashKept() {
    MvcTestResult made = mvc.perform(post("/shop/keys").param("label", "test rig").with(csrf()));
    assertThat(made).hasRedirectedUrl("/shop");
    String key = Answers.flash(made, "newKey");
    assertThat(key).matches("tsk_[A-Za-z0-9_-]{43}");
    assertThat(
            jdbc.sql("select key_sha256 from api_key where label = 'test rig'")
                .query(String.class)
                .single())
        .matches("[0-9a-f]{64}")
        .doesNotContain(key);
    assertThat(audit.latest(50))
        .anyMatch(
            e ->
                e.action().equals("access.audit.keyMade")
                    && e.signInName().equals("technician")
                    && e.subject().equals("test rig"));
  }

  @Test
  void apiRefusesWrongKeysWithProblemDetails() {
    for (String header : new String[] {"Bearer tsk_wrong", "Bearer x", "Basic b3duZXI6eA=="}) {
      assertThat(mvc.perform(get("/api/v1/units").header("Authorization", header)))
          .hasStatus(401)
          .hasContentType("application/problem+json;charset=UTF-8")
          .bodyJson()
          .extractingPath("$.code")
          .isEqualTo("keyNeeded");
    }
    assertThat(mvc.get().uri("/api/v1/units")).hasStatus(401);
  }

  @Test
  void aKeyOpensTheApiUntilItIsWithdrawn() {
    Account account = accounts.create("robot", "Robot", Role.TECHNICIAN, null);
    String key = keys.make(account.id(), "robot's");
    assertThat(mvc.perform(get("/api/v1/no-such").header("Authorization", "Bearer " + key)))
        .hasStatus(404)
        .hasContentType(MediaType.APPLICATION_PROBLEM_JSON)
        .bodyJson()
        .extractingPath("$.code")
        .isEqualTo("notFound");
    assertThat(keys.all())
        .filteredOn(k -> k.label().equals("robot's"))
        .first()
        .extracting("lastUsedAt")
        .isNotNull();
    accounts.setEnabled(account.id(), false);
    assertThat(mvc.perform(get("/api/v1/no-such").header("Authorization", "Bearer " + key)))
        .hasStatus(401);
    accounts.setEnabled(account.id(), true);
    keys.withdraw(
        keys.all().stream()
            .filter(k -> k.label().equals("robot's"))
            .findFirst()
            .orElseThrow()
            .id());
    assertThat(mvc.perform(get("/api/v1/no-such").header("Authorization", "Bearer " + key)))
        .hasStatus(401);
  }

  @Test
  @AsOwner
  void aSessionDoesNotOpenTheApi() {
    MvcTestResult signedIn = signIn("owner", TestPeople.PASSWORD);
    MockHttpSession session = Answers.session(signedIn);
    assertThat(mvc.perform(get("/api/v1/openapi").session(session)))
        .hasStatusOk()
        .bodyJson()
        .extractingPath("$.info.title")
        .isEqualTo("Turnsheet");
  }

  @Test
  void enterAddressSignsInOnceAndSurvivesALook() {
    Account guest = accounts.create("guest", "Guest", Role.TECHNICIAN, null);
    String address = addresses.issue(Purpose.ENTER, guest.id(), Duration.ofHours(1));
    assertThat(mvc.get().uri(address)).hasStatusOk();
    assertThat(mvc.get().uri(address)).hasStatusOk();
    MvcTestResult entered = mvc.perform(post(address).with(csrf()));
    assertThat(entered).hasRedirectedUrl("/");
    MockHttpSession session = Answers.session(entered);
    assertThat(mvc.perform(get("/shop").session(session))).hasStatusOk();
    assertThat(mvc.perform(post(address).with(csrf()))).hasStatus(404);

    accounts.setEnabled(guest.id(), false);
    assertThat(mvc.perform(get("/shop").session(session))).hasRedirectedUrl("/sign-in");
    accounts.setEnabled(guest.id(), true);
  }

  @Test
  @AsOwner
  void aNewPersonChoosesAPasswordAtTheAddressHandedOver() {
    MvcTestResult added =
        mvc.perform(
            post("/shop/people")
                .param("name", "Newcomer")
                .param("displayName", "New Comer")
                .param("role", "TECHNICIAN")
                .with(csrf()));
    assertThat(added).hasRedirectedUrl("/shop");
    String address = Answers.flash(added, "handOver");
    String path = address.substring(address.indexOf("/enter/"));
    assertThat(
            mvc.perform(post(path).param("password", "short").param("again", "short").with(csrf())))
        .hasStatusOk()
        .bodyText()
        .contains("Use 10 characters or more.");
    assertThat(
            mvc.perform(
                post(path)
                    .param("password", "newcomer's words")
                    .param("again", "newcomer's words")
                    .with(csrf())))
        .hasRedirectedUrl("/");
    assertThat(signIn("newcomer", "newcomer's words")).hasRedirectedUrl("/");
  }

  @Test
  @AsOwner
  void theLastOwnerStays() {
    UUID owner = accounts.bySignInName("owner").orElseThrow().id();
    assertThat(mvc.perform(post("/shop/people/" + owner + "/disable").with(csrf())))
        .hasStatus(422)
        .bodyText()
        .contains("make another owner first");
  }

  private MvcTestResult signIn(String name, String password) {
    return mvc.perform(
        post("/sign-in").param("name", name).param("password", password).with(csrf()));
  }
}
