package turnsheet.testing;

import java.lang.annotation.ElementType;
import java.lang.annotation.Retention;
import java.lang.annotation.RetentionPolicy;
import java.lang.annotation.Target;
import org.junit.jupiter.params.ParameterizedClass;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * Runs every test of a class once on H2 and once on a real PostgreSQL server. The class has one
 * constructor that takes a {@link Database}:
 *
 * <pre>{@code
 * @OnEachDatabase
 * class UnitsTest {
 *   private final Units units;
 *
 *   UnitsTest(Database database) {
 *     database.empty();
 *     units = new Units(database.jdbc(), database.transactions(), Clock.systemUTC());
 *   }
 * }
 * }</pre>
 *
 * The constructor runs before each test, so that each starts on empty tables. No Spring context is
 * needed; a repository that needs transactions takes {@link Database#transactions()}.
 */
@Target(ElementType.TYPE)
@Retention(RetentionPolicy.RUNTIME)
@ParameterizedClass
@EnumSource(Database.class)
public @interface OnEachDatabase {}
