package turnsheet.exchange;

import java.util.List;

/**
 * What came of an import, kind by kind.
 *
 * @param kinds every kind of the document, in its order
 */
public record ImportResult(List<OfKind> kinds) {

  public ImportResult {
    kinds = List.copyOf(kinds);
  }

  public int added() {
    return kinds.stream().mapToInt(OfKind::added).sum();
  }

  /** Whether everything in the file is now here as it stands in the file. */
  public boolean complete() {
    return kinds.stream().allMatch(k -> k.different().isEmpty() && k.heldBack().isEmpty());
  }

  /**
   * One kind.
   *
   * @param added how many were not here and are now
   * @param same how many were here already, with the same content
   * @param different those that are here otherwise, or whose place is taken; what is here was left
   *     alone
   * @param heldBack those that belong to something that could not be added
   */
  public record OfKind(
      String kind, int added, int same, List<Left> different, List<Left> heldBack) {

    public OfKind {
      different = List.copyOf(different);
      heldBack = List.copyOf(heldBack);
    }
  }

  /**
   * An entry of the file that was not added.
   *
   * @param label how people know it
   * @param line of the file
   * @param members those that differ, or whose value is taken, or that name what is missing
   */
  public record Left(String id, String label, int line, Reason reason, List<String> members) {

    public Left {
      members = List.copyOf(members);
    }
  }

  /** Why an entry was not added. */
  public enum Reason {
    /** an entry of the same key is here with another content */
    OTHER_CONTENT,
    /** another entry has a value that only one may have */
    TAKEN_PLACE,
    /** the unit has another visit that is open */
    OPEN_VISIT,
    /** what it belongs to was not added */
    NEEDS_OTHER;

    /** Its word in answers to programs and in message keys. */
    public String word() {
      return switch (this) {
        case OTHER_CONTENT -> "otherContent";
        case TAKEN_PLACE -> "takenPlace";
        case OPEN_VISIT -> "openVisit";
        case NEEDS_OTHER -> "needsOther";
      };
    }
  }
}
