package turnsheet.bench.web;

import java.io.IOException;
import java.io.InputStream;
import java.util.List;
import java.util.UUID;
import org.springframework.stereotype.Component;
import turnsheet.access.AuditTrail;
import turnsheet.access.CurrentUser;
import turnsheet.bench.ClockCheck;
import turnsheet.bench.ClockCheckId;
import turnsheet.bench.ClockChecking;
import turnsheet.bench.ClockChecks;
import turnsheet.bench.ClockQuestion;
import turnsheet.bench.KeptFile;
import turnsheet.capture.UploadTrouble;
import turnsheet.shop.BenchInstrument;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.web.NotFoundException;
import turnsheet.web.RefusedRequestException;

/** What the pages and the REST resource ask alike, in the name of whoever is signed in. */
@Component
class ClockDesk {

  private final ClockChecking checking;
  private final ClockChecks checks;
  private final Instruments instruments;
  private final CurrentUser user;
  private final AuditTrail audit;

  ClockDesk(
      ClockChecking checking,
      ClockChecks checks,
      Instruments instruments,
      CurrentUser user,
      AuditTrail audit) {
    this.checking = checking;
    this.checks = checks;
    this.instruments = instruments;
    this.user = user;
    this.audit = audit;
  }

  BenchInstrument instrument(UUID id) {
    return instruments
        .find(new InstrumentId(id))
        .orElseThrow(() -> new NotFoundException("instrument"));
  }

  /** The newest first. */
  List<ClockCheck> checks(BenchInstrument instrument) {
    return checks.ofInstrument(instrument.id());
  }

  ClockCheck check(UUID instrument, UUID id) {
    return checking.check(new InstrumentId(instrument), new ClockCheckId(id));
  }

  /**
   * Stores a file.
   *
   * @throws RefusedRequestException also where the transfer or the disk failed
   */
  KeptFile keep(String fileName, InputStream in) {
    try {
      return checking.keep(fileName, in);
    } catch (IOException e) {
      throw UploadTrouble.refused(e);
    }
  }

  boolean isKept(KeptFile file) {
    return checking.isKept(file);
  }

  ClockCheck check(BenchInstrument instrument, ClockQuestion question, KeptFile file) {
    return checking.check(instrument.id(), question, file, user.signInName());
  }

  ClockCheck take(UUID instrument, UUID id) {
    ClockCheck taken =
        checking.take(new InstrumentId(instrument), new ClockCheckId(id), user.signInName());
    audit.record("bench.audit.clockTaken", instrument(instrument).name());
    return taken;
  }
}
