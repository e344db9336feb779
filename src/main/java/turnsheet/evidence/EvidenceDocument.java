package turnsheet.evidence;

import java.util.List;
import java.util.Optional;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.document.CoreJson;

/**
 * All evidence of one channel: what the store keeps and the REST interface gives.
 *
 * @param version see {@link #VERSION}
 * @param sha256 of the capture's bytes
 * @param channel counted from 1
 * @param settings that it was made with
 */
public record EvidenceDocument(
    String version, String sha256, int channel, MeasureSettings settings, List<Section> sections) {

  /** Changes whenever a value of any section can, or a section joins. */
  public static final String VERSION = "4";

  public EvidenceDocument {
    sections = List.copyOf(sections);
  }

  /** The section of a kind; empty where it was not looked for yet. */
  public Optional<Section> section(String name) {
    return sections.stream().filter(s -> s.name().equals(name)).findFirst();
  }

  /** One line of JSON. */
  public String toJson() {
    return CoreJson.toJson(this);
  }

  /**
   * Reads a document back.
   *
   * @throws IllegalArgumentException if the text is not one
   */
  public static EvidenceDocument fromJson(String json) {
    return CoreJson.fromJson(json, EvidenceDocument.class);
  }
}
