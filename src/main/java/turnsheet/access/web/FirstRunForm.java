package turnsheet.access.web;

import jakarta.validation.constraints.NotBlank;
import jakarta.validation.constraints.NotNull;
import jakarta.validation.constraints.Pattern;
import jakarta.validation.constraints.Size;
import turnsheet.web.PlainText;

/** The owner and the shop, as typed on the first page of all. */
record FirstRunForm(
    @NotNull @Pattern(regexp = SIGN_IN_NAME, message = "{access.name.pattern}") String name,
    @NotBlank @Size(max = 120) String displayName,
    @NotNull String password,
    @NotNull String again,
    @NotBlank @Size(max = 200) String shopName,
    @NotNull @Size(max = 1000) String shopAddress)
    implements PasswordPair {

  /** Letters, digits and a few marks: what is easily typed and told apart. */
  static final String SIGN_IN_NAME = "\\s*[A-Za-z0-9][A-Za-z0-9._@-]{1,79}\\s*";

  FirstRunForm {
    displayName = PlainText.typed(displayName);
    shopName = PlainText.typed(shopName);
    shopAddress = PlainText.typed(shopAddress);
  }

  static FirstRunForm empty() {
    return new FirstRunForm("", "", "", "", "", "");
  }
}
