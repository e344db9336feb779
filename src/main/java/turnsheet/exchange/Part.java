package turnsheet.exchange;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * A list within an entry, kept in a table of its own.
 *
 * @param name of the list in the document
 * @param owner column that names the entry
 * @param position column that counts from 0; null where the rows have an order of their own
 * @param order what the rows are sorted by
 */
record Part(
    String name,
    String table,
    String owner,
    @Nullable String position,
    String order,
    List<Member> members) {}
