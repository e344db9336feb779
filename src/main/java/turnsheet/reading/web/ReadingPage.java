package turnsheet.reading.web;

import java.util.List;
import org.jspecify.annotations.Nullable;
import turnsheet.web.Crumb;
import turnsheet.web.Shown;

/**
 * One reading as its page shows it.
 *
 * @param toneMethod how a tone came onto what was played; empty where not said
 * @param running what each printed sheet carries at its foot
 * @param histogram null for a tone
 * @param edges empty for a tone
 * @param channels null where the recording has one only
 * @param others earlier or later readings of the same channel
 * @param waveform whether it is one of a tachometer, on which filters can be tried
 */
record ReadingPage(
    String id,
    String captureId,
    String visitId,
    List<Crumb> trail,
    String title,
    String sentence,
    String toneMethod,
    String running,
    List<Group> figures,
    List<Group> edges,
    List<Group> signal,
    String rule,
    @Nullable Drawn trace,
    @Nullable Drawn spectrum,
    @Nullable Drawn histogram,
    List<LineRow> lines,
    List<StabilityRow> stability,
    BudgetTable budget,
    List<Fact> edgeFacts,
    List<Fact> signalFacts,
    List<String> warnings,
    List<Fact> source,
    List<Fact> method,
    @Nullable ChannelTable channels,
    List<Other> others,
    boolean waveform) {

  /** Whether a figure of these has a limit, so that limit and verdict need columns. */
  public boolean judged(List<Group> groups) {
    return groups.stream().flatMap(g -> g.rows().stream()).anyMatch(r -> !r.limit().isEmpty());
  }

  /** Figures that belong together. */
  record Group(String title, List<FigureRow> rows) {}

  /**
   * One line of the spectrum.
   *
   * @param suspects the most probable first, with harmonic and expected rate
   */
  record LineRow(Shown rate, Shown peak, List<String> suspects) {}

  record StabilityRow(String tau, Shown deviation) {}

  record Fact(String name, String text) {}

  record Other(String id, String madeAt, String version) {}
}
