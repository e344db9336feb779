package turnsheet.capture;

import java.util.Locale;

/** How the service came by the speed setting of a recording that the bench has not placed. */
public enum SettingFit {
  /** the model has no other */
  ONLY,
  /** the recording swings about as often as at this setting, and at no other */
  RATE,
  /** several settings have that rate; the file's name holds the number of this one */
  NAME,
  /** several settings have that rate; the bench must say which */
  SEVERAL,
  /** no setting has such a rate, or none was found; the bench must say which */
  NONE;

  /** As the database and the REST API say it. */
  public String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  /** Whether there is a proposal that a click can confirm. */
  public boolean isProposal() {
    return this != SEVERAL && this != NONE;
  }

  static SettingFit ofWord(String word) {
    return valueOf(word.toUpperCase(Locale.ROOT));
  }
}
