/**
 * What is found by reading the bytes of a capture again: one document for each channel, made by a
 * job, of as many sections as there are kinds of evidence.
 */
@NullMarked
package turnsheet.evidence;

import org.jspecify.annotations.NullMarked;
