package turnsheet.capture.web;

import org.jspecify.annotations.Nullable;
import turnsheet.capture.Capture;
import turnsheet.capture.CaptureChoices;
import turnsheet.capture.Looked;
import turnsheet.capture.Proposal;
import turnsheet.capture.Wish;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.MeasureSettings;
import turnsheet.web.RefusedRequestException;

/** What the bench confirms or corrects; also the JSON of the REST resource. All optional. */
record WishForm(
    @Nullable CaptureKind kind,
    @Nullable Integer channel,
    @Nullable Contents contents,
    @Nullable Double timeUnitSeconds,
    @Nullable Double sampleStepSeconds,
    @Nullable Double nominalHz,
    @Nullable Double searchPercent,
    @Nullable Integer teeth) {

  static WishForm none() {
    return new WishForm(null, null, null, null, null, null, null, null);
  }

  /** What the form shows first: what was confirmed before, else what is proposed. */
  static WishForm prefilled(Capture capture, @Nullable Proposal proposal) {
    Looked looked = capture.looked();
    if (looked == null || proposal == null) {
      return none();
    }
    ReadOptions read = looked.options();
    int channel = looked.recognised().channel();
    CaptureChoices before = capture.choices();
    if (before != null) {
      MeasureSettings settings = before.settings();
      return new WishForm(
          settings.kind(),
          channel,
          read.contents(),
          read.timeUnitSeconds(),
          read.sampleStepSeconds(),
          settings.nominalHz(),
          settings.searchPercent(),
          settings.teeth());
    }
    return new WishForm(
        proposal.kind(),
        channel,
        read.contents(),
        read.timeUnitSeconds(),
        read.sampleStepSeconds(),
        null,
        Proposal.SEARCH_PERCENT,
        proposal.teeth());
  }

  Wish wish() {
    return new Wish(kind, nominalHz, searchPercent, teeth, options());
  }

  ReadOptions options() {
    try {
      return new ReadOptions(channel, contents, timeUnitSeconds, sampleStepSeconds);
    } catch (IllegalArgumentException e) {
      throw new RefusedRequestException(
          "options", "Channel, time unit and sample step must be above zero.");
    }
  }
}
