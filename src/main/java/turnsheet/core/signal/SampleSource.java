package turnsheet.core.signal;

import java.io.IOException;

/** Samples that can be read as often as needed, from the start each time. */
@FunctionalInterface
public interface SampleSource {

  /** The samples; the caller closes them. */
  SampleReader open() throws IOException, RejectedException;
}
