package turnsheet.document;

import turnsheet.core.measure.Reading;

/**
 * The result contract as text: the one document that the REST interface, the shell command and the
 * export give, and that the store keeps.
 *
 * <p>A figure is {@code {"value": x, "expandedUncertainty": u, "k": 2}}; where something of it
 * cannot be stated it is null and {@code "why"} says the reason. What the uncertainty is made of
 * stands in {@code "budget": [{"cause": c, "standardUncertainty": u}]}. {@code edges} is null for a
 * tone.
 */
public final class ReadingDocument {

  private ReadingDocument() {}

  /** One line of JSON. */
  public static String toJson(Reading reading) {
    return CoreJson.toJson(reading);
  }

  /** The same, laid out for people. */
  public static String toPrettyJson(Reading reading) {
    return CoreJson.toPrettyJson(reading);
  }

  /**
   * Reads a document back.
   *
   * @throws IllegalArgumentException if the text is not one
   */
  public static Reading fromJson(String json) {
    return CoreJson.fromJson(json, Reading.class);
  }
}
