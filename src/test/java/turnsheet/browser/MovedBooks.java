package turnsheet.browser;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import turnsheet.jar.RunningService;

/** The books of a unit on their way from one service to another, by the pages of both. */
final class MovedBooks {

  private static final Path SAMPLES = Path.of("sample-uploads").toAbsolutePath();

  private final Visitor visitor;
  private final Audit audit;
  private final Path folder;

  /**
   * @param folder takes the exported file
   */
  MovedBooks(Visitor visitor, Audit audit, Path folder) {
    this.visitor = visitor;
    this.audit = audit;
    this.folder = folder;
  }

  /**
   * Takes the books out of the service that the visitor is signed in to, and brings them into
   * another; files that are no books, or torn, are refused on the way.
   *
   * @param unit address of the unit whose books move
   * @param code on its label
   * @param wrong takes what the audits of the pages find
   */
  void move(String unit, String code, RunningService other, List<String> wrong) throws Exception {
    visitor.open(unit);
    visitor.press(visitor.find("main .actions a[href*='/export']"));
    visitor.protocol(
        "Browser.setDownloadBehavior",
        Map.of("behavior", "allow", "downloadPath", folder.toString()));
    visitor.find("dl.facts a[href*='/export.json']").click();
    String id = unit.substring(unit.lastIndexOf('/') + 1);
    Path books = folder.resolve("turnsheet-" + id + ".json");
    // the browser gives the file its name once it is whole
    visitor.awaitTrue(() -> Files.exists(books));
    Path torn = folder.resolve("torn.json");
    String whole = Files.readString(books);
    Files.writeString(torn, whole.substring(0, whole.indexOf("\"readings\"") + 500));

    visitor.forgetSession(); // a browser keeps one session for all ports of a host
    FirstRun.of(other, visitor, "Second Bench");
    visitor.open(other.address("/shop"));
    visitor.press(visitor.find("main a[href='/export']"));
    bring(SAMPLES.resolve("renamed-zip.wav"));
    assertThat(visitor.find("[role=alert]").getText())
        .contains("This is no export of this service")
        .contains("Nothing of the file was taken in");
    wrong.addAll(audit.of("/import, refused", 422));
    bring(torn);
    assertThat(visitor.find("[role=alert]").getText())
        .contains("breaks off")
        .contains("Nothing of the file was taken in");
    visitor.open(other.address("/units"));
    assertThat(visitor.all("main .empty")).hasSize(1);
    visitor.open(other.address("/models"));
    assertThat(visitor.all("main .empty")).hasSize(1);

    visitor.open(other.address("/import"));
    bring(books);
    assertThat(visitor.find("[role=status]").getText()).contains("Everything in");
    visitor.open(other.address("/units/" + id));
    assertThat(visitor.find(".unit-code").getText()).isEqualTo(code);
    visitor.press(visitor.find("main a[href*='/visits/']"));
    assertThat(visitor.find("table.even").getText()).contains("+0.37", "\u22120.21", "+0.51");
    bring(other.address("/import"), torn);
    visitor.open(other.address("/units/" + id));
    assertThat(visitor.find(".unit-code").getText()).isEqualTo(code);
  }

  private void bring(String page, Path file) {
    visitor.open(page);
    bring(file);
  }

  private void bring(Path file) {
    visitor.find("input[name=file]").sendKeys(file.toString());
    visitor.pressButton("Import");
  }
}
