package turnsheet.testing;

import java.lang.annotation.ElementType;
import java.lang.annotation.Retention;
import java.lang.annotation.RetentionPolicy;
import java.lang.annotation.Target;
import org.springframework.boot.test.context.SpringBootTest;
import org.springframework.boot.webmvc.test.autoconfigure.AutoConfigureMockMvc;
import org.springframework.context.annotation.Import;
import org.springframework.test.context.ContextConfiguration;

/**
 * A test against the whole service: pages and REST through MockMvc, a database in memory, a data
 * folder that goes away with the process, an owner and a technician ({@link TestPeople}). Classes
 * that carry nothing else share one started service and one database, so a test must not expect to
 * be alone in it.
 */
@Target(ElementType.TYPE)
@Retention(RetentionPolicy.RUNTIME)
@SpringBootTest
@AutoConfigureMockMvc
@Import(TestPeople.class)
@ContextConfiguration(initializers = TemporaryData.class)
public @interface ServiceTest {}
