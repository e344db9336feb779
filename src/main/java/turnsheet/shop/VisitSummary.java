package turnsheet.shop;

/** A visit as lists and headings show it. */
public record VisitSummary(
    Visit visit,
    String serialNumber,
    ModelId modelId,
    String modelName,
    CustomerId customerId,
    String customerName) {

  VisitSummary withVisit(Visit now) {
    return new VisitSummary(now, serialNumber, modelId, modelName, customerId, customerName);
  }
}
