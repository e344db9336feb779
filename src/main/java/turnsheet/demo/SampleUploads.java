package turnsheet.demo;

import java.util.List;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.synth.AiffWriter;
import turnsheet.core.synth.SignalSynth;
import turnsheet.core.synth.SpeedFunction;
import turnsheet.core.synth.WavWriter;

/**
 * The sample folder: every capture kind, two before/after pairs, three visits of one unit over the
 * years. Machines, faults and figures are invented; every file is made from a closed-form speed and
 * a fixed seed, so that its truth is exact and its bytes are the same each time.
 */
final class SampleUploads {

  /** Tone of the reference media, Hz (IEC 60386). */
  static final double TONE_HZ = 3150;

  /** A 120-tooth ring on a 9.096 mm capstan (common practice): pulses per second at 19.05 cm/s. */
  static final double PULSES_AT_19 = 800;

  private static final double CAPSTAN_AT_19_HZ = 19.05 / (Math.PI * 0.9096);
  private static final double PINCH_ROLLER_AT_19_HZ = 19.05 / (Math.PI * 3.8);
  private static final double PLATTER_HZ = 100.0 / 180;
  private static final double DICTATION_BELT_HZ = 1.9;

  private SampleUploads() {}

  /** All measurable samples in the order of the folder's README. */
  static List<SampleUpload> all() {
    return List.of(
        reelTone(
            "reel-19-tone-as-received.wav",
            "Reel transport at 19.05 cm/s before the repair: runs fast, capstan out of true.",
            30,
            reelSpeed(0.37, 0.115, 0.030),
            11),
        reelTone(
            "reel-19-tone-after-repair.wav",
            "The same transport after the capstan bearing was changed.",
            30,
            reelSpeed(0.04, 0.024, 0.018),
            12),
        reelTone(
            "reel-19-tone-first-visit.wav",
            "The same transport years earlier.",
            24,
            reelSpeed(0.06, 0.022, 0.016),
            13),
        reelTone(
            "reel-19-tone-second-visit.wav",
            "The same transport between the two.",
            24,
            reelSpeed(0.17, 0.052, 0.021),
            14),
        reelTacho(
            "reel-38-tacho-as-received.wav",
            "Tachometer waveform of the transport at 38.1 cm/s before the repair.",
            speedAtDouble(-0.21, 0.062),
            15),
        reelTacho(
            "reel-38-tacho-after-repair.wav",
            "The same after the repair.",
            speedAtDouble(0.03, 0.019),
            16),
        reelEdges(),
        reelPeriods(),
        discTone(
            "disc-33-tone-as-received.aiff",
            "Record player at 33 1/3 rev/min with a record off centre.",
            SpeedFunction.constant(-0.0012)
                .plusLine(PLATTER_HZ, 0.19, 0.4)
                .plusLine(10 * PLATTER_HZ, 0.035, 1),
            17),
        discTone(
            "disc-33-tone-after-repair.aiff",
            "The same with the record centred.",
            SpeedFunction.constant(-0.0012)
                .plusLine(PLATTER_HZ, 0.05, 0.4)
                .plusLine(10 * PLATTER_HZ, 0.034, 2),
            18),
        dictationTable(),
        dictationDump());
  }

  private static SpeedFunction reelSpeed(double deviation, double capstan, double pinch) {
    return SpeedFunction.constant(deviation / 100)
        .plusLine(CAPSTAN_AT_19_HZ, capstan, 0.3)
        .plusLine(PINCH_ROLLER_AT_19_HZ, pinch, 1.1);
  }

  private static SpeedFunction speedAtDouble(double deviation, double capstan) {
    return SpeedFunction.constant(deviation / 100)
        .plusLine(2 * CAPSTAN_AT_19_HZ, capstan, 0.7)
        .plusLine(2 * PINCH_ROLLER_AT_19_HZ, 0.012, 2.0);
  }

