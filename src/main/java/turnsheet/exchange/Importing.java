package turnsheet.exchange;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.dao.DataAccessException;
import org.springframework.dao.DataIntegrityViolationException;
import turnsheet.exchange.Import.ShopSettings;
import turnsheet.exchange.ImportResult.Left;
import turnsheet.exchange.ImportResult.Reason;
import turnsheet.exchange.RefusedFileException.Place;

/** One import on its way: takes entry after entry and keeps the count. */
final class Importing implements ExportReader.Taker {

  private final Books books;
  private final Places places;
  private final Checks checks;
  private final Pictures pictures;
  private final ShopSettings settings;
  private final Map<String, Count> counts = new LinkedHashMap<>();

  /** Rows known to be here, and rows of the file that are not: both as table and key. */
  private final Set<Row> here = new HashSet<>();

  private final Set<Row> left = new HashSet<>();

  private int tookOver;

  Importing(Books books, Places places, Checks checks, Pictures pictures, ShopSettings settings) {
    this.books = books;
    this.places = places;
    this.checks = checks;
    this.pictures = pictures;
    this.settings = settings;
    Kinds.ALL.forEach(kind -> counts.put(kind.name(), new Count()));
  }

  private record Row(String table, Object key) {}

  private static final class Count {
    int added;
    int same;
    final List<Left> different = new ArrayList<>();
    final List<Left> heldBack = new ArrayList<>();
  }

  ImportResult result() {
    return new ImportResult(
        counts.entrySet().stream()
            .map(
                e ->
                    new ImportResult.OfKind(
                        e.getKey(),
                        e.getValue().added,
                        e.getValue().same,
                        e.getValue().different,
                        e.getValue().heldBack))
            .toList());
  }

  /** How many settings of the shop were replaced. */
  int tookOver() {
    return tookOver;
  }

  @Override
  public void take(Entry entry, Place place) {
    Count count = count(entry);
    List<Entry> standing = books.read(entry.kind(), List.of(entry.key()));
    if (!standing.isEmpty()) {
      noteHere(entry);
      List<String> differences = entry.differences(standing.get(0));
      if (differences.isEmpty()) {
        count.same++;
        holding(entry, place, () -> pictures.restore(entry));
      } else if (settings == ShopSettings.TAKE_OVER && ShopKinds.has(entry.kind())) {
        holding(
            entry,
            place,
            () -> {
              books.update(entry);
              checks.afterwards(entry);
            });
        count.added++;
        tookOver++;
      } else {
        leaveOut(entry, place, Reason.OTHER_CONTENT, differences);
      }
      return;
    }
    List<String> missing = missing(entry, place);
    List<String> taken = missing.isEmpty() ? places.taken(entry) : List.of();
    if (!missing.isEmpty()) {
      leaveOut(entry, place, Reason.NEEDS_OTHER, missing);
    } else if (!taken.isEmpty()) {
      leaveOut(entry, place, Reason.TAKEN_PLACE, taken);
    } else if (places.secondOpenVisit(entry)) {
      leaveOut(entry, place, Reason.OPEN_VISIT, List.of("closedAt"));
    } else if (revisedOtherwise(entry)) {
      leaveOut(entry, place, Reason.TAKEN_PLACE, List.of("revises"));
    } else {
      add(entry, place);
      count.added++;
    }
  }

  private void add(Entry entry, Place place) {
    holding(
        entry,
        place,
        () -> {
          pictures.keep(entry);
          books.insert(entry, checks.extras(entry));
          checks.afterwards(entry);
        });
    noteHere(entry);
    entry.settings().forEach(setting -> here.add(new Row(Kinds.SETTING_TABLE, setting)));
  }

  /** Says of what goes wrong at which entry it did. */
  private static void holding(Entry entry, Place place, Runnable step) {
    try {
      step.run();
    } catch (DataIntegrityViolationException e) {
      throw refused(entry, place, "a value is longer or larger than it can be, or stands twice");
    } catch (DataAccessException | RefusedFileException e) {
      throw e;
    } catch (RuntimeException e) {
      throw refused(entry, place, String.valueOf(e.getMessage()));
    }
  }

  /** Members that name something of the file that was left out. */
  private List<String> missing(Entry entry, Place place) {
    List<String> missing = new ArrayList<>();
    for (Member member : entry.kind().members()) {
      Object key = entry.value(member.name());
      String table = member.refersTo();
      if (table == null || key == null || isHere(new Row(table, key))) {
        continue;
      }
      if (!left.contains(new Row(table, key))) {
        throw refused(
            entry,
            place,
            "'" + member.name() + "' names something that is neither here nor in the file");
      }
      missing.add(member.name());
    }
    Long revised = revised(entry, place);
    if (revised != null && left.contains(new Row(BenchKinds.REPORTS.table(), revised))) {
      missing.add("revises");
    } else if (revised != null && !places.hasReport(revised)) {
      throw refused(entry, place, "it revises a report that is neither here nor in the file");
    }
    return missing;
  }

  private boolean isHere(Row row) {
    if (here.contains(row)) {
      return true;
    }
    boolean found = books.has(row.table(), (UUID) row.key());
    if (found) {
      here.add(row);
    }
    return found;
  }

  private boolean revisedOtherwise(Entry entry) {
    Long revised = entry.is(BenchKinds.REPORTS) ? Checks.revises(entry) : null;
    return revised != null && places.reportRevised(revised);
  }

  private static @Nullable Long revised(Entry entry, Place place) {
    if (!entry.is(BenchKinds.REPORTS)) {
      return null;
    }
    try {
      return Checks.revises(entry);
    } catch (RuntimeException e) {
      throw refused(entry, place, "its content is not that of a report");
    }
  }

  private void leaveOut(Entry entry, Place place, Reason reason, List<String> members) {
    Left one = new Left(entry.key().toString(), entry.label(), place.line(), reason, members);
    if (reason == Reason.NEEDS_OTHER) {
      count(entry).heldBack.add(one);
    } else {
      count(entry).different.add(one);
    }
    left.add(new Row(entry.kind().table(), entry.key()));
    entry.settings().forEach(setting -> left.add(new Row(Kinds.SETTING_TABLE, setting)));
  }

  private void noteHere(Entry entry) {
    if (entry.kind().key().type() == MemberType.ID) {
      here.add(new Row(entry.kind().table(), entry.key()));
    }
  }

  private Count count(Entry entry) {
    return java.util.Objects.requireNonNull(counts.get(entry.kind().name()));
  }

  private static RefusedFileException refused(Entry entry, Place place, String why) {
    return RefusedFileException.at(
        place, "this entry of " + entry.kind().name() + " is wrong: " + why + ".");
  }
}
