/** Lines that move while a capture runs, and the speed made audible. */
@org.jspecify.annotations.NullMarked
package turnsheet.core.diagnose.motion;
