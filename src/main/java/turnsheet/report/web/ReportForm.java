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
    @NotBlank @Size(max = 120) String measuredBy,
    @NotBlank @Size(max = 120) String releasedBy,
    @NotNull @Size(max = 1000) String conditions,
    @NotNull @Size(max = 2000) String remarks,
    @Size(max = 1000) String reason) {

  ReportForm {
    reason = reason == null ? "" : reason;
  }
}
