package turnsheet.evidence;

import java.util.Optional;
import org.jspecify.annotations.Nullable;
import turnsheet.core.signal.Rejection;
import turnsheet.document.CoreJson;

/**
 * What one kind of evidence came to. One of {@code refusal} and {@code found} is null.
 *
 * @param name of its {@link Gatherer}
 * @param refusal why there is nothing
 * @param found the gatherer's record; read back from the store, its members as maps and lists
 */
public record Section(String name, @Nullable Rejection refusal, @Nullable Object found) {

  static Section found(String name, Object found) {
    return new Section(name, null, found);
  }

  static Section refused(String name, Rejection refusal) {
    return new Section(name, refusal, null);
  }

  /** What was found, as the gatherer's record; empty where there is nothing. */
  public <T> Optional<T> found(Class<T> type) {
    if (found == null) {
      return Optional.empty();
    }
    return Optional.of(
        type.isInstance(found)
            ? type.cast(found)
            : CoreJson.fromJson(CoreJson.toJson(found), type));
  }
}
