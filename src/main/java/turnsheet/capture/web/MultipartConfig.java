package turnsheet.capture.web;

import jakarta.servlet.MultipartConfigElement;
import org.springframework.context.annotation.Bean;
import org.springframework.context.annotation.Configuration;
import turnsheet.capture.IncomingFolder;

/**
 * Form uploads are written beside the store, on its disk, not where the system keeps small
 * temporary files; the server takes a relative place for one below its own folder, so it is given
 * the whole path.
 */
@Configuration(proxyBeanMethods = false)
class MultipartConfig {

  private static final int IN_MEMORY_BYTES = 64 * 1024;

  @Bean
  MultipartConfigElement multipartConfigElement(IncomingFolder incoming) {
    return new MultipartConfigElement(incoming.path().toString(), -1, -1, IN_MEMORY_BYTES);
  }
}
