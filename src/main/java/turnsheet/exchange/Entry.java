package turnsheet.exchange;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.UUID;
import org.jspecify.annotations.Nullable;

/**
 * One entry of the books.
 *
 * @param values by the names of the members, as {@link MemberType} holds them
 * @param parts the lists within it by their names
 */
record Entry(
    Kind kind,
    Map<String, @Nullable Object> values,
    Map<String, List<Map<String, @Nullable Object>>> parts) {

  /** An id, or the number of a report. */
  Object key() {
    return Objects.requireNonNull(values.get(kind.key().name()));
  }

  @Nullable Object value(String name) {
    return values.get(name);
  }

  String text(String name) {
    return String.valueOf(values.get(name));
  }

  /** A whole number that is never null. */
  long whole(String name) {
    return (Long) Objects.requireNonNull(values.get(name));
  }

  /** A number that is never null. */
  double decimal(String name) {
    return (Double) Objects.requireNonNull(values.get(name));
  }

  boolean is(Kind one) {
    return kind.equals(one);
  }

  /** How people know it. */
  String label() {
    return text(kind.label());
  }

  List<Map<String, @Nullable Object>> part(String name) {
    return Objects.requireNonNull(parts.get(name));
  }

  /** Ids of the speed settings of a model; none of another kind. */
  List<UUID> settings() {
    return parts.getOrDefault(Kinds.SETTINGS, List.of()).stream()
        .map(setting -> (UUID) Objects.requireNonNull(setting.get("id")))
        .toList();
  }

  /** The entry as it stands in the document, in one line. */
  String toJson() {
    return JsonTree.write(tree());
  }

  /** The same with one value more. */
  Entry with(String name, Object value) {
    Map<String, @Nullable Object> more = new LinkedHashMap<>(values);
    more.put(name, value);
    return new Entry(kind, more, parts);
  }

  /**
   * Names of the members in which another entry of the same key is not equal to this one; bytes in
   * the store are known by their SHA-256, which is a member too.
   */
  List<String> differences(Entry other) {
    Map<String, @Nullable Object> here = tree();
    Map<String, @Nullable Object> there = other.tree();
    List<String> names = new ArrayList<>();
    here.forEach(
        (name, value) -> {
          if (!kind.isStored(name)
              && !JsonTree.write(value).equals(JsonTree.write(there.get(name)))) {
            names.add(name);
          }
        });
    return names;
  }

  private Map<String, @Nullable Object> tree() {
    Map<String, @Nullable Object> tree = object(kind.members(), values);
    for (Part part : kind.parts()) {
      tree.put(
          part.name(), part(part.name()).stream().map(r -> object(part.members(), r)).toList());
    }
    return tree;
  }

  private static Map<String, @Nullable Object> object(
      List<Member> members, Map<String, @Nullable Object> values) {
    Map<String, @Nullable Object> object = new LinkedHashMap<>();
    for (Member member : members) {
      Object value = values.get(member.name());
      object.put(member.name(), value == null ? null : member.type().toJson(value));
    }
    return object;
  }
}
