package turnsheet.shop;

import java.util.List;

/**
 * What is written down about a visit.
 *
 * @param complaint what the customer says; may be empty
 * @param workDone what the bench found and did; may be empty
 * @param parts fitted, in the order they were written down
 * @param sensorReplaced whether another sensor was fitted, so that captures before and after come
 *     from different ones
 * @param sensorNote which one; empty where none was
 */
public record VisitNotes(
    String complaint,
    String workDone,
    List<FittedPart> parts,
    boolean sensorReplaced,
    String sensorNote) {

  public static final int TEXT_LENGTH = 4000;
  public static final int SENSOR_NOTE_LENGTH = 1000;

  public VisitNotes {
    Require.atMost("complaint", complaint, TEXT_LENGTH);
    Require.atMost("work done", workDone, TEXT_LENGTH);
    Require.atMost("note on the sensor", sensorNote, SENSOR_NOTE_LENGTH);
    parts = List.copyOf(parts);
    if (parts.size() > FittedPart.MOST_PARTS) {
      throw new IllegalArgumentException(parts.size() + " parts");
    }
    if (!sensorReplaced) {
      sensorNote = "";
    }
  }

  /** Only the complaint, as a unit comes in. */
  public static VisitNotes complaint(String complaint) {
    return new VisitNotes(complaint, "", List.of(), false, "");
  }

  /** Whether the bench has written anything down about its work. */
  public boolean isWorkNoted() {
    return !workDone.isBlank() || !parts.isEmpty() || sensorReplaced;
  }

  VisitNotes withParts(List<FittedPart> fitted) {
    return new VisitNotes(complaint, workDone, fitted, sensorReplaced, sensorNote);
  }
}
