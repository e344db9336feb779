package turnsheet.shop;

import java.time.Instant;

/**
 * Who owns units.
 *
 * @param contact address, telephone, whatever reaches him; may be empty
 */
public record Customer(CustomerId id, String name, String contact, Instant createdAt) {

  public static final int NAME_LENGTH = 200;
  public static final int CONTACT_LENGTH = 1000;

  public Customer {
    Require.text("name", name, NAME_LENGTH);
    Require.atMost("contact", contact, CONTACT_LENGTH);
  }
}
