package turnsheet.capture.web;

import jakarta.validation.constraints.Pattern;
import org.jspecify.annotations.Nullable;
import turnsheet.capture.ToneMethod;

/**
 * How a tone came onto what was played, in a form or in JSON.
 *
 * @param toneMethod word of {@link ToneMethod}; empty or null where it is not known
 */
record MethodForm(@Nullable @Pattern(regexp = "|replay|recordAndReplay") String toneMethod) {

  @Nullable ToneMethod method() {
    return toneMethod == null ? null : ToneMethod.ofWord(toneMethod).orElse(null);
  }
}
