package turnsheet.web;

/** Someone signed in, as far as the layout needs to know. */
public interface Visitor {

  String displayName();
}
