/** Two sensors on one shaft at the same time: what is the machine's, and what is each sensor's. */
@org.jspecify.annotations.NullMarked
package turnsheet.core.diagnose.pair;
