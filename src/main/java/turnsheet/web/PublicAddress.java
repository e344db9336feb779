package turnsheet.web;

import org.springframework.beans.factory.annotation.Value;
import org.springframework.stereotype.Component;

/** Where the service is reached from elsewhere, for links that leave it. */
@Component
public class PublicAddress {

  private final String base;

  public PublicAddress(@Value("${turnsheet.public-address}") String base) {
    this.base = base.replaceAll("/+$", "");
  }

  /**
   * The whole address of a page.
   *
   * @param path with a slash before it
   */
  public String of(String path) {
    return base + path;
  }
}
