package turnsheet.core.signal;

/**
 * Something about a capture that its figures cannot show.
 *
 * @param code stable word in lower camel case, for programs
 * @param message one sentence for the bench: what, where, and what follows from it
 */
public record Warning(String code, String message) {}
