package turnsheet.core.format.text;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.Warning;

/** Edges of one signal of a value change dump; a change from an unknown level is none. */
final class VcdEdgeReader implements EdgeReader {

  private final VcdChanges changes;
  private final byte[] code;
  private final TickScale scale;
  private int level = VcdChanges.UNKNOWN;

  VcdEdgeReader(VcdChanges changes, VcdDefinitions.Signal signal, TickScale scale) {
    this.changes = changes;
    this.code = signal.code().getBytes(StandardCharsets.ISO_8859_1);
    this.scale = scale;
  }

  @Override
  public int read(double[] timesSeconds, boolean[] rising) throws IOException, RejectedException {
    int count = 0;
    while (count < timesSeconds.length && changes.next()) {
      if (changes.isOf(code)) {
        int before = level;
        level = changes.level();
        if (before + level == 1) {
          timesSeconds[count] = scale.seconds((double) changes.ticks());
          rising[count++] = level == 1;
        }
      }
    }
    return count;
  }

  @Override
  public double timeStepSeconds() {
    return scale.unitSeconds();
  }

  @Override
  public List<Warning> warnings() {
    return changes.warnings();
  }

  @Override
  public void close() throws IOException {
    changes.close();
  }
}
