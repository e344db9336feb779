package turnsheet.web;

import java.util.Locale;
import org.jspecify.annotations.Nullable;
import org.springframework.context.MessageSource;
import turnsheet.core.diagnose.DecisionRule;
import turnsheet.core.diagnose.Judgement;
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

  /** The language. */
  public Locale locale() {
    return locale;
  }

  /** The text of a key; parts are texts already. */
  public String text(String key, String... parts) {
    return messages.getMessage(key, parts, locale);
  }

  /** What the core says in English, or a condition, in this language. */
  public String said(String english) {
    return CoreWords.in(locale, english);
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

  /** The decision rule in one sentence, to stand beside every verdict. */
  public String rule(DecisionRule rule) {
    return text("web.rule." + rule.name().toLowerCase(Locale.ROOT));
  }

  /** Why a figure is undecided; null where it is decided. */
  public @Nullable String undecided(Judgement judgement) {
    Judgement.Why why = judgement.why();
    if (why == null) {
      return null;
    }
    return switch (why) {
      case NO_UNCERTAINTY -> {
        String reason = judgement.detail();
        yield reason == null ? null : said(reason);
      }
      case LIMIT_IN_INTERVAL -> text("web.undecided.interval");
      case NOT_RESOLVED -> text("web.undecided.resolution");
    };
  }

  /** The probability of conformity, whole percents, never 0 or 100; empty where there is none. */
  public String probability(Judgement judgement) {
    Double probability = judgement.conformanceProbability();
    if (probability == null) {
      return "";
    }
    if (probability < 0.01) {
      return text("web.probability.below", "1");
    }
    if (probability > 0.99) {
      return text("web.probability.above", "99");
    }
    return text("web.probability", numbers.fixed(100 * probability, 0));
  }

  public static Numbers.Sign signOf(FigureName name) {
    return name == FigureName.DEVIATION || name == FigureName.DRIFT
        ? Numbers.Sign.SHOWN
        : Numbers.Sign.PLAIN;
  }
}
