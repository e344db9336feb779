package turnsheet.web;

import org.springframework.stereotype.Controller;
import org.springframework.web.bind.annotation.GetMapping;

/** Pages that only explain. */
@Controller
class HelpController {

  @GetMapping("/help/recording")
  String recording() {
    return "help/recording";
  }

  @GetMapping("/help/words")
  String words() {
    return "help/words";
  }
}
