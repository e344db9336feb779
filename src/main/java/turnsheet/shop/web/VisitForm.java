package turnsheet.shop.web;

import jakarta.validation.constraints.Size;
import turnsheet.shop.Visit;

/** The notes of a visit as typed. */
record VisitForm(
    @Size(max = Visit.TEXT_LENGTH, message = "{shop.form.tooLong}") String complaint,
    @Size(max = Visit.TEXT_LENGTH, message = "{shop.form.tooLong}") String workDone) {

  VisitForm {
    complaint = Typed.text(complaint);
    workDone = Typed.text(workDone);
  }

  static VisitForm of(Visit visit) {
    return new VisitForm(visit.complaint(), visit.workDone());
  }
}
