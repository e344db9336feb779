package turnsheet.testing;

import java.lang.reflect.InvocationHandler;
import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.Proxy;
import java.sql.Connection;
import java.util.concurrent.Callable;
import java.util.concurrent.atomic.AtomicInteger;
import javax.sql.DataSource;
import org.springframework.beans.factory.config.BeanPostProcessor;
import org.springframework.boot.test.context.TestConfiguration;
import org.springframework.context.annotation.Bean;

/**
 * Counts the SQL statements that are prepared on the calling thread; jobs and other requests do not
 * disturb it. To be imported by a test of the whole service.
 */
@TestConfiguration(proxyBeanMethods = false)
public class StatementCount {

  private static final ThreadLocal<AtomicInteger> COUNT =
      ThreadLocal.withInitial(AtomicInteger::new);

  /** How many statements a piece of work takes. */
  public static int of(Callable<?> work) throws Exception {
    int before = COUNT.get().get();
    work.call();
    return COUNT.get().get() - before;
  }

  @Bean
  static BeanPostProcessor countingDataSource() {
    return new BeanPostProcessor() {
      @Override
      public Object postProcessAfterInitialization(Object bean, String name) {
        return bean instanceof DataSource source ? counting(source) : bean;
      }
    };
  }

  private static DataSource counting(DataSource source) {
    return proxy(
        DataSource.class,
        (self, method, arguments) -> {
          Object result = answer(source, method, arguments);
          return result instanceof Connection connection ? counting(connection) : result;
        });
  }

  private static Connection counting(Connection connection) {
    return proxy(
        Connection.class,
        (self, method, arguments) -> {
          if (method.getName().startsWith("prepare")
              || method.getName().equals("createStatement")) {
            COUNT.get().incrementAndGet();
          }
          return answer(connection, method, arguments);
        });
  }

  private static Object answer(Object target, java.lang.reflect.Method method, Object[] arguments)
      throws Throwable {
    try {
      return method.invoke(target, arguments);
    } catch (InvocationTargetException e) {
      throw e.getCause() == null ? e : e.getCause();
    }
  }

  private static <T> T proxy(Class<T> type, InvocationHandler handler) {
    return type.cast(Proxy.newProxyInstance(type.getClassLoader(), new Class<?>[] {type}, handler));
  }
}
