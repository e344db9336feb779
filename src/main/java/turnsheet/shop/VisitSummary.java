package turnsheet.shop;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * A visit as lists and headings show it.
 *
 * @param report number of its latest report; null while none was issued
 * @param reportedAt when that was issued; null where it is
 */
public record VisitSummary(
    Visit visit,
    String serialNumber,
    ModelId modelId,
    String modelName,
    CustomerId customerId,
    String customerName,
    @Nullable Long report,
    @Nullable Instant reportedAt) {

  VisitSummary withVisit(Visit now) {
    return new VisitSummary(
        now, serialNumber, modelId, modelName, customerId, customerName, report, reportedAt);
  }
}
