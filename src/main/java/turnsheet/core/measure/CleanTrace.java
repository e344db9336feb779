package turnsheet.core.measure;

import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import turnsheet.core.signal.SpeedTrace;

/**
 * A trace with the stretches that must not count. Short ones are bridged by a straight line, so
 * that filters pass over them; long ones part the trace into pieces that are treated on their own.
 */
final class CleanTrace {

  /** Bridging longer gaps would leave the weighting ringing on the bridge. */
  private static final double LONGEST_BRIDGE_SECONDS = 0.25;

  private final SpeedTrace trace;
  private final BitSet unusable = new BitSet();
  private final List<Piece> pieces = new ArrayList<>();

  /** Samples from one index up to another, exclusive, between long gaps. */
  record Piece(int from, int to) {
    int length() {
      return to - from;
    }
  }

  CleanTrace(SpeedTrace trace, List<Stretch> excluded) {
    this.trace = trace;
    double rate = trace.rateHertz();
    for (Stretch s : excluded) {
      int from = (int) Math.floor((s.startSeconds() - trace.startSeconds()) * rate);
      int to = (int) Math.ceil((s.endSeconds() - trace.startSeconds()) * rate) + 1;
      from = Math.max(0, Math.min(trace.length(), from));
      to = Math.max(from, Math.min(trace.length(), to));
      unusable.set(from, to);
    }
    int longest = (int) Math.ceil(LONGEST_BRIDGE_SECONDS * rate);
    int from = unusable.nextClearBit(0);
    int end = trace.length();
    while (from < end) {
      int to = from;
      int gap;
      do {
        to = until(unusable.nextSetBit(to));
        gap = to < end ? until(unusable.nextClearBit(to)) : end;
        if (gap < end && gap - to <= longest) {
          to = gap;
          gap = -1;
        }
      } while (gap < 0);
      pieces.add(new Piece(from, to));
      from = gap;
    }
  }

  private int until(int index) {
    return index < 0 || index > trace.length() ? trace.length() : index;
  }

  SpeedTrace trace() {
    return trace;
  }

  double rateHertz() {
    return trace.rateHertz();
  }

  List<Piece> pieces() {
    return pieces;
  }

  Piece longestPiece() {
    Piece longest = new Piece(0, 0);
    for (Piece p : pieces) {
      longest = p.length() > longest.length() ? p : longest;
    }
    return longest;
  }

  boolean usable(int index) {
    return !unusable.get(index);
  }

  int usableSamples() {
    return trace.length() - unusable.cardinality();
  }

  /** Time of a sample, in seconds after the trace's first one. */
  double secondsAt(int index) {
    return index / trace.rateHertz();
  }

  /**
   * Copies samples of one piece with its short gaps bridged.
   *
   * @param into receives {@code count} samples in percent from index 0
   */
  void copy(int from, double[] into, int count) {
    trace.copyTo(from, into, count);
    int bad = unusable.nextSetBit(from);
    while (bad >= 0 && bad < from + count) {
      int before = unusable.previousClearBit(bad);
      int after = until(unusable.nextClearBit(bad));
      double y0 = trace.percent(before < 0 ? Math.min(after, trace.length() - 1) : before);
      double y1 = after < trace.length() ? trace.percent(after) : y0;
      for (int i = bad; i < Math.min(after, from + count); i++) {
        into[i - from] = y0 + (y1 - y0) * (i - before) / (after - before);
      }
      bad = unusable.nextSetBit(after);
    }
  }
}
