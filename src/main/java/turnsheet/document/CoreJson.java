package turnsheet.document;

import com.fasterxml.jackson.annotation.JsonInclude;
import java.util.List;
import org.jspecify.annotations.Nullable;
import tools.jackson.core.JacksonException;
import tools.jackson.core.JsonGenerator;
import tools.jackson.core.util.DefaultIndenter;
import tools.jackson.core.util.DefaultPrettyPrinter;
import tools.jackson.core.util.Separators;
import tools.jackson.databind.EnumNamingStrategies;
import tools.jackson.databind.MapperFeature;
import tools.jackson.databind.ObjectWriter;
import tools.jackson.databind.SerializationContext;
import tools.jackson.databind.ValueSerializer;
import tools.jackson.databind.annotation.JsonSerialize;
import tools.jackson.databind.json.JsonMapper;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;
import turnsheet.core.stats.Budget;

/**
 * JSON of the records of the core: members in the order of the components, enums in lower camel
 * case, an absent thing as null. Unknown members are passed over when reading, so that a document
 * of a later version can be shown; a missing number is an error.
 */
public final class CoreJson {

  private static final JsonMapper MAPPER =
      JsonMapper.builder()
          .disable(MapperFeature.SORT_PROPERTIES_ALPHABETICALLY)
          .enumNamingStrategy(EnumNamingStrategies.LOWER_CAMEL_CASE)
          .addMixIn(Figure.class, FigureMembers.class)
          .addMixIn(Reading.Suspect.class, SuspectMembers.class)
          .build();

  private static final ObjectWriter PRETTY =
      MAPPER
          .writer()
          .with(
              new DefaultPrettyPrinter(
                      Separators.createDefaultInstance()
                          .withObjectNameValueSpacing(Separators.Spacing.AFTER))
                  .withObjectIndenter(new DefaultIndenter("  ", "\n"))
                  .withArrayIndenter(new DefaultIndenter("  ", "\n")));

  private CoreJson() {}

  /** One line of JSON. */
  public static String toJson(Object record) {
    return MAPPER.writeValueAsString(record);
  }

  /** The same, laid out for people: two spaces, one member a line. */
  public static String toPrettyJson(Object record) {
    return PRETTY.writeValueAsString(record);
  }

  /**
   * Reads what {@link #toJson} wrote.
   *
   * @throws IllegalArgumentException if the text is no JSON or not of that type
   */
  public static <T> T fromJson(String json, Class<T> type) {
    T value;
    try {
      value = MAPPER.readValue(json, type);
    } catch (JacksonException e) {
      throw new IllegalArgumentException(
          "not a " + type.getSimpleName() + ": " + e.getOriginalMessage(), e);
    }
    if (value == null) {
      throw new IllegalArgumentException("not a " + type.getSimpleName() + ": null");
    }
    return value;
  }

  /** How the contract writes a figure. */
  interface FigureMembers {

    @JsonSerialize(using = WholeWherePossible.class)
    @Nullable Double k();

    @JsonInclude(JsonInclude.Include.NON_NULL)
    @Nullable String why();

    @JsonInclude(JsonInclude.Include.NON_EMPTY)
    List<Budget.Contribution> budget();
  }

  /** How the contract writes a suspect: what was not kept is left out. */
  @JsonInclude(JsonInclude.Include.NON_NULL)
  interface SuspectMembers {}

  /** Writes 2 for 2.0. */
  static final class WholeWherePossible extends ValueSerializer<Double> {

    @Override
    public void serialize(Double value, JsonGenerator json, SerializationContext context) {
      if (value == Math.rint(value) && Math.abs(value) < 1e9) {
        json.writeNumber(value.intValue());
      } else {
        json.writeNumber(value);
      }
    }
  }
}
