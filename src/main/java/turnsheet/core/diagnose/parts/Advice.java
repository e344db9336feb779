package turnsheet.core.diagnose.parts;

/** Which sentence on usual causes and the next check fits a finding. */
public enum Advice {
  CAPSTAN,
  ROLLER,
  IDLER,
  BELT,
  PULLEY,
  PLATTER,
  MOTOR,
  MOTOR_POLES,
  SUPPLY,
  REEL,
  GEAR,
  GEAR_TEETH,
  BEARING,
  BEARING_CAGE,
  BEARING_OUTER,
  BEARING_INNER,
  BEARING_BALL,
  SENSOR,
  SENSOR_TEETH,
  OTHER,
  HUM,
  UNNAMED;

  /** The advice for a line at that rate. */
  static Advice of(ExpectedRate rate) {
    boolean sensor = rate.part().kind() == PartKind.SENSOR;
    return switch (rate.cause()) {
      case TURN -> ofTurning(rate.part().kind());
      case TEETH -> sensor ? SENSOR_TEETH : GEAR_TEETH;
      case POLES -> MOTOR_POLES;
      case SUPPLY -> SUPPLY;
      case CAGE -> BEARING_CAGE;
      case OUTER_RACE -> BEARING_OUTER;
      case INNER_RACE -> BEARING_INNER;
      case BALL -> BEARING_BALL;
      case HUM -> HUM;
    };
  }

  private static Advice ofTurning(PartKind kind) {
    return switch (kind) {
      case CAPSTAN -> CAPSTAN;
      case ROLLER -> ROLLER;
      case IDLER -> IDLER;
      case BELT -> BELT;
      case PULLEY -> PULLEY;
      case PLATTER -> PLATTER;
      case MOTOR -> MOTOR;
      case REEL -> REEL;
      case GEAR -> GEAR;
      case BEARING -> BEARING;
      case SENSOR -> SENSOR;
      case OTHER -> OTHER;
      case MAINS -> HUM;
    };
  }
}
