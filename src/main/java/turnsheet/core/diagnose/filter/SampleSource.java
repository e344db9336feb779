package turnsheet.core.diagnose.filter;

import java.io.IOException;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;

/** Opens the same samples again and again, from the start each time; by several threads at once. */
@FunctionalInterface
public interface SampleSource {
  SampleReader open() throws IOException, RejectedException;
}
