package turnsheet.evidence.web;

import turnsheet.core.measure.Reading;
import turnsheet.evidence.Section;
import turnsheet.web.Wording;

/**
 * Shows one kind of evidence. A Spring bean beside the {@link turnsheet.evidence.Gatherer} of the
 * same name.
 *
 * <p>Its template has a fragment {@code section(it)}, which takes what {@link #page} gives and
 * writes what stands under the section's heading, first the sentence that answers, then the
 * evidence; charts go through {@code evidence/_parts :: picture}.
 */
public interface SectionView {

  /** Of the gatherer. */
  String name();

  /** Name of the template without its ending, such as {@code evidence/_mains}. */
  String template();

  /** Heading of the section. */
  String title(Wording words);

  /** What it answers, in a sentence. */
  String what(Wording words);

  /**
   * The section's own page record, texts already formatted.
   *
   * @param section one that found something
   */
  Object page(Section section, Beside beside, Wording words);

  /**
   * What the section is shown beside.
   *
   * @param captureId as text, for addresses
   * @param reading the newest of the channel
   * @param synchronous whether the visitor says that the motor is a synchronous one
   */
  record Beside(String captureId, Reading reading, boolean synchronous) {}
}
