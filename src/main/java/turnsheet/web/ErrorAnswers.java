package turnsheet.web;

import jakarta.servlet.http.HttpServletRequest;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.slf4j.Logger;
import org.slf4j.LoggerFactory;
import org.springframework.core.Ordered;
import org.springframework.core.annotation.Order;
import org.springframework.http.MediaType;
import org.springframework.http.ProblemDetail;
import org.springframework.http.ResponseEntity;
import org.springframework.security.access.AccessDeniedException;
import org.springframework.security.core.AuthenticationException;
import org.springframework.stereotype.Component;
import org.springframework.web.bind.annotation.ControllerAdvice;
import org.springframework.web.bind.annotation.ExceptionHandler;
import org.springframework.web.context.request.async.AsyncRequestNotUsableException;

/** Exceptions as answers: problem details under {@code /api}, the error page elsewhere. */
@ControllerAdvice
@Component
@Order(Ordered.HIGHEST_PRECEDENCE)
class ErrorAnswers {

  private static final Logger LOG = LoggerFactory.getLogger(ErrorAnswers.class);

  /** The access rules answer these themselves, further out. */
  @ExceptionHandler
  void denied(AccessDeniedException e) {
    throw e;
  }

  @ExceptionHandler
  void unknown(AuthenticationException e) {
    throw e;
  }

  /** The visitor has gone; there is nobody to answer. */
  @ExceptionHandler
  void gone(AsyncRequestNotUsableException e) {}

  @ExceptionHandler
  Object any(Exception problem, HttpServletRequest request) {
    return answer(Answer.to(problem), problem, request, request.getRequestURI());
  }

  /** A page or a problem document, by the address that was asked for. */
  Object answer(
      Answer answer, @Nullable Throwable problem, HttpServletRequest request, String address) {
    String reference = null;
    if (answer.status().is5xxServerError()) {
      reference = UUID.randomUUID().toString().substring(0, 8);
      LOG.error("Reference {}: {} {}", reference, request.getMethod(), address, problem);
    }
    return address.startsWith(request.getContextPath() + "/api/")
        ? document(answer, reference)
        : ErrorView.of(answer.status(), answer.sentence(), reference);
  }

  private static ResponseEntity<ProblemDetail> document(Answer answer, @Nullable String reference) {
    String detail = answer.sentence();
    if (detail == null && reference != null) {
      detail = "Something went wrong here; the log of the service has it under this reference.";
    }
    ProblemDetail problem = Problems.problem(answer.status(), answer.code(), detail);
    if (reference != null) {
      problem.setProperty("reference", reference);
    }
    if (!answer.fields().isEmpty()) {
      problem.setProperty("fields", answer.fields());
    }
    return ResponseEntity.status(answer.status())
        .contentType(MediaType.APPLICATION_PROBLEM_JSON)
        .body(problem);
  }
}
