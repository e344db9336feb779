package turnsheet.shop.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Locale;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.springframework.context.i18n.LocaleContextHolder;

class TypedTest {

  @AfterEach
  void forgetTheLanguage() {
    LocaleContextHolder.resetLocaleContext();
  }

  @Test
  void aCellHasTheDecimalSignOfThePageAndIsCutThere() {
    LocaleContextHolder.setLocale(Locale.GERMANY);
    assertThat(Typed.cell(-1.25).whole()).isEqualTo("\u22121");
    assertThat(Typed.cell(-1.25).fraction()).isEqualTo(",25");

    LocaleContextHolder.setLocale(Locale.UK);
    assertThat(Typed.cell(0.05).value()).isEqualTo("0.05");
  }

  @Test
  void aFieldKeepsThePointThatIsTakenBackFromIt() {
    LocaleContextHolder.setLocale(Locale.GERMANY);
    assertThat(Typed.number(4.7625)).isEqualTo("4.7625");
  }
}
