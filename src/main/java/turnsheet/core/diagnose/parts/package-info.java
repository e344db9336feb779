/**
 * The moving parts of a machine: how often each comes round at a speed setting, which of them can
 * stand behind a measured line, and what a line without a part would follow from.
 */
@NullMarked
package turnsheet.core.diagnose.parts;

import org.jspecify.annotations.NullMarked;
