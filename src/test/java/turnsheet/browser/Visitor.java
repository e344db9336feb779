package turnsheet.browser;

import java.io.IOException;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.function.BooleanSupplier;
import java.util.logging.Level;
import org.openqa.selenium.By;
import org.openqa.selenium.WebElement;
import org.openqa.selenium.chrome.ChromeDriver;
import org.openqa.selenium.logging.LogEntry;
import org.openqa.selenium.logging.LogType;
import org.openqa.selenium.support.ui.ExpectedConditions;
import org.openqa.selenium.support.ui.Select;
import org.openqa.selenium.support.ui.WebDriverWait;

/** Someone at the browser: opens addresses, fills fields, presses buttons, waits for what comes. */
final class Visitor implements AutoCloseable {

  /** Bound, never a pause: a measurement on a loaded machine takes its time. */
  private static final Duration PATIENCE = Duration.ofMinutes(1);

  private final ChromeDriver chrome;

  Visitor(int width, int height) throws IOException, InterruptedException {
    chrome = Chromium.start(width, height);
  }

  void open(String address) {
    chrome.get(address);
  }

  String address() {
    return String.valueOf(chrome.getCurrentUrl());
  }

  String heading() {
    return find("h1").getText();
  }

  WebElement find(String css) {
    return chrome.findElement(By.cssSelector(css));
  }

  List<WebElement> all(String css) {
    return chrome.findElements(By.cssSelector(css));
  }

  /** What a key pressed now goes to. */
  WebElement focused() {
    return chrome.switchTo().activeElement();
  }

  void fill(String name, String text) {
    WebElement field = chrome.findElement(By.name(name));
    field.clear();
    field.sendKeys(text);
  }

  void choose(String name, String value) {
    new Select(chrome.findElement(By.name(name))).selectByValue(value);
  }

  /** Presses and waits until another document stands in place of this one. */
  void press(WebElement control) {
    WebElement before = find("html");
    control.click();
    awaitGone(before);
  }

  void pressButton(String text) {
    press(chrome.findElement(By.xpath("//main//button[normalize-space()='" + text + "']")));
  }

  WebElement awaitVisible(String css) {
    return waiting().until(ExpectedConditions.visibilityOfElementLocated(By.cssSelector(css)));
  }

  /** Waits until another document stands in place of the one whose root this is. */
  void awaitGone(WebElement root) {
    waiting().until(ExpectedConditions.stalenessOf(root));
  }

  void awaitTrue(BooleanSupplier fact) {
    waiting().until(any -> fact.getAsBoolean());
  }

  void awaitAddress(String pattern) {
    waiting().until(ExpectedConditions.urlMatches(pattern));
  }

  Object script(String script, Object... arguments) {
    return chrome.executeScript(script, arguments);
  }

  Object awaitScript(String script, Object... arguments) {
    chrome.manage().timeouts().scriptTimeout(PATIENCE);
    return chrome.executeAsyncScript(script, arguments);
  }

  Map<String, Object> protocol(String command, Map<String, Object> parameters) {
    return chrome.executeCdpCommand(command, parameters);
  }

  void forgetSession() {
    chrome.manage().deleteAllCookies();
  }

  /** A window of this size in CSS pixels, also below what a desktop window can shrink to. */
  void size(int width, int height) {
    protocol(
        "Emulation.setDeviceMetricsOverride",
        Map.of("width", width, "height", height, "deviceScaleFactor", 1, "mobile", false));
  }

  void anySize() {
    protocol("Emulation.clearDeviceMetricsOverride", Map.of());
  }

  /** What the console said since the last call that a page must not cause. */
  List<String> complaints() {
    var found = new ArrayList<String>();
    for (LogEntry entry : chrome.manage().logs().get(LogType.BROWSER)) {
      if (entry.getLevel().intValue() >= Level.SEVERE.intValue()) {
        found.add(entry.getMessage());
      }
    }
    return found;
  }

  @Override
  public void close() {
    chrome.quit();
  }

  private WebDriverWait waiting() {
    return new WebDriverWait(chrome, PATIENCE, Duration.ofMillis(50));
  }
}
