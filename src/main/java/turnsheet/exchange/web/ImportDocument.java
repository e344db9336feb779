package turnsheet.exchange.web;

import java.util.List;
import turnsheet.exchange.ImportResult;

/**
 * What came of an import.
 *
 * @param complete whether everything in the file is here now as the file says
 * @param added over all kinds
 */
record ImportDocument(boolean complete, int added, List<OfKind> kinds) {

  /** One kind of entry. */
  record OfKind(String kind, int added, int same, List<Left> different, List<Left> heldBack) {}

  /**
   * An entry of the file that was not added.
   *
   * @param reason {@code otherContent}, {@code takenPlace}, {@code openVisit} or {@code needsOther}
   */
  record Left(String id, String label, int line, String reason, List<String> members) {

    static List<Left> of(List<ImportResult.Left> all) {
      return all.stream()
          .map(l -> new Left(l.id(), l.label(), l.line(), l.reason().word(), l.members()))
          .toList();
    }
  }

  static ImportDocument of(ImportResult result) {
    return new ImportDocument(
        result.complete(),
        result.added(),
        result.kinds().stream()
            .map(
                k ->
                    new OfKind(
                        k.kind(),
                        k.added(),
                        k.same(),
                        Left.of(k.different()),
                        Left.of(k.heldBack())))
            .toList());
  }
}
