package turnsheet.core.diagnose.parts;

import org.jspecify.annotations.Nullable;

/** What the turning rate of a part follows from. */
public sealed interface Drive {

  /** Its rim runs at tape speed: rate = v / (pi d) (textbook). */
  record Rim(double diameterMm) implements Drive {

    public Rim {
      Numbers.positive("diameter, mm", diameterMm);
    }
  }

  /**
   * A reel: tape speed over a pack whose diameter changes as the tape runs.
   *
   * @param fullMm diameter with all the tape on it
   * @param emptyMm diameter of the bare hub, smaller
   */
  record Pack(double fullMm, double emptyMm, Winding winding) implements Drive {

    public Pack {
      Numbers.positive("empty pack, mm", emptyMm);
      if (!(fullMm > emptyMm && Double.isFinite(fullMm))) {
        throw new IllegalArgumentException("pack from " + emptyMm + " to " + fullMm + " mm");
      }
    }
  }

  /** Which way the rate of a reel goes as the tape runs. */
  enum Winding {
    /** takes tape up: turns ever slower */
    TAKES_UP,
    /** gives tape: turns ever faster */
    GIVES
  }

  /**
   * A belt: comes round once in its length, rate = v / L, v the speed of the rim it lies on
   * (textbook; creep and the thickness of the belt are part of the uncertainty of the length).
   *
   * @param on part with the rim; null where it runs at tape speed
   * @param rimMm diameter on which the belt lies there; null with it
   */
  record Loop(double lengthMm, @Nullable String on, @Nullable Double rimMm) implements Drive {

    public Loop {
      Numbers.positive("belt length, mm", lengthMm);
      if ((on == null) != (rimMm == null)) {
        throw new IllegalArgumentException("belt on " + on + " with a rim of " + rimMm + " mm");
      }
      if (rimMm != null) {
        Numbers.positive("rim, mm", rimMm);
      }
    }
  }

  /**
   * Turns so many times per turn of another part.
   *
   * @param of null for the machine's nominal rotation
   */
  record Geared(double ratio, @Nullable String of) implements Drive {

    public Geared {
      Numbers.positive("ratio", ratio);
    }
  }

  /**
   * A motor on the mains: rate = f / p (1 - s) (textbook).
   *
   * @param slipLow least share by which it falls behind; zero for a synchronous motor
   * @param slipHigh largest such share
   */
  record Supply(int polePairs, double slipLow, double slipHigh) implements Drive {

    public Supply {
      Numbers.positive("pole pairs", polePairs);
      if (!(slipLow >= 0 && slipHigh >= slipLow && slipHigh < 1)) {
        throw new IllegalArgumentException("slip from " + slipLow + " to " + slipHigh);
      }
    }
  }

  /** Turns at a rate that was read off a plate, whatever the speed setting. */
  record Own(double perMinute) implements Drive {

    public Own {
      Numbers.positive("turns per minute", perMinute);
    }
  }
}
