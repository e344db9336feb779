package turnsheet.core.measure;

import java.io.IOException;
import turnsheet.core.signal.EdgeReader;
import turnsheet.core.signal.RejectedException;

/** Opens the same edges again and again, from the start each time. */
@FunctionalInterface
public interface EdgeOpener {
  EdgeReader open() throws IOException, RejectedException;
}
