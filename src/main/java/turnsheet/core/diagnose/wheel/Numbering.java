package turnsheet.core.diagnose.wheel;

import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Which place of the wheel each edge of a train belongs to. With a mark every turn is counted from
 * its own mark, so that a miscount ends with the turn that it happened in; without one, from the
 * first edge.
 */
final class Numbering {

  private final int places;
  private final int[] place;
  private int miscounted;

  private Numbering(int places, int size) {
    this.places = places;
    this.place = new int[size];
  }

  static Numbering of(EdgeTrain train, int places, Marks.@Nullable Mark mark) {
    Numbering numbering = new Numbering(places, train.size());
    if (mark == null) {
      for (int k = 0; k < train.size(); k++) {
        numbering.place[k] = k % places;
      }
    } else {
      numbering.countFromMarks(train, mark);
    }
    return numbering;
  }

  private void countFromMarks(EdgeTrain train, Marks.Mark mark) {
    Arrays.fill(place, -1);
    int[] begins = new int[train.gaps().size() + 1];
    int turns = 0;
    int expected = mark.first();
    for (int g = 0; g < train.gaps().size(); g++) {
      EdgeTrain.Gap gap = train.gaps().get(g);
      int begin = gap.from() + gap.count();
      // another gap of the same size within the turn is a lost tooth, not the mark
      boolean fits =
          turns == 0
              ? begin == mark.first()
              : Math.floorMod(begin - expected, places) == 0 || alone(train.gaps(), g);
      if (gap.count() == mark.missing() && fits) {
        begins[turns++] = begin;
        expected = begin + places;
      }
    }
    for (int i = 0; i < turns; i++) {
      int next = i + 1 < turns ? begins[i + 1] : train.size();
      boolean whole = i + 1 == turns || Math.floorMod(next - begins[i], places) == 0;
      if (!whole) {
        miscounted++;
        continue;
      }
      for (int k = begins[i]; k < next; k++) {
        place[k] = (k - begins[i]) % places;
      }
    }
    for (int k = turns > 0 ? begins[0] - 1 : -1; k >= 0; k--) {
      place[k] = Math.floorMod(k - begins[0], places);
    }
  }

  /** Whether no other gap of that size lies within a turn after it: then it can only be a mark. */
  private boolean alone(List<EdgeTrain.Gap> gaps, int g) {
    for (int i = g + 1; i < gaps.size(); i++) {
      if (gaps.get(i).from() - gaps.get(g).from() >= places) {
        return true;
      }
      if (gaps.get(i).count() == gaps.get(g).count()) {
        return false;
      }
    }
    return true;
  }

  /** From 0; -1 where a turn was miscounted. */
  int place(int k) {
    return place[k];
  }

  int places() {
    return places;
  }

  /** Turns between marks that do not have their number of places. */
  int miscounted() {
    return miscounted;
  }
}
