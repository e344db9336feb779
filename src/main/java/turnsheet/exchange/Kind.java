package turnsheet.exchange;

import java.util.List;

/**
 * A kind of entry: a list of the document and the table behind it.
 *
 * @param name of the list in the document
 * @param label the member by which people know an entry
 * @param order what the entries are sorted by, so that two exports of the same books are equal
 * @param within condition that an entry belongs to a unit or a visit; {@code {unit}} stands for the
 *     condition on the unit and {@code {visits}} for the ids of the visits
 * @param members the key first
 * @param since version of the document that brought it
 */
record Kind(
    String name,
    String table,
    String label,
    String order,
    String within,
    List<Member> members,
    List<Part> parts,
    int since) {

  /** A kind that was there from the first version. */
  Kind(
      String name,
      String table,
      String label,
      String order,
      String within,
      List<Member> members,
      List<Part> parts) {
    this(name, table, label, order, within, members, parts, 1);
  }

  /** Whether a member's bytes are in the store and not in the table. */
  boolean isStored(String member) {
    return members.stream().anyMatch(m -> m.name().equals(member) && m.type() == MemberType.STORED);
  }

  Member key() {
    return members.get(0);
  }
}
