package turnsheet.shop.web;

import java.time.Instant;
import org.springframework.stereotype.Component;
import turnsheet.shop.UnitSummary;
import turnsheet.web.Times;

/** Makes the lines of lists of units. */
@Component
class UnitRows {

  private final Times times;

  UnitRows(Times times) {
    this.times = times;
  }

  UnitRow row(UnitSummary summary) {
    Instant last = summary.lastOpenedAt();
    return new UnitRow(
        summary.unit().id().toString(),
        summary.unit().serialNumber(),
        summary.modelName(),
        summary.unit().modelId().toString(),
        summary.customerName(),
        summary.unit().customerId().toString(),
        summary.visits(),
        last == null ? "" : times.day(last),
        summary.onBench());
  }
}
