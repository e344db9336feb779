package turnsheet.report.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Pattern;
import jakarta.validation.constraints.Size;

/**
 * What is added to a sheet when it is issued.
 *
 * @param reason why an issued report is revised; empty for a first one
 */
record ReportForm(
    @NotNull @Pattern(regexp = "en|de") String language,
    @NotBlank @Size(max = ReportDesk.NAME_LENGTH) String measuredBy,
    @NotBlank @Size(max = ReportDesk.NAME_LENGTH) String releasedBy,
    @NotNull @Size(max = ReportDesk.CONDITIONS_LENGTH) String conditions,
    @NotNull @Size(max = ReportDesk.REMARKS_LENGTH) String remarks,
    @Size(max = ReportDesk.REASON_LENGTH) String reason) {

  ReportForm {
    reason = reason == null ? "" : reason;
  }
}
