package turnsheet.job;

/** Leaves a handler because people have called the job off; it is not begun again. */
public final class JobCancelledException extends RuntimeException {

  JobCancelledException() {
    super("called off");
  }
}
