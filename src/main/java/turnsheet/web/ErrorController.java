package turnsheet.web;

import jakarta.servlet.RequestDispatcher;
import jakarta.servlet.http.HttpServletRequest;
import org.springframework.http.HttpStatusCode;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.RequestMapping;

/** Errors that arose outside of any controller: in the access rules, in a filter, in a template. */
@Controller
class ErrorController implements org.springframework.boot.webmvc.error.ErrorController {

  private final ErrorAnswers answers;

  ErrorController(ErrorAnswers answers) {
    this.answers = answers;
  }

  @RequestMapping("/error")
  Object error(HttpServletRequest request) {
    if (request.getAttribute(ErrorView.STALE_FORM) != null) {
      return ErrorView.staleForm();
    }
    Object status = request.getAttribute(RequestDispatcher.ERROR_STATUS_CODE);
    Object problem = request.getAttribute(RequestDispatcher.ERROR_EXCEPTION);
    Object address = request.getAttribute(RequestDispatcher.ERROR_REQUEST_URI);
    return answers.answer(
        Answer.to(HttpStatusCode.valueOf(status instanceof Integer s ? s : 404)),
        problem instanceof Throwable t ? t : null,
        request,
        address instanceof String a ? a : request.getRequestURI());
  }
}
