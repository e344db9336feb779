package turnsheet.core.measure;

import java.util.List;
import java.util.function.LongSupplier;

/**
 * How good a tachometer's waveform is, beside its edges.
 *
 * @param mains relative to the fundamental of the pulses
 * @param clippedSamples asked after all edges have been read
 */
record WaveformSignal(Figure snrDb, List<Reading.MainsLine> mains, LongSupplier clippedSamples) {

  WaveformSignal {
    mains = List.copyOf(mains);
  }

  /** Of a list of edges nothing is known. */
  static WaveformSignal ofAList() {
    return new WaveformSignal(
        Figure.absent("an edge list holds no waveform whose level could be read"),
        List.of(),
        () -> 0);
  }
}
