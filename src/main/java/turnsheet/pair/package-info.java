/** Two sensors of one shaft compared: ordered, worked out by a job, kept and shared as they are. */
@NullMarked
package turnsheet.pair;

import org.jspecify.annotations.NullMarked;
