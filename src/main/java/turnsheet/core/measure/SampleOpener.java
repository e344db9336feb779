package turnsheet.core.measure;

import java.io.IOException;
import turnsheet.core.signal.RejectedException;
import turnsheet.core.signal.SampleReader;

/** Opens the same samples again and again, from the start each time. */
@FunctionalInterface
public interface SampleOpener {
  SampleReader open() throws IOException, RejectedException;
}
