package turnsheet.job;

/** Where a job stands. */
public enum JobState {
  /** waits for a worker, for the first time or after a failure */
  QUEUED,
  /** a worker is at it */
  RUNNING,
  /** came to its end */
  DONE,
  /** was given up */
  FAILED,
  /** was called off by people */
  CANCELLED;

  /** Whether nothing will happen to the job any more. */
  public boolean isOver() {
    return this == DONE || this == FAILED || this == CANCELLED;
  }
}
