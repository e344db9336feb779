package turnsheet.access.web;

import jakarta.servlet.FilterChain;
import jakarta.servlet.ServletException;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.io.IOException;
import java.util.Optional;
import org.springframework.http.HttpHeaders;
import org.springframework.security.core.context.SecurityContext;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.web.filter.OncePerRequestFilter;
import turnsheet.access.Account;
import turnsheet.access.ApiKeys;
import turnsheet.access.SignedInUser;

/** Lets a request with a good key speak for the key's account; others stay strangers. */
final class ApiKeyFilter extends OncePerRequestFilter {

  private static final String SCHEME = "Bearer ";

  private final ApiKeys keys;

  ApiKeyFilter(ApiKeys keys) {
    this.keys = keys;
  }

  @Override
  protected void doFilterInternal(
      HttpServletRequest request, HttpServletResponse response, FilterChain chain)
      throws ServletException, IOException {
    String header = request.getHeader(HttpHeaders.AUTHORIZATION);
    if (header != null && header.regionMatches(true, 0, SCHEME, 0, SCHEME.length())) {
      Optional<Account> holder = keys.holder(header.substring(SCHEME.length()).strip());
      holder.ifPresent(ApiKeyFilter::admit);
    }
    chain.doFilter(request, response);
  }

  private static void admit(Account account) {
    SecurityContext context = SecurityContextHolder.createEmptyContext();
    context.setAuthentication(SignIn.token(SignedInUser.of(account)));
    SecurityContextHolder.setContext(context);
  }
}
