package turnsheet.core.format.audio;

/** Something in a FLAC frame that the format does not allow; the reader adds where it happened. */
final class FlacDamage extends Exception {

  FlacDamage(String what) {
    super(what);
  }

  String what() {
    return String.valueOf(getMessage());
  }
}
