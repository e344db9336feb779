package turnsheet.access.web;

import jakarta.servlet.RequestDispatcher;
import jakarta.servlet.http.HttpServletRequest;
import jakarta.servlet.http.HttpServletResponse;
import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.context.i18n.LocaleContextHolder;
import org.springframework.dao.DataAccessException;
import org.springframework.stereotype.Component;
import org.springframework.web.servlet.LocaleResolver;
import turnsheet.access.ShopLanguage;
import turnsheet.web.PageLanguage;

/**
 * The language of a page: what its controller has said, else the shop's, and before the first run
 * German where the browser asks for it. What programs read is English. Numbers follow the language
 * of the page, not of the browser.
 */
@Component("localeResolver") // by this name the dispatcher finds it
class ShopLocaleResolver implements LocaleResolver {

  private static final String OF_SHOP = ShopLocaleResolver.class.getName() + ".shop";

  private final ShopLanguage language;

  ShopLocaleResolver(ShopLanguage language) {
    this.language = language;
    // what is said outside of a request is English, whatever the machine speaks
    LocaleContextHolder.setDefaultLocale(PageLanguage.ENGLISH);
  }

  @Override
  public Locale resolveLocale(HttpServletRequest request) {
    if (request.getAttribute(PageLanguage.attribute()) instanceof Locale said) {
      return said;
    }
    if (isForPrograms(request)) {
      return PageLanguage.ENGLISH;
    }
    // asked several times for one page
    if (request.getAttribute(OF_SHOP) instanceof Locale known) {
      return known;
    }
    Locale shop = ofShop(request);
    request.setAttribute(OF_SHOP, shop);
    return shop;
  }

  @Override
  public void setLocale(
      HttpServletRequest request, @Nullable HttpServletResponse response, @Nullable Locale locale) {
    throw new UnsupportedOperationException("the shop page sets the language");
  }

  private Locale ofShop(HttpServletRequest request) {
    try {
      return language.get().orElseGet(() -> PageLanguage.of(request.getLocale().getLanguage()));
    } catch (DataAccessException e) {
      return PageLanguage.ENGLISH; // the page that tells of the failure must not fail too
    }
  }

  private static boolean isForPrograms(HttpServletRequest request) {
    Object failed = request.getAttribute(RequestDispatcher.ERROR_REQUEST_URI);
    String path = failed instanceof String address ? address : request.getRequestURI();
    return path.startsWith(request.getContextPath() + "/api/");
  }
}
