/** Steps of the schema that are written in Java, beside the scripts of the same numbers. */
@NullMarked
package db.migration;

import org.jspecify.annotations.NullMarked;
