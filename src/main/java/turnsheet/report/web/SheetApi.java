package turnsheet.report.web;

import java.time.Instant;
import java.util.List;
import java.util.Locale;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.core.measure.Figure;
import turnsheet.reading.Judged;
import turnsheet.reading.VisitReading;
import turnsheet.report.Comparison;
import turnsheet.report.Sheet;
import turnsheet.report.SheetPair;
import turnsheet.report.SheetSingle;
import turnsheet.report.Sheets;
import turnsheet.shop.VisitId;
import turnsheet.web.NotFoundException;

/** The sheet for programs: which readings were paired and what their differences show. */
@RestController
class SheetApi {

  private final Sheets sheets;

  SheetApi(Sheets sheets) {
    this.sheets = sheets;
  }

  @GetMapping("/api/v1/visits/{id}/sheet")
  SheetDocument sheet(@PathVariable UUID id) {
    return SheetDocument.of(
        sheets.of(new VisitId(id)).orElseThrow(() -> new NotFoundException("visit")));
  }

  /** A sheet. */
  record SheetDocument(
      UUID visitId,
      Instant madeAt,
      String modelName,
      String serialNumber,
      List<PairDocument> pairs,
      List<SingleDocument> singles) {

    static SheetDocument of(Sheet sheet) {
      return new SheetDocument(
          sheet.visit().visit().id().value(),
          sheet.madeAt(),
          sheet.visit().modelName(),
          sheet.visit().serialNumber(),
          sheet.pairs().stream().map(PairDocument::of).toList(),
          sheet.singles().stream().map(SingleDocument::of).toList());
    }
  }

  /** Two readings of one speed setting. */
  record PairDocument(
      String speedSetting,
      UUID beforeReadingId,
      UUID afterReadingId,
      List<String> cautions,
      List<FigureDocument> figures) {

    static PairDocument of(SheetPair pair) {
      return new PairDocument(
          pair.setting().label(),
          id(pair.before()),
          id(pair.after()),
          pair.cautions().stream().map(c -> c.name().toLowerCase(Locale.ROOT)).toList(),
          pair.figures().stream().map(FigureDocument::of).toList());
    }
  }

  /** One figure on both sides, in the unit that its name ends with. */
  record FigureDocument(
      String figure,
      Figure before,
      Figure after,
      Figure difference,
      String change,
      @Nullable Double limit,
      @Nullable String verdictBefore,
      @Nullable String verdictAfter) {

    static FigureDocument of(Comparison c) {
      Judged judged = c.judgedAfter() != null ? c.judgedAfter() : c.judgedBefore();
      return new FigureDocument(
          c.name().path(),
          c.before(),
          c.after(),
          c.difference().difference(),
          switch (c.difference().change()) {
            case IMPROVED -> "improved";
            case WORSE -> "worse";
            case TOO_SMALL_TO_MATTER -> "tooSmallToMatter";
            case NO_CHANGE_SHOWN -> "noChangeShown";
          },
          judged == null ? null : judged.limit().upperBound(),
          verdict(c.judgedBefore()),
          verdict(c.judgedAfter()));
    }
  }

  /** A reading without a partner. */
  record SingleDocument(String speedSetting, String condition, UUID readingId) {

    static SingleDocument of(SheetSingle single) {
      return new SingleDocument(
          single.setting().label(), single.reading().condition(), id(single.reading()));
    }
  }

  private static UUID id(VisitReading reading) {
    return reading.stored().id().value();
  }

  private static @Nullable String verdict(@Nullable Judged judged) {
    return judged == null ? null : judged.judgement().verdict().name().toLowerCase(Locale.ROOT);
  }
}
