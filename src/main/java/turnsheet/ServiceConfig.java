package turnsheet;

import java.time.Clock;
import org.springframework.boot.jackson.autoconfigure.JsonMapperBuilderCustomizer;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import tools.jackson.databind.EnumNamingStrategies;
import turnsheet.core.format.CaptureFormats;
import turnsheet.core.measure.Measurement;

/** What the features share: the clock and the core. */
@Configuration(proxyBeanMethods = false)
class ServiceConfig {

  @Bean
  Clock clock() {
    return Clock.systemUTC();
  }

  @Bean
  CaptureFormats captureFormats() {
    return CaptureFormats.standard();
  }

  @Bean
  Measurement measurement(CaptureFormats formats) {
    return new Measurement(formats);
  }

  /** The REST API says enums as the result contract does: {@code tachometer}. */
  @Bean
  JsonMapperBuilderCustomizer contractNames() {
    return builder -> builder.enumNamingStrategy(EnumNamingStrategies.LOWER_CAMEL_CASE);
  }
}
