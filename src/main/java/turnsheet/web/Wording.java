package turnsheet.web;

import java.util.Locale;
import org.springframework.context.MessageSource;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;

/** Texts and numbers in the language of one request. */
public final class Wording {

  private final MessageSource messages;
  private final Locale locale;
  private final Numbers numbers;

  public Wording(MessageSource messages, Locale locale) {
    this.messages = messages;
    this.locale = locale;
    this.numbers = Numbers.in(locale);
  }

  /** The text of a key; parts are texts already. */
  public String text(String key, String... parts) {
    return messages.getMessage(key, parts, locale);
  }

  public Numbers numbers() {
    return numbers;
  }

  public String nameOf(FigureName figure) {
    return text("figure." + figure.path());
  }

  public Shown show(FigureName name, Figure figure) {
    return numbers.show(figure, name.unit(), signOf(name));
  }

  /** The name of a flutter figure as it stands within a sentence. */
  public String inText(FigureName flutter) {
    return text("reading.inText." + flutter.path());
  }

  /** Bounds hold for the size of a figure: of one that can be negative, on both sides. */
  public String bound(FigureName name, double upperBound) {
    String bound = numbers.plain(upperBound);
    return signOf(name) == Numbers.Sign.SHOWN ? "±\u202f" + bound : bound;
  }

  /** A bound with its unit. */
  public String limit(FigureName name, double upperBound) {
    return bound(name, upperBound) + "\u202f" + name.unit();
  }

  public static Numbers.Sign signOf(FigureName name) {
    return name == FigureName.DEVIATION || name == FigureName.DRIFT
        ? Numbers.Sign.SHOWN
        : Numbers.Sign.PLAIN;
  }
}
