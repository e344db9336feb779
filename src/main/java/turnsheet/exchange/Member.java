package turnsheet.exchange;

import java.util.Locale;
import org.jspecify.annotations.Nullable;

/**
 * One value of an entry, in a column and in the document.
 *
 * @param name in the document
 * @param column in the table
 * @param source what is selected for it, the column itself as a rule
 * @param optional whether it may be null
 * @param refersTo the table whose row it names; null where it names none
 * @param since version of the document that has it first
 */
record Member(
    String name,
    String column,
    String source,
    MemberType type,
    boolean optional,
    @Nullable String refersTo,
    int since) {

  /** Its column has the same name, written with underscores. */
  static Member of(String name, MemberType type) {
    String column = name.replaceAll("([A-Z])", "_$1").toLowerCase(Locale.ROOT);
    return new Member(name, column, column, type, false, null, 1);
  }

  static Member text(String name) {
    return of(name, MemberType.TEXT);
  }

  static Member whole(String name) {
    return of(name, MemberType.WHOLE);
  }

  static Member decimal(String name) {
    return of(name, MemberType.DECIMAL);
  }

  static Member time(String name) {
    return of(name, MemberType.TIME);
  }

  static Member document(String name) {
    return of(name, MemberType.DOCUMENT);
  }

  static Member id(String name) {
    return of(name, MemberType.ID);
  }

  Member orNull() {
    return new Member(name, column, source, type, true, refersTo, since);
  }

  Member in(String otherColumn) {
    return new Member(name, otherColumn, otherColumn, type, optional, refersTo, since);
  }

  Member selectedBy(String expression) {
    return new Member(name, column, expression, type, optional, refersTo, since);
  }

  Member naming(String table) {
    return new Member(name, column, source, type, optional, table, since);
  }

  /** A member that came later may be null, and is in documents of before. */
  Member since(int version) {
    return new Member(name, column, source, type, optional, refersTo, version);
  }
}
