package turnsheet.shop;

import java.util.UUID;

/** Names one speed setting. */
public record SpeedSettingId(UUID value) {

  /** A name that nothing has yet. */
  public static SpeedSettingId next() {
    return new SpeedSettingId(UUID.randomUUID());
  }

  @Override
  public String toString() {
    return value.toString();
  }
}
