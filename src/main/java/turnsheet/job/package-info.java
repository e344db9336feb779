/**
 * The job table: enqueue with the transaction, run, show progress, run again after a dead process.
 */
@NullMarked
package turnsheet.job;

import org.jspecify.annotations.NullMarked;
