package turnsheet.web;

import java.util.Locale;
import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.GetMapping;

/** Pages that only explain: long prose, a template for each language. */
@Controller
class HelpController {

  @GetMapping("/help/recording")
  String recording(Locale locale) {
    return in(locale, "help/recording");
  }

  @GetMapping("/help/words")
  String words(Locale locale) {
    return in(locale, "help/words");
  }

  private static String in(Locale locale, String template) {
    return PageLanguage.isGerman(locale) ? template + "_de" : template;
  }
}
