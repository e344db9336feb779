package turnsheet.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import org.springframework.http.HttpStatus;
import org.springframework.http.HttpStatusCode;
import org.springframework.http.converter.HttpMessageNotReadableException;
import org.springframework.web.ErrorResponse;
import org.springframework.web.bind.MethodArgumentNotValidException;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.method.annotation.MethodArgumentTypeMismatchException;
import org.springframework.web.multipart.MultipartException;
import org.springframework.web.servlet.resource.NoResourceFoundException;

/**
 * What an exception means to whoever asked.
 *
 * @param code for programs
 * @param sentence for people; null where nothing of the exception may be shown
 * @param fields what is wrong with which field; empty unless the request was bound and refused
 */
record Answer(
    HttpStatusCode status, String code, @Nullable String sentence, List<WrongField> fields) {

  record WrongField(String field, String message) {}

  static Answer to(Throwable problem) {
    if (problem instanceof NotFoundException e) {
      return of(HttpStatus.NOT_FOUND, "notFound", e.getMessage());
    }
    if (problem instanceof RefusedRequestException e) {
      return of(HttpStatus.UNPROCESSABLE_CONTENT, e.code(), e.getMessage());
    }
    if (problem instanceof OvertakenException e) {
      return of(HttpStatus.CONFLICT, e.code(), e.getMessage());
    }
    if (problem instanceof MethodArgumentNotValidException e) {
      return invalid(e);
    }
    if (problem instanceof MethodArgumentTypeMismatchException e) {
      return e.getParameter().hasParameterAnnotation(PathVariable.class)
          ? of(HttpStatus.NOT_FOUND, "notFound", "There is nothing at this address.")
          : of(
              HttpStatus.BAD_REQUEST, "badRequest", "The value of '" + e.getName() + "' is wrong.");
    }
    if (problem instanceof HttpMessageNotReadableException) {
      return of(HttpStatus.BAD_REQUEST, "unreadable", "The body of the request cannot be read.");
    }
    if (problem instanceof NoResourceFoundException) {
      return to(HttpStatus.NOT_FOUND);
    }
    if (problem instanceof ErrorResponse e) {
      return of(e.getStatusCode(), code(e.getStatusCode()), e.getBody().getDetail());
    }
    if (problem instanceof MultipartException) {
      return of(HttpStatus.BAD_REQUEST, "badUpload", "The upload broke off or is not a form.");
    }
    return of(HttpStatus.INTERNAL_SERVER_ERROR, "internal", null);
  }

  /** What a bare status means, where the exception is gone. */
  static Answer to(HttpStatusCode status) {
    return of(status, code(status), null);
  }

  private static Answer of(HttpStatusCode status, String code, @Nullable String sentence) {
    return new Answer(status, code, status.is5xxServerError() ? null : sentence, List.of());
  }

  private static Answer invalid(MethodArgumentNotValidException e) {
    List<WrongField> fields =
        e.getFieldErrors().stream()
            .map(f -> new WrongField(f.getField(), String.valueOf(f.getDefaultMessage())))
            .toList();
    return new Answer(
        HttpStatus.UNPROCESSABLE_CONTENT, "invalid", "Some fields are missing or wrong.", fields);
  }

  private static String code(HttpStatusCode status) {
    return switch (status.value()) {
      case 401 -> "keyNeeded";
      case 403 -> "notAllowed";
      case 404 -> "notFound";
      case 405 -> "methodNotAllowed";
      case 406 -> "notAcceptable";
      case 413 -> "tooLarge";
      case 415 -> "unsupportedMediaType";
      default -> status.is5xxServerError() ? "internal" : "badRequest";
    };
  }
}
