package turnsheet.testing;

import java.lang.annotation.ElementType;
import java.lang.annotation.Inherited;
import java.lang.annotation.Retention;
import java.lang.annotation.RetentionPolicy;
import java.lang.annotation.Target;
import org.springframework.security.test.context.support.WithMockUser;

/** Runs a test (or all of a class) signed in as a technician; posts still need {@code csrf()}. */
@Target({ElementType.TYPE, ElementType.METHOD})
@Retention(RetentionPolicy.RUNTIME)
@Inherited
@WithMockUser(username = "technician", roles = "TECHNICIAN")
public @interface AsTechnician {}