  private static SampleUpload reelTone(
      String name, String about, double seconds, SpeedFunction speed, long seed) {
    int rate = 24000;
    return new SampleUpload(
        name,
        about,
        CaptureKind.TONE,
        TONE_HZ,
        seconds,
        speed,
        out ->
            WavWriter.write(
                out, rate, 16, SignalSynth.tone(speed, TONE_HZ, rate, seconds, 0.5, 55, seed)));
  }

  private static SampleUpload reelTacho(String name, String about, SpeedFunction speed, long seed) {
    int rate = 32000;
    double seconds = 24;
    return new SampleUpload(
        name,
        about,
        CaptureKind.TACHOMETER,
        2 * PULSES_AT_19,
        seconds,
        speed,
        out ->
            WavWriter.write(
                out,
                rate,
                16,
                SignalSynth.pulses(
                    speed, 2 * PULSES_AT_19, rate, seconds, 0.6, 0.8, 0.0005, seed)));
  }

  private static SampleUpload reelEdges() {
    SpeedFunction speed =
        SpeedFunction.constant(0.0051)
            .plusLine(CAPSTAN_AT_19_HZ / 2, 0.092, 0.2)
            .plusLine(PINCH_ROLLER_AT_19_HZ / 2, 0.04, 0.9);
    return new SampleUpload(
        "reel-9-edges-as-received.csv",
        "Times of the tachometer's edges at 9.525 cm/s from a controller, before the repair.",
        CaptureKind.EDGES,
        PULSES_AT_19 / 2,
        30,
        speed,
        out ->
            TextSamples.edgeList(
                out, SignalSynth.risingEdges(speed, PULSES_AT_19 / 2, 30, 1e-6, 19)));
  }

  private static SampleUpload reelPeriods() {
    SpeedFunction speed =
        SpeedFunction.constant(0.0006)
            .plusLine(CAPSTAN_AT_19_HZ / 2, 0.03, 0.2)
            .plusLine(PINCH_ROLLER_AT_19_HZ / 2, 0.035, 0.9);
    return new SampleUpload(
        "reel-9-periods-after-repair.txt",
        "The times between edges at 9.525 cm/s, after the repair.",
        CaptureKind.EDGES,
        PULSES_AT_19 / 2,
        30,
        speed,
        out ->
            TextSamples.periodList(
                out, SignalSynth.risingEdges(speed, PULSES_AT_19 / 2, 30, 1e-6, 20)));
  }

  private static SampleUpload discTone(String name, String about, SpeedFunction speed, long seed) {
    int rate = 24000;
    double seconds = 27;
    return new SampleUpload(
        name,
        about,
        CaptureKind.TONE,
        TONE_HZ,
        seconds,
        speed,
        out ->
            AiffWriter.write(
                out, rate, SignalSynth.tone(speed, TONE_HZ, rate, seconds, 0.4, 48, seed)));
  }

  private static SampleUpload dictationTable() {
    SpeedFunction speed = SpeedFunction.constant(0.018).plusLine(DICTATION_BELT_HZ, 0.32, 0.5);
    double step = 500e-6;
    return new SampleUpload(
        "dictation-4-tacho-as-received.csv",
        "Oscilloscope table of a dictation machine's tachometer at 4.7625 cm/s, slipping belt.",
        CaptureKind.TACHOMETER,
        250,
        22,
        speed,
        out ->
            TextSamples.waveformTable(
                out,
                SignalSynth.pulses(speed, 250, 1 / step, 22, 2.4, 1.2, 0.004, 21),
                step,
                -0.5));
  }

  private static SampleUpload dictationDump() {
    SpeedFunction speed = SpeedFunction.constant(0.003).plusLine(DICTATION_BELT_HZ, 0.11, 0.5);
    return new SampleUpload(
        "dictation-4-tacho-after-repair.vcd",
        "Value change dump of the same tachometer with a new belt.",
        CaptureKind.EDGES,
        250,
        24,
        speed,
        out ->
            TextSamples.valueChangeDump(out, SignalSynth.risingEdges(speed, 250, 24, 0.2e-6, 22)));
  }
}
