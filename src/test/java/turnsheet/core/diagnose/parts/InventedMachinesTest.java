package turnsheet.core.diagnose.parts;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.util.List;
import org.junit.jupiter.api.Test;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.format.api.ByteSource;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.core.measure.Measurement;
import turnsheet.core.measure.Outcome;
import turnsheet.core.measure.Reading;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;

/**
 * How often the right part is named first, over machines that nobody built.
 *
 * <p>A line counts as resolvable where every rate of every other part lies further from the rate at
 * which the line is expected than twice the standard uncertainty of their difference, in which the
 * numbers entered and half the resolution of the capture count: nearer than that, 95 of 100 such
 * pairs could stand in the other order, so that no method can tell them by their rates.
 */
class InventedMachinesTest {

  private static final int MACHINES = 200;
  private static final double SECONDS = 60;

  private int lines;
  private int right;
  private int resolvable;
  private int resolvableRight;
  private int resolvableDoubted;
  private int wrong;
  private int wrongDoubted;
  private int lockWrong;
  private double probability;

  @Test
  void namesTheRightPartFirstWhereItCanBeToldAndSaysSoWhereItCannot() {
    for (long seed = 1; seed <= MACHINES; seed++) {
      InventedMachine machine = new InventedMachine(seed);
      List<Reading.Line> measured = machine.measured();
      for (int i = 0; i < measured.size(); i++) {
        judge(machine, measured, measured.get(i), machine.lines.get(i).by());
      }
    }
    assertThat(resolvable).as(figures()).isGreaterThan(500);
    // the bar for suspects
    assertThat(share(resolvableRight, resolvable)).as(figures()).isGreaterThan(0.95);
    assertThat(share(wrongDoubted, wrong)).as(figures()).isGreaterThan(0.95);
    // doubt that were always said would say nothing: 5 of 100 is what "cannot be told" means
    assertThat(share(resolvableDoubted, resolvable)).as(figures()).isLessThan(0.05);
    assertThat(share(lockWrong, lines)).as(figures()).isLessThan(0.05);
    // a stated probability is right as often as it says; 0.1 because the weights of harmonics are
    // rules of thumb and the invented machines know nothing of them
    assertThat(Math.abs(share(right, lines) - probability / lines)).as(figures()).isLessThan(0.1);
  }

  /** The whole way: a tone with the machine's lines, measured by the engine. */
  @Test
  void namesTheRightPartOfMachinesThatWereRecorded() {
    for (long seed : new long[] {14, 24, 65}) {
      InventedMachine machine = new InventedMachine(seed);
      SpeedFunction speed = SpeedFunction.constant(machine.running.deviationPercent() / 100);
      for (int i = 0; i < machine.lines.size(); i++) {
        speed = speed.plusLine(machine.lines.get(i).hertz(), 0.05, i);
      }
      Reading reading = measured(speed);
      for (Reading.Line line : reading.lines()) {
        Double rate = line.rateHz().value();
        machine.lines.stream()
            .filter(m -> rate != null && Math.abs(m.hertz() - rate) < 0.01)
            .forEach(m -> judge(machine, reading.lines(), line, m.by()));
      }
    }
    assertThat(resolvable).as(figures()).isGreaterThan(10);
    // so few must all be right
    assertThat(resolvableRight).as(figures()).isEqualTo(resolvable);
    assertThat(wrongDoubted).as(figures()).isEqualTo(wrong);
  }

  private static Reading measured(SpeedFunction speed) {
    ByteArrayOutputStream wav = new ByteArrayOutputStream();
    try {
      WavWriter.write(wav, 8_000, 24, SignalSynth.tone(speed, 3150, 8_000, SECONDS, 0.5, 65, 5));
      Outcome outcome =
          new Measurement(CaptureFormats.standard())
              .measure(
                  bytes(wav.toByteArray()),
                  "0".repeat(64),
                  ReadOptions.none(),
                  MeasureSettings.tone(3150),
                  share -> {});
      return ((Outcome.Measured) outcome).reading();
    } catch (IOException e) {
      throw new AssertionError(e);
    }
  }

  private static ByteSource bytes(byte[] bytes) {
    return new ByteSource() {
      @Override
      public InputStream open() {
        return new ByteArrayInputStream(bytes);
      }

      @Override
      public long length() {
        return bytes.length;
      }
    };
  }

  private void judge(
      InventedMachine machine, List<Reading.Line> all, Reading.Line line, ExpectedRate by) {
    List<ExpectedRate> rates = RateTable.of(machine.entered, machine.running);
    LineFinding found =
        new LineSuspects(rates, machine.running, SECONDS).of(line, all).orElseThrow();
    boolean first =
        !found.suspects().isEmpty() && found.suspects().get(0).part().equals(by.part().name());
    lines++;
    right += first ? 1 : 0;
    probability += found.firstProbability();
    // a line without suspect says that nothing is known, which is not a wrong name
    boolean doubted = found.ambiguous() || found.suspects().isEmpty();
    wrong += first ? 0 : 1;
    wrongDoubted += !first && doubted ? 1 : 0;
    lockWrong += lockFits(found.lock(), by.rate().lock()) ? 0 : 1;
    if (resolvable(by, rates)) {
      resolvable++;
      resolvableRight += first ? 1 : 0;
      resolvableDoubted += found.ambiguous() ? 1 : 0;
    }
  }

  private static boolean lockFits(LockVerdict verdict, Lock lock) {
    return switch (verdict) {
      case UNDECIDED -> true;
      case NEITHER -> lock == Lock.FREE;
      case SHAFT -> lock == Lock.SHAFT;
      case MAINS -> lock == Lock.MAINS;
    };
  }

  private static boolean resolvable(ExpectedRate by, List<ExpectedRate> rates) {
    return rates.stream()
        .filter(other -> !other.part().equals(by.part()))
        .allMatch(other -> apart(by.rate(), other.rate()) > 2 * uncertainty(by, other));
  }

  private static double uncertainty(ExpectedRate a, ExpectedRate b) {
    double numbers = Math.hypot(a.rate().standardHertz(), b.rate().standardHertz());
    return Math.hypot(numbers, 1.5 / SECONDS / 2);
  }

  private static double apart(Turning a, Turning b) {
    return Math.max(0, Math.max(a.lowHertz() - b.highHertz(), b.lowHertz() - a.highHertz()));
  }

  private static double share(int part, int whole) {
    return (double) part / whole;
  }

  private String figures() {
    return "lines %d, right first %d at a stated %.3f; resolvable %d, right first %d, doubted %d; wrong %d, said so %d; lock wrong %d"
        .formatted(
            lines,
            right,
            probability / lines,
            resolvable,
            resolvableRight,
            resolvableDoubted,
            wrong,
            wrongDoubted,
            lockWrong);
  }
}
