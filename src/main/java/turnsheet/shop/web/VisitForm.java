package turnsheet.shop.web;

import jakarta.validation.constraints.Size;
import java.util.List;
import org.springframework.validation.Errors;
import turnsheet.access.Secrets;
import turnsheet.shop.FittedPart;
import turnsheet.shop.Visit;
import turnsheet.shop.VisitNotes;

/**
 * The notes of a visit as typed.
 *
 * @param parts one on each line, with a count before it where there are several
 * @param sensorReplaced {@code yes} where it is ticked
 * @param seen mark of the notes that stood on the page as it was opened; empty where nobody says
 */
record VisitForm(
    @Size(max = VisitNotes.TEXT_LENGTH, message = "{shop.form.tooLong}") String complaint,
    @Size(max = VisitNotes.TEXT_LENGTH, message = "{shop.form.tooLong}") String workDone,
    @Size(max = VisitNotes.TEXT_LENGTH, message = "{shop.form.tooLong}") String parts,
    String sensorReplaced,
    @Size(max = VisitNotes.SENSOR_NOTE_LENGTH, message = "{shop.form.tooLong}") String sensorNote,
    String seen) {

  static final VisitForm EMPTY = new VisitForm("", "", "", "", "", "");

  VisitForm {
    complaint = Typed.text(complaint);
    workDone = Typed.text(workDone);
    parts = Typed.text(parts);
    sensorReplaced = Typed.text(sensorReplaced);
    sensorNote = Typed.text(sensorNote);
    seen = Typed.text(seen);
  }

  static VisitForm of(Visit visit) {
    VisitNotes notes = visit.notes();
    return new VisitForm(
        notes.complaint(),
        notes.workDone(),
        FittedPart.written(notes.parts()),
        notes.sensorReplaced() ? "yes" : "",
        notes.sensorNote(),
        markOf(notes));
  }

  /** Tells notes from other notes. */
  private static String markOf(VisitNotes notes) {
    return Secrets.sha256(notes.toString());
  }

  /** Whether the notes that stand are those that were written over. */
  boolean saw(Visit standing) {
    return seen.isEmpty() || seen.equals(markOf(standing.notes()));
  }

  /** Says beside the field what cannot be kept. */
  void check(Errors errors) {
    List<String> lines = parts.lines().filter(line -> !line.isBlank()).toList();
    if (lines.size() > FittedPart.MOST_PARTS) {
      errors.rejectValue("parts", "shop.visit.tooManyParts");
    }
    if (lines.stream().anyMatch(line -> line.strip().length() > FittedPart.NAME_LENGTH)) {
      errors.rejectValue("parts", "shop.visit.partTooLong");
    }
  }

  VisitNotes notes() {
    return new VisitNotes(
        complaint, workDone, FittedPart.read(parts), !sensorReplaced.isEmpty(), sensorNote);
  }
}
