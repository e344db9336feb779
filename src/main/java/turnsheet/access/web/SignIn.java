package turnsheet.access.web;

import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import org.springframework.security.authentication.UsernamePasswordAuthenticationToken;
import org.springframework.security.core.context.SecurityContext;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.security.web.context.HttpSessionSecurityContextRepository;
import org.springframework.stereotype.Component;
import turnsheet.access.Account;
import turnsheet.access.SignedInUser;

/** Signs in someone who proved who he is by a one-time address. */
@Component
class SignIn {

  void as(Account account, HttpServletRequest request, HttpServletResponse response) {
    request.getSession();
    request.changeSessionId(); // a session planted before must not become a signed-in one
    SecurityContext context = SecurityContextHolder.createEmptyContext();
    context.setAuthentication(token(SignedInUser.of(account)));
    SecurityContextHolder.setContext(context);
    new HttpSessionSecurityContextRepository().saveContext(context, request, response);
  }

  static UsernamePasswordAuthenticationToken token(SignedInUser user) {
    return UsernamePasswordAuthenticationToken.authenticated(user, null, user.getAuthorities());
  }
}
