package turnsheet.exchange;

import java.io.IOException;
import java.io.InputStream;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import tools.jackson.core.JacksonException;
import tools.jackson.core.JsonParser;
import tools.jackson.core.JsonToken;
import tools.jackson.core.ObjectReadContext;
import tools.jackson.core.TokenStreamLocation;
import tools.jackson.core.exc.JacksonIOException;
import turnsheet.exchange.RefusedFileException.Place;

/**
 * Reads an exported document from its first to its last character, an entry at a time.
 *
 * <p>Strict: every member has to be there and none besides, the lists in their order. What was cut
 * off, made by something else or changed by hand is noticed rather than half understood. A file of
 * an earlier version has the lists of that version.
 */
final class ExportReader {

  private static final String FOREIGN =
      "This is no export of this service: it should be a JSON document that begins with"
          + " \"format\": \""
          + Export.FORMAT
          + "\".";

  private final JsonParser json;
  private int documentVersion = Export.VERSION;

  private ExportReader(JsonParser json) {
    this.json = json;
  }

  /** Takes entries as they come. */
  interface Taker {
    void take(Entry entry, Place place);
  }

  /**
   * Reads to the end.
   *
   * @throws RefusedFileException if the file is not what an export writes
   * @throws IOException if the stream breaks
   */
  static void read(InputStream in, Taker taker) throws IOException {
    try (JsonParser json = JsonTree.FACTORY.createParser(ObjectReadContext.empty(), in)) {
      ExportReader reader = new ExportReader(json);
      try {
        reader.head();
        reader.lists(taker);
      } catch (JacksonIOException e) {
        throw new IOException(e.getCause());
      } catch (JacksonException e) {
        throw RefusedFileException.at(
            place(e.getLocation()),
            "the file breaks off or is damaged here (" + e.getOriginalMessage() + ").");
      }
    }
  }

  private void head() {
    try {
      if (json.nextToken() != JsonToken.START_OBJECT
          || json.nextToken() != JsonToken.PROPERTY_NAME
          || !"format".equals(json.currentName())
          || json.nextToken() != JsonToken.VALUE_STRING
          || !Export.FORMAT.equals(json.getString())) {
        throw new RefusedFileException("foreignFile", FOREIGN);
      }
    } catch (JacksonIOException e) {
      throw e;
    } catch (JacksonException e) {
      throw new RefusedFileException("foreignFile", FOREIGN);
    }
    name("version");
    if (!(value() instanceof JsonTree.Num version)
        || !version.digits().matches("[1-9][0-9]{0,8}")) {
      throw refused("the version of the format should be a whole number.");
    }
    documentVersion = Integer.parseInt(version.digits());
    if (documentVersion > Export.VERSION) {
      throw new RefusedFileException(
          "newerExport",
          "The file is of version %s of the export, and this service reads versions up to %d: bring"
                  .formatted(version.digits(), Export.VERSION)
              + " the service up to date, then import the file again.");
    }
    name("scope");
    if (!(value() instanceof Map<?, ?> scope) || !scope.keySet().equals(Set.of("of", "id"))) {
      throw refused("the scope should say of what the export was made.");
    }
  }

  private void lists(Taker taker) {
    for (Kind kind : Kinds.ALL) {
      if (kind.since() > documentVersion) {
        continue;
      }
      name(kind.name());
      if (json.nextToken() != JsonToken.START_ARRAY) {
        throw refused("the list of " + kind.name() + " should begin here.");
      }
      while (json.nextToken() != JsonToken.END_ARRAY) {
        Place place = place(json.currentTokenLocation());
        Object value = JsonTree.read(json);
        try {
          taker.take(entry(kind, value), place);
        } catch (IllegalArgumentException e) {
          throw RefusedFileException.at(
              place, "this entry of " + kind.name() + " is wrong: " + e.getMessage() + ".");
        }
      }
    }
    if (json.nextToken() != JsonToken.END_OBJECT || json.nextToken() != null) {
      throw refused("the file should end here.");
    }
  }

  private Entry entry(Kind kind, @Nullable Object value) {
    Map<?, ?> object = object(value);
    Set<String> known = new HashSet<>();
    Map<String, @Nullable Object> values = values(kind.members(), object, known);
    Map<String, List<Map<String, @Nullable Object>>> parts = new LinkedHashMap<>();
    for (Part part : kind.parts()) {
      known.add(part.name());
      if (!(object.get(part.name()) instanceof List<?> rows)) {
        throw new IllegalArgumentException("'" + part.name() + "' is not a list");
      }
      List<Map<String, @Nullable Object>> read = new ArrayList<>();
      for (Object row : rows) {
        Set<String> ofRow = new HashSet<>();
        read.add(values(part.members(), object(row), ofRow));
        refuseUnknown(object(row), ofRow);
      }
      parts.put(part.name(), read);
    }
    refuseUnknown(object, known);
    return new Entry(kind, values, parts);
  }

  private Map<String, @Nullable Object> values(
      List<Member> members, Map<?, ?> object, Set<String> known) {
    Map<String, @Nullable Object> values = new LinkedHashMap<>();
    for (Member member : members) {
      if (member.since() > documentVersion) {
        values.put(member.name(), null);
        continue;
      }
      known.add(member.name());
      if (!object.containsKey(member.name())) {
        throw new IllegalArgumentException("'" + member.name() + "' is missing");
      }
      values.put(member.name(), typed(member, object.get(member.name())));
    }
    return values;
  }

  private static @Nullable Object typed(Member member, @Nullable Object value) {
    if (value == null) {
      if (member.optional()) {
        return null;
      }
      throw new IllegalArgumentException("'" + member.name() + "' is null");
    }
    try {
      return member.type().fromJson(value);
    } catch (IllegalArgumentException e) {
      throw new IllegalArgumentException(
          "'" + member.name() + "' is not " + member.type().words(), e);
    }
  }

  private static Map<?, ?> object(@Nullable Object value) {
    if (value instanceof Map<?, ?> object) {
      return object;
    }
    throw new IllegalArgumentException("it is not an object");
  }

  private static void refuseUnknown(Map<?, ?> object, Set<String> known) {
    for (Object name : object.keySet()) {
      if (!known.contains(String.valueOf(name))) {
        throw new IllegalArgumentException("'" + name + "' is not a member that it has");
      }
    }
  }

  private void name(String expected) {
    if (json.nextToken() != JsonToken.PROPERTY_NAME || !expected.equals(json.currentName())) {
      throw refused("\"" + expected + "\" should stand here.");
    }
  }

  private @Nullable Object value() {
    json.nextToken();
    return JsonTree.read(json);
  }

  private RefusedFileException refused(String sentence) {
    return RefusedFileException.at(place(json.currentTokenLocation()), sentence);
  }

  private static Place place(TokenStreamLocation location) {
    return new Place(Math.max(1, location.getLineNr()), Math.max(1, location.getColumnNr()));
  }
}
