package turnsheet.reading.web;

import java.util.Locale;
import org.jspecify.annotations.Nullable;
import turnsheet.core.diagnose.Verdict;
import turnsheet.core.measure.Figure;
import turnsheet.core.measure.FigureName;
import turnsheet.reading.Judged;
import turnsheet.web.Numbers;
import turnsheet.web.Shown;
import turnsheet.web.Wording;

/**
 * One line of a table of figures, ready to be shown.
 *
 * @param limit the bound in the unit of the figure; empty where there is none
 * @param origin where the bound comes from; empty with it
 * @param verdict {@code within}, {@code outside} or {@code undecided}; null where there is no limit
 *     or no value
 * @param probability that the figure conforms; empty where there is no verdict or no uncertainty
 * @param undecidedWhy reason of an undecided verdict; null for others
 */
record FigureRow(
    String name,
    Shown shown,
    String limit,
    String origin,
    @Nullable String verdict,
    String probability,
    @Nullable String undecidedWhy) {

  static FigureRow plain(Wording words, String key, Figure figure, String unit, Numbers.Sign sign) {
    return new FigureRow(
        words.text(key), words.numbers().show(figure, unit, sign), "", "", null, "", null);
  }

  /** A figure that may have a limit. */
  static FigureRow of(Wording words, FigureName name, Figure figure, @Nullable Judged judged) {
    Shown shown = words.show(name, figure);
    return judged == null
        ? new FigureRow(words.nameOf(name), shown, "", "", null, "", null)
        : new FigureRow(
            words.nameOf(name),
            shown,
            words.bound(name, judged.limit().upperBound()),
            judged.limit().origin(),
            word(judged.judgement().verdict()),
            words.probability(judged.judgement()),
            words.undecided(judged.judgement()));
  }

  static String word(Verdict verdict) {
    return verdict.name().toLowerCase(Locale.ROOT);
  }
}
