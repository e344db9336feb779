package turnsheet.core.measure;

import java.util.List;

/** How good a tachometer's waveform is, beside its edges. */
record WaveformSignal(Figure snrDb, List<Reading.MainsLine> mains) {

  WaveformSignal {
    mains = List.copyOf(mains);
  }

  /** Of a list of edges nothing is known. */
  static WaveformSignal ofAList() {
    return new WaveformSignal(
        Figure.absent("an edge list holds no waveform whose level could be read"), List.of());
  }
}
