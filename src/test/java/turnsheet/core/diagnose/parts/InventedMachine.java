package turnsheet.core.diagnose.parts;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.Reading;

/**
 * A machine that nobody built: what is entered of it, and how it really ran. Each diameter, length
 * and ratio is entered right to 1 %, anywhere within; balls slide by up to 2 %; the unit runs up to
 * 3 % fast or slow; the mains is up to 0.2 Hz off.
 */
final class InventedMachine {

  private static final double[] TAPE_MM_PER_S = {47.625, 95.25, 190.5, 381};
  private static final double[] TURNS_PER_MINUTE = {100.0 / 3, 45};
  private static final double LOWEST_HERTZ = 0.2;
  private static final double HIGHEST_HERTZ = 190;

  /** One line with the part that made it. */
  record Made(double hertz, ExpectedRate by) {}

  final List<MachinePart> entered = new ArrayList<>();
  final Running running;
  final List<Made> lines = new ArrayList<>();

  private final List<MachinePart> real = new ArrayList<>();
  private final Random random;
  private final @Nullable Double tape;

  InventedMachine(long seed) {
    random = new Random(seed);
    tape = random.nextInt(3) > 0 ? TAPE_MM_PER_S[random.nextInt(4)] : null;
    Double turns = tape == null ? TURNS_PER_MINUTE[random.nextInt(2)] / 60 : null;
    addRoot();
    int count = 3 + random.nextInt(10);
    while (entered.size() < count) {
      add("part " + entered.size());
    }
    double deviation = within(3);
    double mains = 50 + within(0.2);
    running = new Running(tape, turns, deviation, 0.005, 50, 0.2);
    Running really = new Running(tape, turns, deviation, 0, mains, 0);
    List<ExpectedRate> told = RateTable.of(entered, running);
    List<ExpectedRate> true_ = RateTable.of(real, really);
    for (MachinePart part : entered) {
      leaveLines(part, told, true_);
    }
  }

  /** The lines as they are measured: 0.01 Hz off, normally distributed, and stated so. */
  List<Reading.Line> measured() {
    return lines.stream()
        .map(l -> l.hertz() + 0.01 * random.nextGaussian())
        .map(f -> new Reading.Line(Figure.of(f, 0.02), Figure.of(0.05, 0.002), List.of()))
        .toList();
  }

  /** Each part leaves a line at one of its rates, one in three at its second harmonic too. */
  private void leaveLines(MachinePart part, List<ExpectedRate> told, List<ExpectedRate> real) {
    List<Integer> own = new ArrayList<>();
    for (int i = 0; i < told.size(); i++) {
      ExpectedRate rate = told.get(i);
      boolean heard =
          rate.rate().hertz() > LOWEST_HERTZ && rate.rate().hertz() * 1.06 < HIGHEST_HERTZ;
      if (rate.part().equals(part) && rate.harmonic() == 1 && rate.sideband() == 0 && heard) {
        own.add(i);
      }
    }
    if (own.isEmpty()) {
      return;
    }
    int chosen = own.get(random.nextInt(own.size()));
    Turning rate = real.get(chosen).rate();
    double hertz = rate.lowHertz() + random.nextDouble() * (rate.highHertz() - rate.lowHertz());
    boolean rolls = part.feature() instanceof Feature.Balls;
    hertz *= rolls && told.get(chosen).cause() != Cause.TURN ? 1 + within(0.02) : 1;
    lines.add(new Made(hertz, told.get(chosen)));
    if (random.nextInt(3) == 0 && 2 * hertz < HIGHEST_HERTZ) {
      lines.add(new Made(2 * hertz, second(told, told.get(chosen))));
    }
  }

  private static ExpectedRate second(List<ExpectedRate> told, ExpectedRate first) {
    return told.stream()
        .filter(r -> r.part().equals(first.part()) && r.cause() == first.cause())
        .filter(r -> r.harmonic() == 2 && r.sideband() == 0)
        .findFirst()
        .orElseThrow();
  }

  private void addRoot() {
    if (tape != null) {
      addTrue("capstan", PartKind.CAPSTAN, new Drive.Rim(between(3, 40)), null);
    } else {
      addTrue("platter", PartKind.PLATTER, new Drive.Geared(1, null), null);
    }
  }

  private void add(String name) {
    String on = entered.get(random.nextInt(entered.size())).name();
    switch (random.nextInt(tape == null ? 6 : 9)) {
      case 0 -> addTrue(name, PartKind.PULLEY, new Drive.Geared(between(0.2, 8), on), null);
      case 1 ->
          addTrue(name, PartKind.BELT, new Drive.Loop(between(150, 900), on, between(8, 80)), null);
      case 2 -> {
        boolean synchronous = random.nextBoolean();
        Drive drive =
            new Drive.Supply(1 + random.nextInt(8), synchronous ? 0 : 0.02, synchronous ? 0 : 0.06);
        addTrue(name, PartKind.MOTOR, drive, null);
      }
      case 3 ->
          addTrue(
              name,
              PartKind.GEAR,
              new Drive.Geared(1, on),
              new Feature.Teeth(8 + random.nextInt(60)));
      case 4 -> {
        double ball = between(2, 8);
        addTrue(
            name,
            PartKind.BEARING,
            new Drive.Geared(1, on),
            new Feature.Balls(6 + random.nextInt(7), ball, ball * between(3.5, 6), 0));
      }
      case 5 ->
          addTrue(
              name,
              PartKind.MOTOR,
              new Drive.Geared(between(2, 10), on),
              new Feature.Poles(1 + random.nextInt(6)));
      case 6 -> {
        double hub = between(40, 90);
        addTrue(
            name,
            PartKind.REEL,
            new Drive.Pack(hub * between(1.3, 2.5), hub, Drive.Winding.GIVES),
            null);
      }
      case 7 -> addTrue(name, PartKind.IDLER, new Drive.Rim(between(15, 90)), null);
      default -> addTrue(name, PartKind.ROLLER, new Drive.Rim(between(6, 60)), null);
    }
  }

  private void addTrue(String name, PartKind kind, Drive drive, @Nullable Feature feature) {
    entered.add(new MachinePart(name, kind, drive, feature, null));
    real.add(new MachinePart(name, kind, off(drive), off(feature), null));
  }

  /** The same drive with its numbers as they really are. */
  private Drive off(Drive drive) {
    if (drive instanceof Drive.Rim rim) {
      return new Drive.Rim(off(rim.diameterMm()));
    }
    if (drive instanceof Drive.Pack pack) {
      double factor = off(1);
      return new Drive.Pack(factor * pack.fullMm(), factor * pack.emptyMm(), pack.winding());
    }
    if (drive instanceof Drive.Loop loop && loop.rimMm() != null) {
      return new Drive.Loop(off(loop.lengthMm()), loop.on(), off(loop.rimMm()));
    }
    if (drive instanceof Drive.Geared geared && geared.ratio() != 1) {
      return new Drive.Geared(off(geared.ratio()), geared.of());
    }
    return drive;
  }

  private @Nullable Feature off(@Nullable Feature feature) {
    return feature instanceof Feature.Balls b
        ? new Feature.Balls(b.balls(), off(b.ballMm()), off(b.pitchMm()), b.contactDegrees())
        : feature;
  }

  private double off(double number) {
    return number * (1 + within(0.01));
  }

  private double within(double half) {
    return half * (2 * random.nextDouble() - 1);
  }

  private double between(double low, double high) {
    return low * Math.pow(high / low, random.nextDouble());
  }
}
