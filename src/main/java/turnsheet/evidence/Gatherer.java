package turnsheet.evidence;

import java.io.IOException;
import turnsheet.core.measure.CaptureKind;
import turnsheet.core.measure.Progress;
import turnsheet.core.signal.RejectedException;

/**
 * Finds one kind of evidence. A Spring bean; {@code @Order} decides where its section stands.
 *
 * <p>The same material gives the same evidence: nothing else is asked. Values that change raise
 * {@link EvidenceDocument#VERSION}.
 */
public interface Gatherer {

  /** A stable word in lower camel case, the name of the section. */
  String name();

  /** Whether a capture of that kind can hold it. */
  boolean appliesTo(CaptureKind kind);

  /**
   * Looks.
   *
   * @param progress told from 0 to 1; may throw to stop the work
   * @return a record that can be written as JSON and read back
   * @throws RejectedException where the capture does not hold it, with a sentence for the bench
   */
  Object gather(Material material, Progress progress) throws IOException, RejectedException;
}
