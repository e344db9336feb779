package turnsheet.web;

import jakarta.servlet.DispatcherType;
import jakarta.servlet.http.HttpServletRequest;
import org.jspecify.annotations.Nullable;
import org.springframework.security.authentication.AnonymousAuthenticationToken;
import org.springframework.security.core.Authentication;
import org.springframework.security.core.context.SecurityContextHolder;
import org.springframework.stereotype.Component;
import org.springframework.web.context.request.RequestContextHolder;
import org.springframework.web.context.request.ServletRequestAttributes;

/** What the layout asks about the request at hand; templates know it as {@code @layout}. */
@Component("layout")
public class Layout {

  private static final String HELP = "/help/";

  /** Name of the signed-in person; null for a stranger. */
  public @Nullable String visitor() {
    Authentication found = SecurityContextHolder.getContext().getAuthentication();
    if (found == null || found instanceof AnonymousAuthenticationToken) {
      return null;
    }
    return found.getPrincipal() instanceof Visitor v ? v.displayName() : found.getName();
  }

  /** The menu entry that the visitor stands on or below, as an address; empty on error pages. */
  public String section() {
    if (!(RequestContextHolder.getRequestAttributes() instanceof ServletRequestAttributes found)
        || found.getRequest().getDispatcherType() != DispatcherType.REQUEST) {
      return "";
    }
    HttpServletRequest request = found.getRequest();
    String path = request.getRequestURI().substring(request.getContextPath().length());
    // each page of the help is an entry of its own
    int end = path.indexOf('/', path.startsWith(HELP) ? HELP.length() : 1);
    return end < 0 ? path : path.substring(0, end);
  }
}
