package turnsheet.browser;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.regex.Pattern;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.io.TempDir;
import turnsheet.jar.RunningService;

/** Every page of the demo, one address of each shape, on a desktop and on a phone. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class AccessibilityIT {

  private static final Pattern ADDRESS = Pattern.compile("Open the demo: (\\S+)");
  private static final Pattern ID =
      Pattern.compile("[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}|(?<=/)\\d+(?=/|$)");

  /** Files rather than pages. */
  private static final Pattern FILE =
      Pattern.compile("/api/|\\.(csv|json|wav|yaml)$|/file$|/pdf$|/progress$|/photo$|/webjars/");

  /** Pages that look different from one recording or unit to the next. */
  private static final Map<String, Integer> SEVERAL =
      Map.of(
          "/readings/{id}", 2,
          "/captures/{id}", 3,
          "/captures/{id}/evidence", 2,
          "/visits/{id}", 2,
          "/visits/{id}/sheet", 2,
          "/instruments/{id}", 2);

  private static final String LINKS =
      "return [...document.querySelectorAll('a[href]')].map((a) => a.href.split('#')[0])";

  /** Goes by itself from the units to the first capture on which filters can be tried. */
  private static final String TRIALS =
      """
      return (async () => {
      const text = async (address) => (await fetch(address)).text();
      const found = (page, pattern) => [...new Set(page.match(pattern) ?? [])];
      const id = '[0-9a-f-]{36}';
      for (const unit of found(await text('/units'), RegExp('/units/' + id, 'g'))) {
        for (const visit of found(await text(unit), RegExp('/visits/' + id + '(?=")', 'g'))) {
          for (const reading of found(await text(visit), RegExp('/readings/' + id, 'g'))) {
            const to = found(await text(reading), RegExp('/captures/' + id + '/trials', 'g'));
            if (to.length) { return location.origin + to[0]; }
          }
        }
      }
      return 'none';
      })();
      """;

  private RunningService service;
  private Visitor visitor;
  private Audit audit;
  private SentPages sent;
  private String linksPage = "";
  private final List<String> visited = new ArrayList<>();

  @BeforeAll
  void start(@TempDir Path folder) throws Exception {
    service = RunningService.start("demo", folder);
    visitor = new Visitor(1280, 900);
    audit = new Audit(visitor);
    sent = new SentPages(visitor);
  }

  @AfterAll
  void stop() {
    visitor.close();
    service.close();
  }

  @Test
  void everyPageOfTheDemoHolds() throws Exception {
    String door = service.printed(ADDRESS, Duration.ofMinutes(3));
    var wrong = new ArrayList<String>();

    visitor.open(service.address("/sign-in"));
    wrong.addAll(look("/sign-in", 200));
    visitor.open(door);
    wrong.addAll(look("/enter", 200));
    visitor.pressButton("Sign in");
    Set<String> shapes = crawl(wrong);
    visitor.open(service.address("/no-such-page"));
    wrong.addAll(look("/no-such-page", 404));
    visitor.open(service.address("/import"));
    wrong.addAll(look("/import", 200));
    wrong.addAll(evidence());
    wrong.addAll(kindsOfParts());
    wrong.addAll(sharing(shapes));
    wrong.addAll(trying());
    wrong.addAll(german());

    System.out.println("Pages looked at: " + String.join(" ", shapes));
    assertThat(shapes)
        .contains("/reports", "/reports/{id}", "/reports/{id}/revise", "/check")
        .contains("/export", "/export?unit=", "/export?visit=")
        .contains("/", "/units/{id}", "/visits/{id}", "/readings/{id}", "/models/{id}", "/shop")
        .contains("/captures/{id}/evidence")
        .contains("/units/{id}/label", "/shop/preferences", "/visits/{id}/remove")
        .contains("/instruments/{id}/clock-checks/{id}", "/instruments/{id}/clock-checks/new");
    // the signed-in shapes and the twelve pages opened by hand, each with its file for the checker
    assertThat(sent.count()).isGreaterThanOrEqualTo(shapes.size() + 12);
    assertThat(wrong).as(String.join("\n", wrong)).isEmpty();
  }

  /** Keeps the page for the markup checker and tells what is wrong with it. */
  private List<String> look(String page, int status) throws IOException {
    sent.keep(page);
    return audit.of(page, status);
  }

  private Set<String> crawl(List<String> wrong) throws IOException {
    var seen = new HashMap<String, Integer>();
    var queued = new HashSet<String>();
    var queue = new ArrayDeque<String>();
    queue.add(service.address("/"));
    while (!queue.isEmpty()) {
      String address = queue.poll();
      String shape = shape(address);
      if (seen.getOrDefault(shape, 0) >= SEVERAL.getOrDefault(shape, 1)) {
        continue;
      }
      seen.merge(shape, 1, Integer::sum);
      visitor.open(address);
      visited.add(address);
      wrong.addAll(look(shape, 200));
      for (Object link : (List<?>) visitor.script(LINKS)) {
        String next = String.valueOf(link);
        if (next.startsWith(service.address("/"))
            && !FILE.matcher(path(next)).find()
            && queued.add(next)) {
          queue.add(next);
        }
      }
    }
    return seen.keySet();
  }

  /** A trial that is called off, one that comes to a circuit, and its removal. */
  private List<String> trying() throws IOException {
    var wrong = new ArrayList<String>();
    String trials = String.valueOf(visitor.script(TRIALS));
    visitor.open(trials);
    visited.add(trials);
    wrong.addAll(look("/captures/{id}/trials", 200));
    visitor.fill("steps", "8");
    visitor.pressButton("Try them");
    // nearly 200 filters take two processors some seconds
    visitor.pressButton("Cancel the trial");
    assertThat(visitor.find("main .lead").getText()).contains("called off");
    wrong.addAll(look("/trials/{id}, called off", 200));

    visitor.open(trials);
    for (String extra : List.of("kinds][value=BAND_PASS", "families][value=BESSEL")) {
      visitor.find("input[name=" + extra + "]").click();
    }
    visitor.fill("steps", "2");
    visitor.fill("hysteresis", "2");
    visitor.pressButton("Try them");
    visitor.awaitTrue(() -> !visitor.all("#maps").isEmpty());
    visitor.open(visitor.address() + "?candidate=2");
    visited.add(visitor.address());
    assertThat(visitor.all("svg.stage")).hasSize(1);
    wrong.addAll(look("/trials/{id}", 200));
    visitor.open(visitor.address().replaceAll("\\?.*", "") + "/remove");
    visited.add(visitor.address());
    wrong.addAll(look("/trials/{id}/remove", 200));
    return wrong;
  }

  /** What a closer look shows, of each recording whose page was seen before it. */
  private List<String> evidence() throws IOException {
    var wrong = new ArrayList<String>();
    for (String address : visited.stream().filter(a -> a.endsWith("/evidence")).toList()) {
      visitor.open(address);
      visitor.pressButton("Look closer");
      visitor.awaitTrue(
          () -> visitor.all("main button").stream().anyMatch(b -> b.getText().endsWith("again")));
      wrong.addAll(look("/captures/{id}/evidence after the look", 200));
    }
    return wrong;
  }

  /** The fields of a part, which differ from kind to kind and stand behind a button. */
  private List<String> kindsOfParts() throws IOException {
    String model =
        visited.stream()
            .filter(a -> a.matches(".*/models/[0-9a-f-]{36}"))
            .findFirst()
            .orElseThrow();
    var wrong = new ArrayList<String>();
    for (String kind : List.of("BEARING", "REEL", "MOTOR", "BELT")) {
      visitor.open(model + "/parts/new?kind=" + kind);
      wrong.addAll(look("/models/{id}/parts/new of " + kind, 200));
    }
    return wrong;
  }

  /** The customer's page, and what is left of it when the link is withdrawn. */
  private List<String> sharing(Set<String> shapes) throws IOException {
    assertThat(shapes).contains("/reports/{id}/links");
    var wrong = new ArrayList<String>();
    visitor.open(service.address(linksPage));
    visitor.find("input[name=history]").click();
    visitor.pressButton("Make a link");
    wrong.addAll(look("/reports/{id}/links with a new link", 200));
    String shared = visitor.find("#address").getDomProperty("value");
    visitor.open(shared);
    wrong.addAll(look("/s/{token}", 200));
    visitor.open(shared + "/history");
    wrong.addAll(look("/s/{token}/history", 200));
    visitor.open(service.address("/s/none"));
    wrong.addAll(look("/s/none", 404));
    return wrong;
  }

  /** The same addresses once more: German words are longer, and no English may be left. */
  private List<String> german() {
    var wrong = new ArrayList<String>();
    visitor.open(service.address("/shop/preferences"));
    visitor.choose("language", "de");
    visitor.pressButton("Save the preferences");
    var looked = new HashSet<String>();
    for (String address : visited) {
      if (looked.add(shape(address))) {
        visitor.open(address);
        wrong.addAll(audit.ofGerman(shape(address)));
      }
    }
    return wrong;
  }

  private String shape(String address) {
    String path = path(address);
    String shape =
        ID.matcher(path)
            .replaceAll("{id}")
            .replaceAll("/limits/\\{id}/[^/]+", "/limits/{id}/{figure}");
    if (shape.equals("/reports/{id}/links")) {
      linksPage = path;
    }
    String query = address.contains("?") ? address.substring(address.indexOf('?')) : "";
    return shape + query.replaceAll("=[^&]*", "=");
  }

  private String path(String address) {
    return address.substring(service.address("").length()).replaceAll("\\?.*", "");
  }
}
