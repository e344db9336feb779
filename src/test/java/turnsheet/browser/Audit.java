package turnsheet.browser;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import turnsheet.web.EnglishLeft;

/** What holds for every page: looks at the one that stands open and tells what is wrong with it. */
final class Audit {

  private static final String AXE = axe();

  /** Levels A and AA of the Web Content Accessibility Guidelines 2.0, 2.1 and 2.2. */
  private static final String RULES =
      """
      const done = arguments[arguments.length - 1];
      axe.run({ runOnly: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"], resultTypes: ["violations"],
          preload: false, rules: { "color-contrast": { enabled: COLOURS } } })
        .then((r) => done(r.violations.flatMap((v) => v.nodes.slice(0, 3).map((n) =>
          v.id + ": " + n.target.join(" ") + " (" + n.any.concat(n.all, n.none).map((c) => c.message).slice(0, 1) + ")"))))
        .catch((e) => done(["axe failed: " + e]));
      """;

  /** The widest elements that stick out and are not in a box that scrolls by itself. */
  private static final String SPILLS =
      """
      const root = document.documentElement;
      if (root.scrollWidth <= root.clientWidth) return [];
      const scrolls = (e) => e && e !== document.body && (getComputedStyle(e).overflowX !== "visible" || scrolls(e.parentElement));
      const out = [...document.body.querySelectorAll("*")]
        .filter((e) => e.getBoundingClientRect().right > root.clientWidth + 0.5 && !scrolls(e.parentElement))
        .map((e) => e.localName + (e.className ? "." + e.className : "") + " to " + Math.round(e.getBoundingClientRect().right));
      return [root.scrollWidth + " px wide: " + out.slice(-3).join(", ")];
      """;

  /**
   * Fields that stand side by side and do not begin on one line, and charts that hide the newest.
   */
  private static final String UNEVEN =
      """
      const out = [];
      for (const row of document.querySelectorAll(".row:not(.search)")) {
        const tops = new Map();
        for (const field of row.querySelectorAll(":scope > .field")) {
          const control = field.querySelector("input, select");
          if (!control) continue;
          const at = Math.round(field.getBoundingClientRect().top);
          const top = control.getBoundingClientRect().top;
          if (Math.abs((tops.get(at) ?? top) - top) > 1) out.push("uneven beside its neighbour: " + control.name);
          tops.set(at, top);
        }
      }
      for (const box of document.querySelectorAll(".plot-drawn.latest")) {
        const drawing = box.querySelector("svg");
        if (drawing && drawing.getBoundingClientRect().right > box.getBoundingClientRect().right + 1) out.push("a chart does not begin at its newest end");
      }
      return out;
      """;

  private static final String HTML = "return document.documentElement.outerHTML";
  private static final Pattern MISSING_TEXT = Pattern.compile("\\?\\?[\\w.]+\\?\\?");
  private static final int DESKTOP_PX = 1280;
  private static final int TABLET_PX = 600;
  private static final int PHONE_PX = 390;
  private static final int NARROW_PHONE_PX = 360;

  private final Visitor visitor;

  Audit(Visitor visitor) {
    this.visitor = visitor;
  }

  /** Everything wrong with a page that should answer with this status; each line names the page. */
  List<String> of(String page, int status) {
    var wrong = new ArrayList<String>();
    Object answered =
        visitor.script("return performance.getEntriesByType('navigation')[0].responseStatus");
    if (!(answered instanceof Number n) || n.intValue() != status) {
      wrong.add("answers " + answered);
    }
    Matcher missing = MISSING_TEXT.matcher(String.valueOf(visitor.script(HTML)));
    while (missing.find()) {
      wrong.add("text without message " + missing.group());
    }
    visitor.script(AXE);
    visitor.size(DESKTOP_PX, 900);
    wrong.addAll(list("desktop", visitor.awaitScript(rules(true))));
    wrong.addAll(spills("desktop"));
    wrong.addAll(list("desktop", visitor.script(UNEVEN)));
    visitor.size(PHONE_PX, 844);
    scheme("dark");
    wrong.addAll(list("phone, dark", visitor.awaitScript(rules(true))));
    scheme("light");
    wrong.addAll(spills("phone"));
    visitor.size(NARROW_PHONE_PX, 740);
    wrong.addAll(spills("narrow phone"));
    wrong.addAll(list("narrow phone", visitor.script(UNEVEN)));
    visitor.anySize();
    for (String complaint : visitor.complaints()) {
      // the browser itself reports the status of a page that is meant to fail
      if (status < 400 || !complaint.contains("status of " + status)) {
        wrong.add("console: " + complaint);
      }
    }
    return wrong.stream().map(line -> page + ": " + line).toList();
  }

  /**
   * Everything wrong with a page in German that has been looked at in English: at one width, the
   * narrowest, and without its colours, since words, names and lengths are all that differs.
   */
  List<String> ofGerman(String page) {
    var wrong = new ArrayList<String>();
    EnglishLeft.in(String.valueOf(visitor.script(HTML)))
        .forEach(text -> wrong.add("English: " + text));
    visitor.script(AXE);
    visitor.size(NARROW_PHONE_PX, 740);
    wrong.addAll(list("narrow phone", visitor.awaitScript(rules(false))));
    wrong.addAll(spills("narrow phone"));
    visitor.size(TABLET_PX, 900); // where German words take two lines beside one
    wrong.addAll(list("tablet", visitor.script(UNEVEN)));
    visitor.anySize();
    return wrong.stream().map(line -> "in German, " + page + ": " + line).toList();
  }

  /** What sticks out of the page as it stands now. */
  List<String> spills(String where) {
    return list(where, visitor.script(SPILLS));
  }

  /**
   * The scan.
   *
   * @param colours whether contrasts are looked at, which takes most of its time
   */
  private static String rules(boolean colours) {
    return RULES.replace("COLOURS", Boolean.toString(colours));
  }

  private void scheme(String scheme) {
    visitor.protocol(
        "Emulation.setEmulatedMedia",
        Map.of("features", List.of(Map.of("name", "prefers-color-scheme", "value", scheme))));
  }

  private static List<String> list(String where, Object answer) {
    return answer instanceof List<?> lines
        ? lines.stream().map(line -> where + ": " + line).toList()
        : List.of(where + ": no answer");
  }

  private static String axe() {
    try (InputStream in = Audit.class.getResourceAsStream("/axe.min.js")) {
      if (in == null) {
        throw new IllegalStateException("axe.min.js is not among the test dependencies");
      }
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException("reading axe", e);
    }
  }
}
