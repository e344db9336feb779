package turnsheet.access.web;

import java.nio.charset.StandardCharsets;
import org.springframework.validation.Errors;
import turnsheet.access.Accounts;

/** A password typed twice. */
interface PasswordPair {

  String password();

  String again();

  /** Adds an error to the form where the password is too short, too long, or typed unevenly. */
  default void check(Errors errors) {
    if (password().length() < Accounts.PASSWORD_MIN_LENGTH) {
      errors.rejectValue(
          "password", "access.password.short", new Object[] {Accounts.PASSWORD_MIN_LENGTH}, null);
    } else if (password().getBytes(StandardCharsets.UTF_8).length > Accounts.PASSWORD_MAX_BYTES) {
      errors.rejectValue(
          "password", "access.password.long", new Object[] {Accounts.PASSWORD_MAX_BYTES}, null);
    } else if (!password().equals(again())) {
      errors.rejectValue("again", "access.password.uneven");
    }
  }
}
