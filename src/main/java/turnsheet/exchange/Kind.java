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
 */
record Kind(
    String name,
    String table,
    String label,
    String order,
    String within,
    List<Member> members,
    List<Part> parts) {

  Member key() {
    return members.get(0);
  }
}
