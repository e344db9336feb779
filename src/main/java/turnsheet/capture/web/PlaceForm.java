package turnsheet.capture.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Size;
import java.util.UUID;
import turnsheet.capture.CaptureKey;
import turnsheet.web.PlainText;

/** At which setting and under which condition a recording was made, in a form or in JSON. */
record PlaceForm(
    @NotNull UUID speedSettingId,
    @NotBlank @Size(max = CaptureKey.CONDITION_LENGTH) String condition) {

  PlaceForm {
    condition = PlainText.typed(condition);
  }
}
