package turnsheet.shop.web;

import java.util.List;

/**
 * A nominal speed that machines commonly have, suggested while one types.
 *
 * @param value as it is to be typed: exact, where the customary figure is rounded
 * @param text what it is
 */
record KnownSpeed(String value, String text) {

  /** Tape speeds halve from 30 in/s, and 2.54 cm are an inch; discs by their names. */
  static final List<KnownSpeed> ALL =
      List.of(
          new KnownSpeed("76.2", "cm/s, 30 in/s"),
          new KnownSpeed("38.1", "cm/s, 15 in/s"),
          new KnownSpeed("19.05", "cm/s, 7 1/2 in/s"),
          new KnownSpeed("9.525", "cm/s, 3 3/4 in/s, often written 9.53"),
          new KnownSpeed("4.7625", "cm/s, 1 7/8 in/s, often written 4.76"),
          new KnownSpeed("2.38125", "cm/s, 15/16 in/s, often written 2.38"),
          new KnownSpeed("1.190625", "cm/s, 15/32 in/s, often written 1.19"),
          new KnownSpeed("16 2/3", "rev/min"),
          new KnownSpeed("33 1/3", "rev/min"),
          new KnownSpeed("45", "rev/min"),
          new KnownSpeed("78", "rev/min"));
}
