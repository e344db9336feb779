package turnsheet.access.web;

import jakarta.servlet.FilterChain;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.time.Duration;
import org.springframework.web.filter.OncePerRequestFilter;
import turnsheet.access.SignInLimiter;

/** Turns a sign-in attempt that comes too soon away before the password is looked at. */
final class LimiterFilter extends OncePerRequestFilter {

  private final SignInLimiter limiter;

  LimiterFilter(SignInLimiter limiter) {
    this.limiter = limiter;
  }

  @Override
  protected boolean shouldNotFilter(HttpServletRequest request) {
    return !("POST".equals(request.getMethod()) && SignInController.PATH.equals(path(request)));
  }

  @Override
  protected void doFilterInternal(
      HttpServletRequest request, HttpServletResponse response, FilterChain chain)
      throws ServletException, IOException {
    Duration wait = limiter.wait(name(request), request.getRemoteAddr());
    if (wait.isZero()) {
      chain.doFilter(request, response);
    } else {
      long seconds = wait.plusMillis(999).toSeconds();
      response.sendRedirect(request.getContextPath() + SignInController.PATH + "?wait=" + seconds);
    }
  }

  static String name(HttpServletRequest request) {
    String name = request.getParameter(SignInController.NAME);
    return name == null ? "" : name;
  }

  private static String path(HttpServletRequest request) {
    return request.getRequestURI().substring(request.getContextPath().length());
  }
}
