package turnsheet.access.web;

import jakarta.servlet.FilterChain;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import jakarta.servlet.http.HttpSession;
import java.io.IOException;
import org.springframework.security.core.Authentication;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.web.filter.OncePerRequestFilter;
import turnsheet.access.Account;
import turnsheet.access.Accounts;
import turnsheet.access.SignedInUser;

/**
 * Ends the session of an account that was disabled meanwhile, and turns an upload by a stranger
 * away before its body is read: looking for the form's token in it would store it first.
 */
final class StandingFilter extends OncePerRequestFilter {

  private final Accounts accounts;

  StandingFilter(Accounts accounts) {
    this.accounts = accounts;
  }

  @Override
  protected void doFilterInternal(
      HttpServletRequest request, HttpServletResponse response, FilterChain chain)
      throws ServletException, IOException {
    Authentication visitor = SecurityContextHolder.getContext().getAuthentication();
    if (visitor != null
        && visitor.getPrincipal() instanceof SignedInUser user
        && accounts.byId(user.accountId()).filter(Account::enabled).isEmpty()) {
      SecurityContextHolder.clearContext();
      HttpSession session = request.getSession(false);
      if (session != null) {
        session.invalidate();
      }
      visitor = null;
    }
    if (visitor == null && isUpload(request)) {
      response.sendRedirect(request.getContextPath() + SignInController.PATH);
    } else {
      chain.doFilter(request, response);
    }
  }

  private static boolean isUpload(HttpServletRequest request) {
    String type = request.getContentType();
    return type != null && type.regionMatches(true, 0, "multipart/", 0, 10);
  }
}
