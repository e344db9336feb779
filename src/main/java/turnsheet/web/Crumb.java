package turnsheet.web;

/**
 * One step of the way to a page, for {@code fragments/trail :: trail(crumbs)}.
 *
 * @param label text, not a message key
 * @param href from the root of the service
 */
public record Crumb(String label, String href) {}
