package turnsheet.web;

import static org.assertj.core.api.Assertions.assertThat;

import jakarta.validation.Valid;
import jakarta.validation.constraints.NotBlank;
import java.util.List;
import java.util.UUID;
import org.junit.jupiter.api.Test;
import org.springframework.http.MediaType;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.assertj.MvcTestResult;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.PostMapping;
import org.springframework.web.bind.annotation.RequestBody;
import org.springframework.web.bind.annotation.RestController;

class ErrorAnswersTest {

  /** One and the same trouble under a page's address and under one of the API. */
  @RestController
  static class Trouble {
    record Body(@NotBlank String name) {}

    @GetMapping({"/missing", "/api/missing"})
    String missing() {
      throw new NotFoundException("unit");
    }

    @GetMapping({"/refused", "/api/refused"})
    String refused() {
      throw new RefusedRequestException("visitClosed", "The visit is closed; open a new one.");
    }

    @GetMapping({"/broken", "/api/broken"})
    String broken() {
      throw new IllegalStateException("secret inner detail");
    }

    @GetMapping({"/things/{id}", "/api/things/{id}"})
    String thing(@PathVariable UUID id) {
      return id.toString();
    }

    @PostMapping("/api/bodies")
    String body(@Valid @RequestBody Body body) {
      return body.name();
    }
  }

  private final MockMvcTester mvc =
      MockMvcTester.of(
          List.of(new Trouble()),
          builder -> builder.setControllerAdvice(new ErrorAnswers()).build());

  @Test
  void pagesGetTheErrorPageWithItsStatus() {
    assertThat(mvc.get().uri("/missing"))
        .hasStatus(404)
        .hasViewName("error/page")
        .model()
        .containsEntry("titleKey", "web.error.404.title")
        .containsEntry("sentence", "There is no such unit.");
    assertThat(mvc.get().uri("/refused"))
        .hasStatus(422)
        .model()
        .containsEntry("sentence", "The visit is closed; open a new one.");
    assertThat(mvc.get().uri("/things/not-an-id")).hasStatus(404);
    assertThat(mvc.post().uri("/missing"))
        .hasStatus(405)
        .model()
        .containsEntry("titleKey", "web.error.400.title");
  }

  @Test
  void brokenPageGivesAReferenceAndNothingOfTheException() {
    MvcTestResult answer = mvc.get().uri("/broken").exchange();
    assertThat(answer).hasStatus(500).hasViewName("error/page");
    assertThat(answer).model().containsEntry("sentence", null);
    assertThat(answer).model().extracting("reference").asString().matches("[0-9a-f]{8}");
  }

  @Test
  void theApiGetsProblemDetailsWithACode() {
    assertThat(mvc.get().uri("/api/missing"))
        .hasStatus(404)
        .hasContentType(MediaType.APPLICATION_PROBLEM_JSON)
        .bodyJson()
        .isLenientlyEqualTo(
            """
            {"status": 404, "code": "notFound", "detail": "There is no such unit."}
            """);
    assertThat(mvc.get().uri("/api/refused"))
        .hasStatus(422)
        .bodyJson()
        .extractingPath("$.code")
        .isEqualTo("visitClosed");
    assertThat(mvc.get().uri("/api/things/not-an-id"))
        .hasStatus(404)
        .bodyJson()
        .extractingPath("$.code")
        .isEqualTo("notFound");
    assertThat(mvc.post().uri("/api/missing"))
        .hasStatus(405)
        .bodyJson()
        .extractingPath("$.code")
        .isEqualTo("methodNotAllowed");
  }

  @Test
  void theApiIsToldWhichFieldIsWrong() {
    assertThat(
            mvc.post()
                .uri("/api/bodies")
                .contentType(MediaType.APPLICATION_JSON)
                .content("{\"name\": \" \"}"))
        .hasStatus(422)
        .bodyJson()
        .isLenientlyEqualTo(
            """
            {"code": "invalid", "fields": [{"field": "name"}]}
            """);
    assertThat(mvc.post().uri("/api/bodies").contentType(MediaType.APPLICATION_JSON).content("{"))
        .hasStatus(400)
        .bodyJson()
        .extractingPath("$.code")
        .isEqualTo("unreadable");
  }

  @Test
  void theApiGetsAReferenceAndNothingOfTheException() {
    MvcTestResult answer = mvc.get().uri("/api/broken").exchange();
    assertThat(answer).hasStatus(500).bodyJson().extractingPath("$.code").isEqualTo("internal");
    assertThat(answer).bodyText().contains("reference").doesNotContain("secret");
  }

  @Test
  void aRequestForTextStillGetsTheProblemDocument() {
    assertThat(mvc.get().uri("/api/missing").accept("text/csv"))
        .hasStatus(404)
        .hasContentType(MediaType.APPLICATION_PROBLEM_JSON);
  }
}
