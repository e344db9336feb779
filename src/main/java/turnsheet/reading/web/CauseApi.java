package turnsheet.reading.web;

import java.util.List;
import java.util.Locale;
import java.util.OptionalInt;
import java.util.UUID;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import org.springframework.web.bind.annotation.GetMapping;
import org.springframework.web.bind.annotation.PathVariable;
import org.springframework.web.bind.annotation.RestController;
import turnsheet.core.diagnose.parts.ExpectedRate;
import turnsheet.core.diagnose.parts.Explanation;
import turnsheet.core.diagnose.parts.LineFinding;
import turnsheet.core.diagnose.parts.RankedSuspect;
import turnsheet.reading.ReadingId;
import turnsheet.web.NotFoundException;
import turnsheet.web.Wording;

/** Who can stand behind the lines of a reading, for programs. */
@RestController
class CauseApi {

  private final CauseView causes;
  private final MessageSource messages;

  CauseApi(CauseView causes, MessageSource messages) {
    this.causes = causes;
    this.messages = messages;
  }

  /** Worked out from the model as it is now. */
  @GetMapping("/api/v1/readings/{id}/suspects")
  LinesDocument suspects(@PathVariable UUID id, Locale locale) {
    CauseWords words = new CauseWords(new Wording(messages, locale));
    return causes
        .found(new ReadingId(id))
        .map(
            found ->
                new LinesDocument(
                    id,
                    found.model().id().value(),
                    found.findings().stream().map(f -> line(f, words)).toList()))
        .orElseThrow(() -> new NotFoundException("reading"));
  }

  /** All lines of a reading. */
  record LinesDocument(UUID readingId, UUID modelId, List<LineDocument> lines) {}

  /**
   * One line.
   *
   * @param resolutionHz how near two rates may come and still be told apart
   * @param unknownProbability that no part of the model is the cause
   * @param notToldFrom other parts that cannot be told from the first suspect
   * @param lock shaft, mains, undecided or neither
   * @param explanation null where there is a suspect
   * @param advice usual causes and the next check, common practice
   */
  record LineDocument(
      double rateHz,
      double resolutionHz,
      List<SuspectDocument> suspects,
      double unknownProbability,
      List<String> notToldFrom,
      String lock,
      @Nullable ExplanationDocument explanation,
      String advice) {}

  /** One suspect; {@code lowHz} and {@code highHz} are equal where the rate has no range. */
  record SuspectDocument(
      String part,
      String kind,
      String cause,
      int harmonic,
      int sideband,
      double lowHz,
      double highHz,
      double mismatchHz,
      double toleranceHz,
      double probability) {}

  /** What a part would have to be like; uncertainties at k = 2. */
  record ExplanationDocument(
      @Nullable Double diameterMm,
      @Nullable Double diameterUncertaintyMm,
      @Nullable String reference,
      @Nullable Double ratio,
      @Nullable Double ratioUncertainty,
      @Nullable Integer wholeNumber) {}

  private static LineDocument line(LineFinding finding, CauseWords words) {
    return new LineDocument(
        finding.rateHz(),
        finding.resolutionHz(),
        finding.suspects().stream().map(CauseApi::suspect).toList(),
        finding.unknownProbability(),
        finding.rivals(),
        finding.lock().name().toLowerCase(Locale.ROOT),
        explanation(finding.explanation()),
        words.line(finding).advice());
  }

  private static SuspectDocument suspect(RankedSuspect ranked) {
    ExpectedRate expected = ranked.expected();
    return new SuspectDocument(
        ranked.part(),
        expected.part().kind().name().toLowerCase(Locale.ROOT),
        expected.cause().word(),
        expected.harmonic(),
        expected.sideband(),
        expected.rate().lowHertz(),
        expected.rate().highHertz(),
        ranked.mismatchHz(),
        ranked.toleranceHz(),
        ranked.probability());
  }

  private static @Nullable ExplanationDocument explanation(@Nullable Explanation e) {
    if (e == null) {
      return null;
    }
    OptionalInt whole = e.wholeNumber();
    return new ExplanationDocument(
        e.diameterMm(),
        e.diameterUncertaintyMm(),
        e.reference(),
        e.ratio(),
        e.ratioUncertainty(),
        whole.isPresent() ? whole.getAsInt() : null);
  }
}
