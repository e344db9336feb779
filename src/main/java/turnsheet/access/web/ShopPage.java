package turnsheet.access.web;

import java.util.List;
import java.util.UUID;

/**
 * The shop page.
 *
 * @param owner whether the visitor may change people, letterhead and the keys of others
 * @param addressLines of the letterhead
 * @param people empty for a technician
 * @param entries of the audit trail; empty for a technician
 */
record ShopPage(
    boolean owner,
    String shopName,
    List<String> addressLines,
    List<Person> people,
    List<Key> keys,
    List<Entry> entries) {

  /** A row of the list of people. */
  record Person(
      UUID id, String name, String signInName, String roleKey, String since, boolean enabled) {}

  /**
   * A row of the list of keys.
   *
   * @param lastUse empty before the first use
   * @param withdrawn empty while it works
   */
  record Key(UUID id, String label, String holder, String made, String lastUse, String withdrawn) {}

  /** A row of the audit trail. */
  record Entry(String at, String name, String action, String subject) {}
}
