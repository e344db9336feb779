package turnsheet.exchange;

import static turnsheet.exchange.Member.decimal;
import static turnsheet.exchange.Member.document;
import static turnsheet.exchange.Member.id;
import static turnsheet.exchange.Member.text;
import static turnsheet.exchange.Member.time;
import static turnsheet.exchange.Member.whole;

import java.util.List;

/** What an export holds; a kind refers to kinds before it only. */
final class Kinds {

  static final String SETTING_TABLE = "speed_setting";
  static final String SETTINGS = "settings";

  static final Kind INSTRUMENTS =
      new Kind(
          "instruments",
          "bench_instrument",
          "name",
          "",
          "id in (select instrument_id from capture where visit_id in ({visits}))",
          List.of(
              id("id"),
              text("name"),
              decimal("clockErrorPpm"),
              decimal("clockExpandedUncertaintyPpm").orNull(),
              Member.of("checkedOn", MemberType.DAY).orNull(),
              text("note")),
          List.of());

  static final Kind MEDIA =
      new Kind(
          "media",
          "reference_medium",
          "name",
          "",
          "id in (select medium_id from capture where visit_id in ({visits}))",
          List.of(
              id("id"),
              text("name"),
              decimal("toneHz").orNull(),
              decimal("speedTolerancePercent"),
              decimal("ownFlutterPercent").orNull(),
              text("note")),
          List.of());

  static final Kind MODELS =
      new Kind(
          "models",
          "machine_model",
          "name",
          "",
          "id in (select model_id from unit where {unit})",
          List.of(id("id"), text("name"), whole("pulsesPerTurn").orNull(), text("note")),
          List.of(
              new Part(
                  SETTINGS,
                  SETTING_TABLE,
                  "model_id",
                  "position",
                  "position",
                  List.of(
                      id("id"),
                      text("label"),
                      text("speedUnit"),
                      decimal("nominalSpeed"),
                      decimal("toneHz").orNull(),
                      decimal("pulsesPerSecond").orNull())),
              new Part(
                  "parts",
                  "rotating_part",
                  "model_id",
                  "position",
                  "position",
                  List.of(
                      text("name"),
                      text("basis"),
                      decimal("amount"),
                      text("referencePart").orNull(),
                      text("kind").orNull().since(2),
                      document("details").orNull().since(2))),
              new Part(
                  "limits",
                  "service_limit",
                  "model_id",
                  "position",
                  "position",
                  List.of(
                      id("speedSettingId"),
                      text("figure"),
                      decimal("upperBound"),
                      text("origin")))));

  static final Kind CUSTOMERS =
      new Kind(
          "customers",
          "customer",
          "name",
          "created_at,",
          "id in (select customer_id from unit where {unit})",
          List.of(id("id"), text("name"), text("contact"), time("createdAt")),
          List.of());

  static final Kind UNITS =
      new Kind(
          "units",
          "unit",
          "serialNumber",
          "created_at,",
          "{unit}",
          List.of(
              id("id"),
              text("code"),
              id("modelId").naming("machine_model"),
              id("customerId").naming("customer"),
              text("serialNumber"),
              text("note"),
              time("createdAt")),
          List.of());

  static final Kind VISITS =
      new Kind(
          "visits",
          "visit",
          "openedAt",
          "opened_at,",
          "id in ({visits})",
          List.of(
              id("id"),
              id("unitId").naming("unit"),
              time("openedAt"),
              time("closedAt").orNull(),
              text("complaint"),
              text("workDone"),
              Member.of("sensorReplaced", MemberType.FLAG),
              text("sensorNote")),
          List.of(
              new Part(
                  "partsFitted",
                  "fitted_part",
                  "visit_id",
                  "position",
                  "position",
                  List.of(text("name"), whole("quantity").orNull()))));

  static final List<Kind> ALL =
      List.of(
          ShopKinds.PROFILE,
          ShopKinds.RULES,
          ShopKinds.LOGO,
          INSTRUMENTS,
          MEDIA,
          MODELS,
          CUSTOMERS,
          UNITS,
          VISITS,
          BenchKinds.PHOTOS,
          BenchKinds.CLOCK_CHECKS,
          BenchKinds.CAPTURES,
          BenchKinds.LEFT_OUT,
          BenchKinds.READINGS,
          BenchKinds.REPORTS);

  private Kinds() {}
}
