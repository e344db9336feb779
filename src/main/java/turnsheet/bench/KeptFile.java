package turnsheet.bench;

import turnsheet.capture.StoredBytes;

/**
 * A recording that lies in the store.
 *
 * @param name as the bench calls it, without folders
 */
public record KeptFile(String name, StoredBytes bytes) {}
