package turnsheet.shop.web;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.springframework.validation.MapBindingResult;
import turnsheet.access.ShopPreferences.SpeedLiking;
import turnsheet.shop.SpeedSetting;
import turnsheet.shop.SpeedSettingId;
import turnsheet.shop.SpeedUnit;

class SettingFormTest {

  @Test
  void speedsAreEditedInTheUnitThatTheShopLikes() {
    assertThat(shown(9.525)).isEqualTo("3.75");
    assertThat(shown(4.7625)).isEqualTo("1.875");
    assertThat(shown(76.2)).isEqualTo("30");
    SettingForm cm = SettingForm.of(setting(9.525), SpeedLiking.CM_PER_S);
    assertThat(cm.nominalSpeed()).isEqualTo("9.525");
    assertThat(cm.speedUnit()).isEqualTo("CM_PER_S");
    SpeedSetting disc =
        new SpeedSetting(SpeedSettingId.next(), "45", SpeedUnit.REV_PER_MIN, 45, null, null);
    assertThat(SettingForm.of(disc, SpeedLiking.IN_PER_S).speedUnit()).isEqualTo("REV_PER_MIN");
  }

  @Test
  void aSpeedIsTheSameToTheLastBitHoweverOftenItIsSaved() {
    Random random = new Random(4);
    for (int i = 0; i < 2000; i++) {
      SpeedSetting old = setting(random.nextDouble() * 100 + 1e-3);
      SpeedSetting now = old;
      for (int save = 0; save < 3; save++) {
        SettingForm form = SettingForm.of(now, SpeedLiking.IN_PER_S);
        now = form.setting(now, none()).orElseThrow();
      }
      assertThat(now).isEqualTo(old);
    }
  }

  @Test
  void anotherSpeedInInchesIsKeptInCentimetres() {
    SettingForm form = new SettingForm("slow", "1.875", "IN_PER_S", "", "");
    SpeedSetting now = form.setting(setting(9.525), none()).orElseThrow();
    assertThat(now.unit()).isEqualTo(SpeedUnit.CM_PER_S);
    assertThat(now.nominalSpeed()).isEqualTo(4.7625);
    // the same digits in another unit are another speed
    SettingForm digits = new SettingForm("slow", "3.75", "CM_PER_S", "", "");
    assertThat(digits.setting(setting(9.525), none()).orElseThrow().nominalSpeed()).isEqualTo(3.75);
  }

  private static String shown(double cm) {
    return SettingForm.of(setting(cm), SpeedLiking.IN_PER_S).nominalSpeed();
  }

  private static SpeedSetting setting(double cm) {
    return new SpeedSetting(SpeedSettingId.next(), "slow", SpeedUnit.CM_PER_S, cm, null, null);
  }

  private static MapBindingResult none() {
    return new MapBindingResult(new java.util.HashMap<>(), "settingForm");
  }
}
