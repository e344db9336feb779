package turnsheet.exchange;

import java.sql.Types;
import java.time.ZoneOffset;
import java.util.List;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.stereotype.Component;
import turnsheet.access.Secrets;
import turnsheet.bench.ClockCheckId;
import turnsheet.bench.ClockChecks;
import turnsheet.capture.CaptureId;
import turnsheet.capture.Captures;
import turnsheet.core.measure.Reading;
import turnsheet.document.CoreJson;
import turnsheet.document.ReadingDocument;
import turnsheet.exchange.Books.Extra;
import turnsheet.reading.ReadingId;
import turnsheet.reading.Readings;
import turnsheet.report.CheckCode;
import turnsheet.report.Issue;
import turnsheet.report.Report;
import turnsheet.shop.CustomerId;
import turnsheet.shop.Customers;
import turnsheet.shop.InstrumentId;
import turnsheet.shop.Instruments;
import turnsheet.shop.MachineModels;
import turnsheet.shop.Media;
import turnsheet.shop.MediumId;
import turnsheet.shop.ModelId;
import turnsheet.shop.UnitId;
import turnsheet.shop.Units;
import turnsheet.shop.VisitId;
import turnsheet.shop.Visits;

/**
 * Holds entries of a file against the rules of the features: what was written must be what they can
 * read, and what stands twice must say the same.
 */
@Component
final class Checks {

  private final Customers customers;
  private final MachineModels models;
  private final Units units;
  private final Visits visits;
  private final Instruments instruments;
  private final Media media;
  private final ClockChecks clockChecks;
  private final Captures captures;
  private final Readings readings;

  Checks(
      Customers customers,
      MachineModels models,
      Units units,
      Visits visits,
      Instruments instruments,
      Media media,
      ClockChecks clockChecks,
      Captures captures,
      Readings readings) {
    this.customers = customers;
    this.models = models;
    this.units = units;
    this.visits = visits;
    this.instruments = instruments;
    this.media = media;
    this.clockChecks = clockChecks;
    this.captures = captures;
    this.readings = readings;
  }

  /**
   * Values of the columns that follow from others, before an entry is written.
   *
   * @throws IllegalArgumentException if what stands twice differs
   */
  List<Extra> extras(Entry entry) {
    return switch (entry.kind().name()) {
      case "readings" -> {
        Reading reading = ReadingDocument.fromJson(entry.text("document"));
        require(
            reading.source().channel() == entry.whole("channel"),
            "its channel is not that of the document");
        yield List.of(new Extra("method_version", reading.method().version(), Types.VARCHAR));
      }
      case "reports" -> {
        Issue issue = issue(entry);
        require(issue.number() == entry.whole("number"), "its number is not that of the content");
        require(
            CheckCode.of(entry.text("content")).equals(entry.value("checkCode")),
            "its check code is not that of the content, which was changed");
        yield List.of(
            new Extra(
                "issued_at",
                issue.issuedAt().atOffset(ZoneOffset.UTC),
                Types.TIMESTAMP_WITH_TIMEZONE),
            new Extra("revises", issue.revises(), Types.BIGINT),
            new Extra("content_sha256", Secrets.sha256(entry.text("content")), Types.VARCHAR));
      }
      default -> List.of();
    };
  }

  /** Number of the report that a report revises; null where it revises none. */
  static @Nullable Long revises(Entry report) {
    return issue(report).revises();
  }

  /**
   * Reads an entry back as its feature does, and enters what follows from it.
   *
   * @throws RuntimeException if it breaks a rule
   */
  void afterwards(Entry entry) {
    boolean there =
        switch (entry.kind().name()) {
          case "instruments" -> instruments.find(new InstrumentId(id(entry))).isPresent();
          case "media" -> media.find(new MediumId(id(entry))).isPresent();
          case "models" -> models.find(new ModelId(id(entry))).isPresent();
          case "customers" -> customers.find(new CustomerId(id(entry))).isPresent();
          case "units" -> units.find(new UnitId(id(entry))).isPresent();
          case "visits" -> visits.find(new VisitId(id(entry))).isPresent();
          case "clockChecks" -> clockChecks.find(new ClockCheckId(id(entry))).isPresent();
          case "captures" -> {
            require(!"queued".equals(entry.value("state")), "a capture does not travel queued");
            require(
                entry.value("recognition") != null
                    || !List.of("recognised", "measured").contains(entry.text("state")),
                "it is recognised or measured without a recognition");
            yield captures.find(new CaptureId(id(entry))).isPresent();
          }
          case "shop", "shopRules", "shopLogo" -> {
            ShopChecks.check(entry);
            yield true;
          }
          case "readings" -> {
            readings.addFigures(
                new ReadingId(id(entry)), ReadingDocument.fromJson(entry.text("document")));
            yield true;
          }
          default -> true;
        };
    require(there, "it cannot be read back");
  }

  private static Issue issue(Entry report) {
    return CoreJson.fromJson(report.text("content"), Report.Content.class).issue();
  }

  private static UUID id(Entry entry) {
    return (UUID) entry.key();
  }

  private static void require(boolean kept, String otherwise) {
    if (!kept) {
      throw new IllegalArgumentException(otherwise);
    }
  }
}
