package turnsheet.job;

import java.util.UUID;

/**
 * Does the jobs of one name. A Spring bean.
 *
 * <p>A run may be repeated from the start at any time, after a failure or a killed process, even
 * when the earlier run came to its end: the second must do no harm.
 */
public interface JobHandler {

  /** The name under which its jobs are enqueued. */
  String name();

  /**
   * Does one job, outside of any transaction so that progress can be seen.
   *
   * @throws Exception for the unexpected only: the job is tried again, later given up. An outcome
   *     that the bench must know, such as an unusable file, is no exception
   */
  void run(JobRun run) throws Exception;

  /**
   * Told in the transaction that gives a job up.
   *
   * @param sentence for the bench, with a reference id that the log carries as well
   */
  default void gaveUp(UUID subject, String sentence) {}
}
