package turnsheet.shop;

import java.time.Instant;

/**
 * One machine with a serial number.
 *
 * @param code on its label; no other unit has it, and it stays for good
 * @param serialNumber no other unit of the model has it
 * @param note may be empty
 */
public record Unit(
    UnitId id,
    UnitCode code,
    ModelId modelId,
    CustomerId customerId,
    String serialNumber,
    String note,
    Instant createdAt) {

  public static final int SERIAL_LENGTH = 120;
  public static final int NOTE_LENGTH = 4000;

  public Unit {
    Require.text("serial number", serialNumber, SERIAL_LENGTH);
    Require.atMost("note", note, NOTE_LENGTH);
  }
}
