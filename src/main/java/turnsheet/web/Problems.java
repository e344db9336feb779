package turnsheet.web;

import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;
import org.springframework.http.HttpStatusCode;
import org.springframework.http.MediaType;
import org.springframework.http.ProblemDetail;
import org.springframework.stereotype.Component;
import tools.jackson.databind.json.JsonMapper;

/** Problem details (RFC 9457) with a {@code code} that programs can rely on. */
@Component
public class Problems {

  private final JsonMapper json;

  Problems(JsonMapper json) {
    this.json = json;
  }

  static ProblemDetail problem(HttpStatusCode status, String code, @Nullable String detail) {
    ProblemDetail problem = ProblemDetail.forStatus(status);
    problem.setDetail(detail);
    problem.setProperty("code", code);
    return problem;
  }

  /** Answers from a filter, where no controller is at hand. */
  public void write(HttpServletResponse response, HttpStatus status, String code, String detail)
      throws IOException {
    response.setStatus(status.value());
    response.setContentType(MediaType.APPLICATION_PROBLEM_JSON_VALUE);
    response.setCharacterEncoding(StandardCharsets.UTF_8);
    ProblemDetail problem = problem(status, code, detail);
    problem.setTitle(status.getReasonPhrase());
    json.writeValue(response.getOutputStream(), problem);
  }
}
