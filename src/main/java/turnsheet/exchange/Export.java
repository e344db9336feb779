package turnsheet.exchange;

import java.io.IOException;
import java.io.Writer;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;
import org.springframework.transaction.PlatformTransactionManager;
import org.springframework.transaction.TransactionDefinition;
import org.springframework.transaction.support.TransactionTemplate;

/**
 * Writes the books out: an entry a line, in an order that two exports of the same books share.
 *
 * <p>Memory: the keys of one kind and {@value #AT_ONCE} entries with one picture, however many
 * there are.
 */
@Component
public final class Export {

  static final String FORMAT = "turnsheet-export";
  static final int VERSION = 2;

  /** A reading has some twenty kilobytes. */
  static final int AT_ONCE = 50;

  private final Books books;
  private final FigureRows figures;
  private final Pictures pictures;
  private final TransactionTemplate snapshot;

  Export(
      Books books, FigureRows figures, Pictures pictures, PlatformTransactionManager transactions) {
    this.books = books;
    this.figures = figures;
    this.pictures = pictures;
    this.snapshot = snapshot(transactions);
  }

  /** Whoever works meanwhile: what is named by one entry is there when its kind is written. */
  private static TransactionTemplate snapshot(PlatformTransactionManager transactions) {
    TransactionTemplate template = new TransactionTemplate(transactions);
    template.setReadOnly(true);
    template.setIsolationLevel(TransactionDefinition.ISOLATION_REPEATABLE_READ);
    return template;
  }

  /** Whether there is such a unit or visit; everything is always there. */
  public boolean holds(Scope scope) {
    UUID id = scope.id();
    return id == null || books.has(scope.extent() == Scope.Extent.UNIT ? "unit" : "visit", id);
  }

  /** The document; {@code docs/exchange.md} describes it. The caller closes the writer. */
  public void writeJson(Scope scope, Writer out) throws IOException {
    inSnapshot(() -> document(scope, out));
    out.flush();
  }

  /** A row a figure; the caller closes the writer. */
  public void writeCsv(Scope scope, Writer out) throws IOException {
    inSnapshot(() -> figures.write(books.keys(BenchKinds.READINGS, scope), out));
    out.flush();
  }

  private void document(Scope scope, Writer out) throws IOException {
    Map<String, @Nullable Object> extent = new LinkedHashMap<>();
    extent.put("of", scope.extent().word());
    extent.put("id", scope.id());
    out.write("{\n\"format\": " + JsonTree.write(FORMAT));
    out.write(",\n\"version\": " + VERSION);
    out.write(",\n\"scope\": " + JsonTree.write(extent));
    for (Kind kind : Kinds.ALL) {
      out.write(",\n\"" + kind.name() + "\": [");
      String before = "\n";
      List<?> keys = books.keys(kind, scope);
      for (int from = 0; from < keys.size(); from += AT_ONCE) {
        List<?> some = keys.subList(from, Math.min(keys.size(), from + AT_ONCE));
        for (Entry entry : books.read(kind, some)) {
          Optional<Entry> whole = pictures.filled(entry);
          if (whole.isPresent()) {
            out.write(before);
            out.write(whole.get().toJson());
            before = ",\n";
          }
        }
      }
      out.write("\n]");
    }
    out.write("\n}\n");
  }

  /** What may break while it is written. */
  private interface Writing {
    void run() throws IOException;
  }

  private void inSnapshot(Writing writing) throws IOException {
    try {
      snapshot.executeWithoutResult(
          status -> {
            try {
              writing.run();
            } catch (IOException e) {
              throw new java.io.UncheckedIOException(e);
            }
          });
    } catch (java.io.UncheckedIOException e) {
      throw new IOException(e.getCause());
    }
  }
}
