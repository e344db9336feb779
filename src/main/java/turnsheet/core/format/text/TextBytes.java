package turnsheet.core.format.text;

/** Tells text from other bytes. */
final class TextBytes {

  private TextBytes() {}

  /** No NUL, next to no control characters: text in UTF-8, Latin-1 or the like. */
  static boolean looksLikeText(byte[] head) {
    if (isUtf16(head)) {
      return true;
    }
    int controls = 0;
    for (byte b : head) {
      if (b == 0) {
        return false;
      }
      boolean blank = b >= 9 && b <= 13;
      if ((b >= 0 && b < 32 && !blank) || b == 127) {
        controls++;
      }
    }
    // random bytes hold one control character in ten; terminal logs hold a stray one
    return controls * 64 <= Math.max(64, head.length);
  }

  /** Starts with the byte order mark of two-byte characters. */
  static boolean isUtf16(byte[] head) {
    return head.length >= 2
        && ((head[0] == (byte) 0xff && head[1] == (byte) 0xfe)
            || (head[0] == (byte) 0xfe && head[1] == (byte) 0xff));
  }

  static boolean hasUtf8Mark(byte[] head) {
    return head.length >= 3
        && head[0] == (byte) 0xef
        && head[1] == (byte) 0xbb
        && head[2] == (byte) 0xbf;
  }

  /** Index of the first byte that is neither byte order mark nor blank. */
  static int firstInk(byte[] head) {
    int i = hasUtf8Mark(head) ? 3 : 0;
    while (i < head.length && (head[i] == ' ' || (head[i] >= 9 && head[i] <= 13))) {
      i++;
    }
    return i;
  }
}
