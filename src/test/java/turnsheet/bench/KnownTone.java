package turnsheet.bench;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;

/** Files that hold a true 1000 Hz, as an instrument with a wrong clock records it. */
public final class KnownTone {

  private KnownTone() {}

  /**
   * A WAV file of 24 bits at a stated 8000 samples per second, two channels alike.
   *
   * @param clockPpm positive where the clock runs fast
   */
  public static byte[] wav(double clockPpm, double seconds) throws IOException {
    double rate = 8000 * (1 + clockPpm * 1e-6);
    double[] tone = SignalSynth.tone(SpeedFunction.constant(0), 1000, rate, seconds, 0.3, 60, 1);
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    WavWriter.write(out, 8000, 24, tone, tone);
    return out.toByteArray();
  }
}
