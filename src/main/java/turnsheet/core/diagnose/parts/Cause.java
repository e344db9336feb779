package turnsheet.core.diagnose.parts;

/** Which of a part's rates a line may be. */
public enum Cause {
  /** once per turn; of a belt, once per round */
  TURN("turn"),
  /** once per tooth or mark */
  TEETH("teeth"),
  /** once per pole pair of a motor with a supply of its own */
  POLES("poles"),
  /** the mains, and twice the mains, as a motor on it feels them */
  SUPPLY("supply"),
  /** the cage of a rolling bearing with its balls */
  CAGE("cage"),
  /** a ball passes a place of the standing outer ring */
  OUTER_RACE("outerRace"),
  /** a ball passes a place of the turning inner ring */
  INNER_RACE("innerRace"),
  /** a ball turns about itself */
  BALL("ball"),
  /** hum that gets into the signal */
  HUM("hum");

  private final String word;

  Cause(String word) {
    this.word = word;
  }

  /** As documents name it. */
  public String word() {
    return word;
  }
}
