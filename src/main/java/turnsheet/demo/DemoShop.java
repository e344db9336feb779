package turnsheet.demo;

import java.time.LocalDate;
import java.time.ZoneOffset;
import org.springframework.stereotype.Component;
import turnsheet.capture.CaptureKey;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.Customers;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.shop.MachineModel;
import turnsheet.shop.MachineModels;
import turnsheet.shop.Media;
import turnsheet.shop.MediumId;
import turnsheet.shop.ReferenceMedium;
import turnsheet.shop.Unit;
import turnsheet.shop.Units;
import turnsheet.shop.VisitId;

/** Fills an empty service with the invented shop; its recordings go the way of every upload. */
@Component
class DemoShop {

  private final MachineModels models;
  private final Customers customers;
  private final Units units;
  private final Instruments instruments;
  private final Media media;
  private final DemoBench bench;

  DemoShop(
      MachineModels models,
      Customers customers,
      Units units,
      Instruments instruments,
      Media media,
      DemoBench bench) {
    this.models = models;
    this.customers = customers;
    this.units = units;
    this.instruments = instruments;
    this.media = media;
    this.bench = bench;
  }

  /** Enters everything and orders the measurements. */
  void load() {
    LocalDate checked = LocalDate.ofInstant(bench.daysAgo(90), ZoneOffset.UTC);
    InstrumentId recorder =
        instruments
            .add(
                new BenchInstrument(
                    InstrumentId.next(), "Sound card at bench 1", 0, 10.0, checked, ""))
            .id();
    InstrumentId controller =
        instruments
            .add(
                new BenchInstrument(
                    InstrumentId.next(), "Controller with edge timer", 0, 40.0, checked, ""))
            .id();
    MediumId tape =
        media
            .add(
                new ReferenceMedium(
                    MediumId.next(), "Test tape 3150 Hz", SampleUploads.TONE_HZ, 0.05, 0.01, ""))
            .id();
    MediumId disc =
        media
            .add(
                new ReferenceMedium(
                    MediumId.next(), "Test record 3150 Hz", SampleUploads.TONE_HZ, 0.1, null, ""))
            .id();

    bench.checkClock(recorder);
    reelTransport(recorder, controller, tape);
    recordPlayer(recorder, disc);
    dictationMachine(controller);
  }

  private void reelTransport(InstrumentId recorder, InstrumentId controller, MediumId tape) {
    MachineModel model = models.add(DemoModels.reelTransport());
    Unit unit =
        units.add(
            model.id(),
            customers.add("Studio in the Old Dairy", "an invented customer").id(),
            "R2-0417",
            "");
    var tone = new DemoBench.Setup(model, DemoModels.AT_19, recorder, tape);

    VisitId first = bench.visit(unit, 2190, "Routine check.", "Cleaned, guides aligned.");
    bench.upload(first, tone, CaptureKey.AFTER_REPAIR, "reel-19-tone-first-visit.wav", 2190);
    bench.handBack(first, 2188);
    VisitId second =
        bench.visit(unit, 820, "Routine check.", "Cleaned; capstan noted for next time.");
    bench.upload(second, tone, CaptureKey.AS_RECEIVED, "reel-19-tone-second-visit.wav", 820);
    bench.handBack(second, 819);

    VisitId now =
        bench.visit(
            unit,
            2,
            "Piano sounds unsteady, and everything plays too high.",
            "Capstan bearing changed, speed set, sensor ring cleaned.");
    bench.upload(now, tone, CaptureKey.AS_RECEIVED, "reel-19-tone-as-received.wav", 2);
    bench.upload(now, tone, CaptureKey.AFTER_REPAIR, "reel-19-tone-after-repair.wav", 0);
    var tacho = new DemoBench.Setup(model, DemoModels.AT_38, recorder, null);
    bench.upload(now, tacho, CaptureKey.AS_RECEIVED, "reel-38-tacho-as-received.wav", 2);
    bench.upload(now, tacho, CaptureKey.AFTER_REPAIR, "reel-38-tacho-after-repair.wav", 0);
    var edges = new DemoBench.Setup(model, DemoModels.AT_9, controller, null);
    bench.upload(now, edges, CaptureKey.AS_RECEIVED, "reel-9-edges-as-received.csv", 2);
    bench.upload(now, edges, CaptureKey.AFTER_REPAIR, "reel-9-periods-after-repair.txt", 0);
  }

  private void recordPlayer(InstrumentId recorder, MediumId disc) {
    MachineModel model = models.add(DemoModels.recordPlayer());
    Unit unit =
        units.add(
            model.id(),
            customers.add("Listening Room Association", "an invented customer").id(),
            "P1-2203",
            "");
    var tone = new DemoBench.Setup(model, DemoModels.AT_33, recorder, disc);
    VisitId visit =
        bench.visit(unit, 1, "Long notes waver.", "Platter bushing changed, record centred.");
    bench.upload(visit, tone, CaptureKey.AS_RECEIVED, "disc-33-tone-as-received.aiff", 1);
    bench.upload(visit, tone, CaptureKey.AFTER_REPAIR, "disc-33-tone-after-repair.aiff", 0);
  }

  private void dictationMachine(InstrumentId controller) {
    MachineModel model = models.add(DemoModels.dictationMachine());
    Unit unit =
        units.add(
            model.id(),
            customers.add("Archive of Spoken Letters", "an invented customer").id(),
            "D5-118",
            "");
    var tacho = new DemoBench.Setup(model, DemoModels.DICTATION, controller, null);
    VisitId visit = bench.visit(unit, 1, "Voices gurgle.", "");
    bench.upload(visit, tacho, CaptureKey.AS_RECEIVED, "dictation-4-tacho-as-received.csv", 1);
    bench.upload(visit, tacho, CaptureKey.AFTER_REPAIR, "dictation-4-tacho-after-repair.vcd", 0);
    bench.refusedUpload(visit, tacho);
  }
}
