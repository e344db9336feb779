/** The shell command: measures one file without the service. */
@NullMarked
package turnsheet.cli;

import org.jspecify.annotations.NullMarked;
