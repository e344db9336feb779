package turnsheet.core.signal;

/**
 * Why a capture cannot be used.
 *
 * @param code stable word in lower camel case, for programs
 * @param message one sentence for the bench: what is wrong, where in the file, what to do
 */
public record Rejection(String code, String message) {}
