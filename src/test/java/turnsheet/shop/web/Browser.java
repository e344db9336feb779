package turnsheet.shop.web;

import static org.assertj.core.api.Assertions.assertThat;
import static org.springframework.security.test.web.servlet.request.SecurityMockMvcRequestPostProcessors.csrf;

import java.net.URI;
import org.springframework.test.web.servlet.assertj.MockMvcTester;
import org.springframework.test.web.servlet.assertj.MvcTestResult;

/** Opens pages and sends forms as a browser does, as far as these tests need it. */
final class Browser {

  private final MockMvcTester mvc;

  Browser(MockMvcTester mvc) {
    this.mvc = mvc;
  }

  MvcTestResult open(String address) {
    return mvc.get().uri(encoded(address)).exchange();
  }

  /** The page's text; it must be there. */
  String read(String address) throws Exception {
    MvcTestResult result = open(address);
    assertThat(result).hasStatusOk();
    return result.getResponse().getContentAsString();
  }

  /**
   * What is read on the page: its text without tags, so that a number cut in two is whole again.
   */
  String text(String address) throws Exception {
    return read(address).replaceAll("<[^>]*>", "");
  }

  /** Sends a form; fields are name, value, name, value. */
  MvcTestResult send(String address, String... fields) {
    var request = mvc.post().uri(encoded(address)).with(csrf());
    for (int i = 0; i < fields.length; i += 2) {
      request = request.formField(fields[i], fields[i + 1]);
    }
    return request.exchange();
  }

  /** Sends a form that must be accepted; returns where it leads. */
  String sendOn(String address, String... fields) {
    MvcTestResult result = send(address, fields);
    assertThat(result).hasStatus3xxRedirection();
    String next = result.getResponse().getRedirectedUrl();
    assertThat(next).isNotNull();
    return next == null ? "" : next;
  }

  /** Sends a form that must come back with the sentence, and with the words as typed. */
  void sendBack(String address, String sentence, String typed, String... fields) throws Exception {
    MvcTestResult result = send(address, fields);
    assertThat(result).hasStatusOk();
    assertThat(result.getResponse().getContentAsString()).contains(sentence).contains(typed);
  }

  private static URI encoded(String address) {
    return URI.create(address.replace(" ", "%20"));
  }
}
