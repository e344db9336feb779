package turnsheet.cli;

import org.jspecify.annotations.Nullable;

/**
 * What {@code measure} was asked for; one of the two rates is there, the other null.
 *
 * @param channel counted from 1; null for the one that the file suggests
 */
record MeasureArguments(
    String file,
    @Nullable Double toneHz,
    @Nullable Double pulsesPerSecond,
    @Nullable Integer teeth,
    @Nullable Integer channel,
    boolean json) {

  static final String USAGE =
      """
      usage: measure FILE --tone-hz HZ [--channel N] [--json]
             measure FILE --pulses-per-second RATE [--teeth N] [--channel N] [--json]

        --tone-hz            frequency of the test tone at nominal speed
        --pulses-per-second  pulses of the tachometer per second at nominal speed
        --teeth              pulses per turn of the sensor wheel
        --channel            channel, column or signal, counted from 1
        --json               print the whole reading as JSON

      exit status: 0 measured, 2 wrong usage, 3 the file cannot be measured
      """;

  /**
   * @throws IllegalArgumentException with a sentence for the user
   */
  static MeasureArguments parse(String[] args) {
    String file = null;
    Double toneHz = null;
    Double pulses = null;
    Integer teeth = null;
    Integer channel = null;
    boolean json = false;
    for (int i = 0; i < args.length; i++) {
      switch (args[i]) {
        case "--tone-hz" -> toneHz = rate(args, i++);
        case "--pulses-per-second" -> pulses = rate(args, i++);
        case "--teeth" -> teeth = count(args, i++);
        case "--channel" -> channel = count(args, i++);
        case "--json" -> json = true;
        default -> {
          if (args[i].startsWith("--")) {
            throw new IllegalArgumentException("There is no option " + args[i] + ".");
          }
          if (file != null) {
            throw new IllegalArgumentException(
                "One file at a time: " + file + ", " + args[i] + ".");
          }
          file = args[i];
        }
      }
    }
    if (file == null) {
      throw new IllegalArgumentException("No file was named.");
    }
    if ((toneHz == null) == (pulses == null)) {
      throw new IllegalArgumentException("Give either --tone-hz or --pulses-per-second.");
    }
    if (teeth != null && pulses == null) {
      throw new IllegalArgumentException("--teeth goes with --pulses-per-second.");
    }
    return new MeasureArguments(file, toneHz, pulses, teeth, channel, json);
  }

  private static Double rate(String[] args, int option) {
    try {
      double value = Double.parseDouble(valueOf(args, option));
      if (value > 0 && Double.isFinite(value)) {
        return value;
      }
    } catch (NumberFormatException e) {
      // told below
    }
    throw new IllegalArgumentException(args[option] + " takes a positive number.");
  }

  private static Integer count(String[] args, int option) {
    try {
      int value = Integer.parseInt(valueOf(args, option));
      if (value > 0) {
        return value;
      }
    } catch (NumberFormatException e) {
      // told below
    }
    throw new IllegalArgumentException(args[option] + " takes a whole number from 1.");
  }

  private static String valueOf(String[] args, int option) {
    if (option + 1 >= args.length) {
      throw new IllegalArgumentException(args[option] + " takes a value.");
    }
    return args[option + 1];
  }
}
