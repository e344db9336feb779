package turnsheet.exchange;

import java.io.StringWriter;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;
import tools.jackson.core.JsonGenerator;
import tools.jackson.core.JsonParser;
import tools.jackson.core.JsonToken;
import tools.jackson.core.ObjectReadContext;
import tools.jackson.core.ObjectWriteContext;
import tools.jackson.core.StreamReadFeature;
import tools.jackson.core.json.JsonFactory;

/**
 * JSON as maps in the order of the text, lists, texts, truth values, null, and {@link Num}. What is
 * read and written again has the same digits, whatever a number's nearest double is written like.
 */
final class JsonTree {

  static final JsonFactory FACTORY =
      JsonFactory.builder().enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION).build();

  private JsonTree() {}

  /** A number by its digits. */
  record Num(String digits) {}

  /** The value that begins at the token at hand; the parser then stands on its last token. */
  static @Nullable Object read(JsonParser json) {
    JsonToken token = json.currentToken();
    return switch (token) {
      case START_OBJECT -> object(json);
      case START_ARRAY -> array(json);
      case VALUE_STRING -> json.getString();
      case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> new Num(json.getString());
      case VALUE_TRUE -> true;
      case VALUE_FALSE -> false;
      case VALUE_NULL -> null;
      default -> throw new IllegalStateException("a value cannot begin with " + token);
    };
  }

  /** One line without blanks. */
  static String write(@Nullable Object value) {
    StringWriter text = new StringWriter();
    try (JsonGenerator json = FACTORY.createGenerator(ObjectWriteContext.empty(), text)) {
      write(value, json);
    }
    return text.toString();
  }

  /** The same text without blanks between its tokens. */
  static String canonical(String text) {
    return write(parse(text));
  }

  static @Nullable Object parse(String text) {
    try (JsonParser json = FACTORY.createParser(ObjectReadContext.empty(), text)) {
      json.nextToken();
      return read(json);
    }
  }

  private static Map<String, @Nullable Object> object(JsonParser json) {
    Map<String, @Nullable Object> members = new LinkedHashMap<>();
    while (json.nextToken() != JsonToken.END_OBJECT) {
      String name = json.currentName();
      json.nextToken();
      members.put(name, read(json));
    }
    return members;
  }

  private static List<@Nullable Object> array(JsonParser json) {
    List<@Nullable Object> values = new ArrayList<>();
    while (json.nextToken() != JsonToken.END_ARRAY) {
      values.add(read(json));
    }
    return values;
  }

  private static void write(@Nullable Object value, JsonGenerator json) {
    if (value == null) {
      json.writeNull();
    } else if (value instanceof Map<?, ?> members) {
      json.writeStartObject();
      members.forEach(
          (name, member) -> {
            json.writeName(String.valueOf(name));
            write(member, json);
          });
      json.writeEndObject();
    } else if (value instanceof List<?> values) {
      json.writeStartArray();
      values.forEach(one -> write(one, json));
      json.writeEndArray();
    } else if (value instanceof Num number) {
      json.writeNumber(number.digits());
    } else if (value instanceof Boolean truth) {
      json.writeBoolean(truth);
    } else {
      json.writeString(value.toString());
    }
  }
}
