package turnsheet.core.signal;

/** Carries a {@link Rejection} out of the depth of a reader; callers turn it back into a result. */
public final class RejectedException extends Exception {

  private final transient Rejection rejection;

  public RejectedException(Rejection rejection) {
    super(rejection.code() + ": " + rejection.message());
    this.rejection = rejection;
  }

  public RejectedException(String code, String message) {
    this(new Rejection(code, message));
  }

  public Rejection rejection() {
    return rejection;
  }
}
