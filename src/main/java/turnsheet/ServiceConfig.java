package turnsheet;

import java.time.Clock;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
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
}
