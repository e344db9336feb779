package turnsheet.exchange;

import static turnsheet.exchange.Member.decimal;
import static turnsheet.exchange.Member.document;
import static turnsheet.exchange.Member.id;
import static turnsheet.exchange.Member.text;
import static turnsheet.exchange.Member.time;
import static turnsheet.exchange.Member.whole;

import java.util.List;

/** What the bench adds to the books: recordings and what came of them. */
final class BenchKinds {

  /** One at most for a visit; the picture itself lies in the store. */
  static final Kind PHOTOS =
      new Kind(
          "photos",
          "plate_photo",
          "visitId",
          "taken_in_at,",
          "visit_id in ({visits})",
          List.of(
              id("visitId").naming("visit"),
              text("sha256"),
              whole("byteLength"),
              whole("widthPx"),
              whole("heightPx"),
              time("takenInAt"),
              text("takenInBy"),
              Member.of("jpeg", MemberType.STORED)),
          List.of(),
          2);

  static final Kind CLOCK_CHECKS =
      new Kind(
          "clockChecks",
          "clock_check",
          "madeAt",
          "made_at,",
          "instrument_id in (select instrument_id from capture where visit_id in ({visits}))",
          List.of(
              id("id"),
              id("instrumentId").naming("bench_instrument"),
              time("madeAt"),
              text("madeBy"),
              text("source"),
              decimal("referenceHz"),
              decimal("referenceExpandedUncertaintyPpm"),
              text("fileName"),
              text("sha256"),
              whole("byteLength"),
              text("format"),
              text("kind"),
              whole("channel"),
              decimal("sampleRateHz").orNull(),
              decimal("durationSeconds"),
              text("methodVersion"),
              decimal("measuredHz"),
              decimal("recordingPpm"),
              decimal("errorPpm"),
              decimal("expandedUncertaintyPpm"),
              decimal("keepingPpm"),
              document("warnings"),
              time("takenAt").orNull(),
              text("takenBy").orNull(),
              decimal("beforeErrorPpm").orNull(),
              decimal("beforeExpandedUncertaintyPpm").orNull(),
              Member.of("beforeCheckedOn", MemberType.DAY).orNull()),
          List.of());

  static final Kind CAPTURES =
      new Kind(
          "captures",
          "capture",
          "fileName",
          "received_at,",
          "visit_id in ({visits})",
          List.of(
              id("id"),
              id("visitId").naming("visit"),
              id("speedSettingId").naming(Kinds.SETTING_TABLE),
              text("condition").in("bench_condition"),
              id("instrumentId").naming("bench_instrument").orNull(),
              id("mediumId").naming("reference_medium").orNull(),
              text("fileName"),
              text("sha256"),
              whole("byteLength"),
              time("receivedAt"),
              text("receivedBy"),
              // the order to measure does not travel
              text("state")
                  .selectedBy("case when state = 'queued' then 'recognised' else state end"),
              whole("mainChannel"),
              text("toneMethod").orNull(),
              text("settingProposal").orNull(),
              document("recognition").orNull(),
              document("choices").orNull(),
              text("refusalCode").orNull(),
              text("refusalMessage").orNull()),
          List.of(
              new Part(
                  "refusedChannels",
                  "refused_channel",
                  "capture_id",
                  null,
                  "channel",
                  List.of(whole("channel"), text("code"), text("message")))));

  static final Kind LEFT_OUT =
      new Kind(
          "leftOut",
          "left_out_capture",
          "reason",
          "left_out_at,",
          "capture_id in (select id from capture where visit_id in ({visits}))",
          List.of(
              id("captureId").naming("capture"),
              text("reason"),
              time("leftOutAt"),
              text("leftOutBy")),
          List.of(),
          2);

  static final Kind READINGS =
      new Kind(
          "readings",
          "reading",
          "madeAt",
          "made_at,",
          "capture_id in (select id from capture where visit_id in ({visits}))",
          List.of(
              id("id"),
              id("captureId").naming("capture"),
              whole("channel"),
              time("madeAt"),
              document("document")),
          List.of());

  static final Kind REPORTS =
      new Kind(
          "reports",
          "report",
          "number",
          "number,",
          "visit_id in ({visits})",
          List.of(
              whole("number"),
              id("visitId").naming("visit"),
              text("checkCode"),
              Member.of("content", MemberType.CONTENT)),
          List.of());

  private BenchKinds() {}
}
