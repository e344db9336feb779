package turnsheet.job;

/** Leaves a handler because the service is going down; the job is begun again at its next start. */
public final class JobStoppedException extends RuntimeException {

  JobStoppedException() {
    super("stopped, to be begun again");
  }
}
