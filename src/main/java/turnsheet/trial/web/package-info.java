/** The pages of trials, and trials by REST. */
@NullMarked
package turnsheet.trial.web;

import org.jspecify.annotations.NullMarked;
