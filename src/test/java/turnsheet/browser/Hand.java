package turnsheet.browser;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.openqa.selenium.Rectangle;
import org.openqa.selenium.WebElement;

/**
 * The mouse, as the browser itself feels it: pressed, drawn across, and with files from outside.
 */
final class Hand {

  /** Chrome DevTools Protocol, Input domain: bit 3 of the modifiers. */
  private static final int SHIFT = 8;

  private final Visitor visitor;

  Hand(Visitor visitor) {
    this.visitor = visitor;
  }

  /** Presses at one share of the width, draws to another and lets go, halfway up. */
  void draw(WebElement over, double from, double to, boolean withShift) {
    place(over);
    int modifiers = withShift ? SHIFT : 0;
    mouse("mouseMoved", over, from, modifiers, 0);
    mouse("mousePressed", over, from, modifiers, 1);
    for (int step = 1; step <= 10; step++) {
      mouse("mouseMoved", over, from + (to - from) * step / 10, modifiers, 1);
    }
    mouse("mouseReleased", over, to, modifiers, 0);
  }

  /** Lets files fall on an element. */
  void drop(WebElement target, Path... files) {
    Rectangle place = place(target);
    for (String type : List.of("dragEnter", "dragOver", "drop")) {
      visitor.protocol(
          "Input.dispatchDragEvent",
          Map.of(
              "type",
              type,
              "x",
              place.x + place.width / 2.0,
              "y",
              place.y + 8.0,
              "data",
              Map.of(
                  "items",
                  List.of(),
                  "files",
                  Stream.of(files).map(Path::toString).toList(),
                  "dragOperationsMask",
                  1)));
    }
  }

  private void mouse(String type, WebElement over, double share, int modifiers, int buttons) {
    Rectangle place = inWindow(over);
    visitor.protocol(
        "Input.dispatchMouseEvent",
        Map.of(
            "type",
            type,
            "x",
            place.x + share * place.width,
            "y",
            place.y + place.height / 2.0,
            "modifiers",
            modifiers,
            "button",
            type.equals("mouseMoved") && buttons == 0 ? "none" : "left",
            "buttons",
            buttons,
            "clickCount",
            type.equals("mouseMoved") ? 0 : 1));
  }

  private Rectangle place(WebElement element) {
    visitor.script("arguments[0].scrollIntoView({ block: 'center' })", element);
    return inWindow(element);
  }

  private Rectangle inWindow(WebElement element) {
    List<?> box =
        (List<?>)
            visitor.script(
                "const r = arguments[0].getBoundingClientRect();"
                    + " return [r.x, r.y, r.height, r.width].map(Math.round)",
                element);
    return new Rectangle(number(box, 0), number(box, 1), number(box, 2), number(box, 3));
  }

  private static int number(List<?> box, int at) {
    return ((Number) box.get(at)).intValue();
  }
}
