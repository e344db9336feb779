package turnsheet.jar;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.net.CookieManager;
import java.net.URI;
import java.net.URLEncoder;
import java.net.http.HttpClient;
import java.net.http.HttpRequest;
import java.net.http.HttpRequest.BodyPublisher;
import java.net.http.HttpRequest.BodyPublishers;
import java.net.http.HttpResponse;
import java.net.http.HttpResponse.BodyHandlers;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** A program that talks to a running service: sets it up as a person would, then uses REST. */
final class RestVisitor {

  private static final Pattern TOKEN = Pattern.compile("name=\"_csrf\"[^>]*value=\"([^\"]+)\"");
  private static final Pattern KEY = Pattern.compile("tsk_[A-Za-z0-9_-]+");

  private final HttpClient client =
      HttpClient.newBuilder()
          .cookieHandler(new CookieManager())
          .followRedirects(HttpClient.Redirect.NORMAL)
          .build();
  private final String base;
  private String key = "";

  private RestVisitor(String base) {
    this.base = base;
  }

  /** Sets the owner up at the one-time address and makes an API key. */
  static RestVisitor firstRun(String oneTimeAddress) throws IOException, InterruptedException {
    RestVisitor visitor = new RestVisitor(oneTimeAddress.replaceAll("/first-run/.*", ""));
    visitor.submit(
        oneTimeAddress,
        oneTimeAddress,
        Map.of(
            "name", "owner",
            "displayName", "The owner",
            "password", "a long invented phrase",
            "again", "a long invented phrase",
            "shopName", "Test bench",
            "shopAddress", ""));
    String shop =
        visitor.submit(
            visitor.base + "/shop", visitor.base + "/shop/keys", Map.of("label", "program"));
    Matcher made = KEY.matcher(shop);
    assertThat(made.find()).as("the new key is shown once").isTrue();
    visitor.key = made.group();
    return visitor;
  }

  /** The same key at the service after it was started again, perhaps on another port. */
  RestVisitor at(String newBase) {
    RestVisitor visitor = new RestVisitor(newBase.replaceAll("/+$", ""));
    visitor.key = key;
    return visitor;
  }

  JsonNode get(String path) throws IOException, InterruptedException {
    return send(request(path).GET(), 200);
  }

  JsonNode post(String path, String json, int status) throws IOException, InterruptedException {
    return send(
        request(path)
            .header("Content-Type", "application/json")
            .POST(BodyPublishers.ofString(json)),
        status);
  }

  JsonNode upload(String path, BodyPublisher body) throws IOException, InterruptedException {
    return send(request(path).header("Content-Type", "application/octet-stream").POST(body), 201);
  }

  private HttpRequest.Builder request(String path) {
    return HttpRequest.newBuilder(URI.create(base + path)).header("Authorization", "Bearer " + key);
  }

  private JsonNode send(HttpRequest.Builder request, int status)
      throws IOException, InterruptedException {
    HttpResponse<String> answer = client.send(request.build(), BodyHandlers.ofString());
    assertThat(answer.statusCode()).as(answer.body()).isEqualTo(status);
    return JsonMapper.shared().readTree(answer.body());
  }

  /** Fills in the form of a page, with its token against forged requests. */
  private String submit(String page, String target, Map<String, String> fields)
      throws IOException, InterruptedException {
    HttpResponse<String> form =
        client.send(HttpRequest.newBuilder(URI.create(page)).build(), BodyHandlers.ofString());
    Matcher token = TOKEN.matcher(form.body());
    assertThat(token.find()).as("form at " + page + ": " + form.statusCode()).isTrue();
    String body =
        "_csrf="
            + encoded(token.group(1))
            + fields.entrySet().stream()
                .map(e -> "&" + e.getKey() + "=" + encoded(e.getValue()))
                .collect(Collectors.joining());
    return client
        .send(
            HttpRequest.newBuilder(URI.create(target))
                .header("Content-Type", "application/x-www-form-urlencoded")
                .POST(BodyPublishers.ofString(body))
                .build(),
            BodyHandlers.ofString())
        .body();
  }

  private static String encoded(String text) {
    return URLEncoder.encode(text, StandardCharsets.UTF_8);
  }
}
