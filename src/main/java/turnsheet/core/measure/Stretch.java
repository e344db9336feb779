package turnsheet.core.measure;

/** A span of capture time that must not enter the figures. */
record Stretch(double startSeconds, double endSeconds) {
  Stretch {
    if (!(startSeconds <= endSeconds)) {
      throw new IllegalArgumentException(startSeconds + " s to " + endSeconds + " s");
    }
  }

  double durationSeconds() {
    return endSeconds - startSeconds;
  }

  /** The same with so much more at either end. */
  Stretch widened(double seconds) {
    return new Stretch(startSeconds - seconds, endSeconds + seconds);
  }
}
