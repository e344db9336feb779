package turnsheet.shop.web;

import java.util.Locale;
import java.util.function.Supplier;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.context.i18n.LocaleContextHolder;
import org.springframework.stereotype.Component;
import org.springframework.validation.Errors;
import turnsheet.core.measure.FigureName;
import turnsheet.shop.RefusedChangeException;
import turnsheet.web.RefusedRequestException;

/** Turns what the shop's rules refuse into a sentence: beside a field, or as an answer. */
@Component
class Refusals {

  private static final String KEY = "shop.refused.";

  private final MessageSource messages;

  Refusals(MessageSource messages) {
    this.messages = messages;
  }

  /** Carries out a change for a program, which gets the sentence as its answer. */
  <T> T orAnswer(Supplier<T> change) {
    try {
      return change.get();
    } catch (RefusedChangeException e) {
      throw answer(e.code(), e.arguments().toArray());
    }
  }

  RefusedRequestException answer(String code, Object... arguments) {
    Locale locale = LocaleContextHolder.getLocale();
    return new RefusedRequestException(
        code, messages.getMessage(KEY + code, named(arguments, locale), locale));
  }

  /**
   * Puts the sentence where people see it.
   *
   * @param field that it belongs to; null for the form as a whole
   */
  void show(RefusedChangeException refused, Errors errors, @Nullable String field) {
    Object[] arguments = named(refused.arguments().toArray(), LocaleContextHolder.getLocale());
    String key = KEY + refused.code();
    if (field == null) {
      errors.reject(key, arguments, refused.code());
    } else {
      errors.rejectValue(field, key, arguments, refused.code());
    }
  }

  private Object[] named(Object[] arguments, Locale locale) {
    Object[] named = arguments.clone();
    for (int i = 0; i < named.length; i++) {
      if (named[i] instanceof FigureName figure) {
        named[i] = messages.getMessage("figure." + figure.path(), null, locale);
      }
    }
    return named;
  }
}
