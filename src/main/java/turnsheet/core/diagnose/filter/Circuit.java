package turnsheet.core.diagnose.filter;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;

/**
 * A whole filter built of {@link SallenKey} stages.
 *
 * @param stages in the order of the signal
 * @param bands of each stage's f0 and Q over the tolerances of the parts
 * @param responses gain over frequency with its band
 * @param opAmpHertz gain-bandwidth product that the amplifiers need at least
 */
public record Circuit(
    FilterDesign design,
    Parts parts,
    List<SallenKey> stages,
    List<StageBand> bands,
    List<ResponseBand> responses,
    double opAmpHertz) {

  /** Circuits drawn for the bands. */
  public static final int DRAWS = 4000;

  /**
   * Gain-bandwidth product over f0 Q (common practice, no source). With a one-pole amplifier of
   * that product the response at f0 is off by about 2 %; the test computes it.
   */
  public static final double OP_AMP_MULTIPLE = 100;

  private static final long SEED = 60063;
  private static final int POINTS = 61;
  private static final double LOW_SHARE = 0.025;

  /**
   * Which parts may be used.
   *
   * @param capacitorFarad of a high-pass, and the smaller one of a low-pass
   * @param resistorPercent tolerance, to either side
   * @param capacitorPercent tolerance, to either side
   */
  public record Parts(
      ESeries series, double capacitorFarad, double resistorPercent, double capacitorPercent) {

    public Parts {
      if (!(capacitorFarad > 0)
          || !(resistorPercent >= 0 && resistorPercent < 50)
          || !(capacitorPercent >= 0 && capacitorPercent < 50)) {
        throw new IllegalArgumentException(
            capacitorFarad + " F, " + resistorPercent + " %, " + capacitorPercent + " %");
      }
    }
  }

  /** Between these values lie 95 of 100 circuits. */
  public record Band(double low, double high) {}

  /** How far the natural frequency and the quality of a stage scatter. */
  public record StageBand(Band f0Hz, Band q) {}

  /**
   * Gain at one frequency.
   *
   * @param wantedDb of the filter as designed
   * @param builtDb with the values on the parts
   */
  public record ResponseBand(double hertz, double wantedDb, double builtDb, Band bandDb) {}

  public Circuit {
    stages = List.copyOf(stages);
    bands = List.copyOf(bands);
    responses = List.copyOf(responses);
  }

  /**
   * Chooses the parts and draws the bands: every part even within its tolerance and independent of
   * the others, {@value #DRAWS} circuits, always the same ones.
   *
   * @param highestToothHertz the fastest signal that the amplifiers must follow
   */
  public static Circuit of(FilterDesign design, Parts parts, double highestToothHertz) {
    List<SallenKey> stages =
        design.sections().stream()
            .map(s -> SallenKey.of(s, parts.capacitorFarad(), parts.series()))
            .toList();
    double[] hertz = frequencies(design);
    double[][] f0 = new double[stages.size()][DRAWS];
    double[][] q = new double[stages.size()][DRAWS];
    double[][] gain = new double[hertz.length][DRAWS];
    Random random = new Random(SEED);
    double r = parts.resistorPercent() / 100;
    double c = parts.capacitorPercent() / 100;
    for (int n = 0; n < DRAWS; n++) {
      for (int k = 0; k < stages.size(); k++) {
        Section made =
            stages
                .get(k)
                .off(even(random, r), even(random, r), even(random, c), even(random, c))
                .built();
        f0[k][n] = made.f0Hz();
        q[k][n] = made.q();
        for (int i = 0; i < hertz.length; i++) {
          gain[i][n] += gainDb(made, hertz[i]);
        }
      }
    }
    List<StageBand> bands = new ArrayList<>();
    for (int k = 0; k < stages.size(); k++) {
      bands.add(new StageBand(band(f0[k]), band(q[k])));
    }
    List<ResponseBand> responses = new ArrayList<>();
    for (int i = 0; i < hertz.length; i++) {
      double at = hertz[i];
      double built = stages.stream().mapToDouble(s -> gainDb(s.built(), at)).sum();
      responses.add(new ResponseBand(at, design.gainDb(at), built, band(gain[i])));
    }
    return new Circuit(
        design, parts, stages, bands, responses, opAmpHertz(stages, highestToothHertz));
  }

  private static double opAmpHertz(List<SallenKey> stages, double highestToothHertz) {
    double fastest = highestToothHertz;
    for (SallenKey stage : stages) {
      fastest = Math.max(fastest, stage.wanted().f0Hz() * Math.max(1, stage.wanted().q()));
    }
    return OP_AMP_MULTIPLE * fastest;
  }

  private static double even(Random random, double share) {
    return share * (2 * random.nextDouble() - 1);
  }

  private static double gainDb(Section section, double hertz) {
    return 20 * Math.log10(section.response(hertz).magnitude());
  }

  /** Two decades about the cutoffs, even in ratio. */
  private static double[] frequencies(FilterDesign design) {
    Double low = design.lowHz();
    Double high = design.highHz();
    double from = (low != null ? low : high != null ? high : 1) / 10;
    double to = (high != null ? high : low != null ? low : 1) * 10;
    double[] hertz = new double[POINTS];
    for (int i = 0; i < POINTS; i++) {
      hertz[i] = from * Math.pow(to / from, (double) i / (POINTS - 1));
    }
    return hertz;
  }

  private static Band band(double[] values) {
    Arrays.sort(values);
    int low = (int) (LOW_SHARE * (values.length - 1));
    return new Band(values[low], values[values.length - 1 - low]);
  }
}
