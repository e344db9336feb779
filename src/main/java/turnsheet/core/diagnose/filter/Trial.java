package turnsheet.core.diagnose.filter;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.Executor;
import java.util.stream.IntStream;
import org.jspecify.annotations.Nullable;
import turnsheet.core.measure.ChannelMeasurement;
import turnsheet.core.measure.ChannelTeam;
import turnsheet.core.measure.Progress;
import turnsheet.core.signal.RejectedException;

/**
 * Tries filters on a recorded waveform before anybody builds them. Every candidate reads the
 * recording for itself, in a thread of its own and block by block, so memory does not grow with the
 * recording or the number of candidates; the result does not depend on the number of threads.
 */
public final class Trial {

  /** Played at the other speeds. */
  private static final double PLAYED_SECONDS = 2;

  private final Executor threads;
  private final int atOnce;

  /**
   * @param threads run the candidates
   * @param atOnce most at the same time
   */
  public Trial(Executor threads, int atOnce) {
    this.threads = threads;
    this.atOnce = atOnce;
  }

  /**
   * Tries all candidates of a plan, and the signal without a filter.
   *
   * @param progress told in the calling thread; may throw to stop everything
   * @throws RejectedException if the recording holds no pulses near the nominal rate, or a cutoff
   *     is too high for its sample rate
   */
  public TrialResult run(SampleSource source, TrialPlan plan, Progress progress)
      throws IOException, RejectedException {
    int rows = plan.designs().size() + 1;
    // a candidate is two passes
    double first = Recorded.PASSES / (Recorded.PASSES + 2.0 * rows);
    Recorded recorded =
        Recorded.of(source, plan.nominalHz(), part -> progress.reached(first * part));
    requireCutoffs(plan, recorded.rateHertz());
    List<Candidate.Other> others =
        List.of(
            other(recorded, plan, plan.lowestHz(), 1), other(recorded, plan, plan.highestHz(), 2));
    ChannelTeam<TrialResult.Row> team =
        new ChannelTeam<>(
            IntStream.range(0, rows).boxed().toList(),
            (row, told) ->
                row(source, new Candidate(recorded, plan, design(plan, row), others), told),
            atOnce,
            threads);
    List<TrialResult.Row> tried;
    try {
      tried = team.run(shares -> progress.reached(first + (1 - first) * mean(shares)));
    } catch (RefusedException e) {
      throw e.refused;
    }
    progress.reached(1);
    return result(plan, recorded, tried);
  }

  private static TrialResult.Row row(SampleSource source, Candidate candidate, Progress progress)
      throws IOException {
    try {
      return candidate.row(source, progress);
    } catch (RejectedException e) {
      throw new RefusedException(e);
    }
  }

  private static @Nullable FilterDesign design(TrialPlan plan, int row) {
    return row == 0 ? null : plan.designs().get(row - 1);
  }

  private static double mean(List<ChannelMeasurement.Share> shares) {
    return shares.stream().mapToDouble(ChannelMeasurement.Share::fraction).average().orElse(0);
  }

  private static void requireCutoffs(TrialPlan plan, double rate) throws RejectedException {
    for (FilterDesign design : plan.designs()) {
      Double high = design.highHz() != null ? design.highHz() : design.lowHz();
      if (high != null && high > DiscreteFilter.HIGHEST_SHARE * rate) {
        throw new RejectedException(
            "cutoffTooHigh",
            String.format(
                Locale.ROOT,
                "A cutoff of %.6g Hz cannot be tried on %.6g samples per second: choose at most"
                    + " %.6g Hz.",
                high,
                rate,
                Math.floor(DiscreteFilter.HIGHEST_SHARE * rate)));
      }
    }
  }

  private static Candidate.Other other(Recorded recorded, TrialPlan plan, double hertz, long seed) {
    double gain = plan.levelFollowsSpeed() ? hertz / recorded.wave().toothHz() : 1;
    double settle =
        plan.designs().stream()
            .mapToDouble(d -> d.at(recorded.rateHertz()).settleSeconds())
            .max()
            .orElse(0);
    double seconds = PLAYED_SECONDS + settle;
    return new Candidate.Other(
        hertz,
        gain,
        seconds,
        new ArraySamples(recorded.playedAt(hertz, gain, seconds, seed), recorded.rateHertz()));
  }

  private static TrialResult result(TrialPlan plan, Recorded recorded, List<TrialResult.Row> rows) {
    MeanWave wave = recorded.wave();
    MeanWave.Shape shape = wave.shape();
    double peak = wave.peak();
    return new TrialResult(
        plan,
        recorded.seconds(),
        wave.toothHz(),
        recorded.pulses().times().length,
        shape.high() - shape.low(),
        20 * Math.log10(Math.max(1e-12, Math.sqrt(2) * recorded.noise().whiteRms() / peak)),
        new ArrayList<>(
            recorded.noise().hum().stream()
                .map(l -> new TrialResult.Hum(l.hertz(), 20 * Math.log10(l.peak() / peak)))
                .toList()),
        rows,
        Chooser.choose(rows, plan.goodEnoughPercent() * 1e4 / wave.toothHz()));
  }

  /** Carries a refusal out of a candidate's thread. */
  private static final class RefusedException extends IOException {
    private final transient RejectedException refused;

    RefusedException(RejectedException refused) {
      super(refused);
      this.refused = refused;
    }
  }
}
