package turnsheet.access;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;
import turnsheet.access.ShopPreferences.Liked;
import turnsheet.access.ShopPreferences.Paper;
import turnsheet.access.ShopPreferences.SpeedLiking;
import turnsheet.testing.Database;
import turnsheet.testing.OnEachDatabase;

@OnEachDatabase
class ShopPreferencesTest {

  private final ShopPreferences preferences;
  private final ShopProfiles profiles;

  ShopPreferencesTest(Database database) {
    database.empty();
    preferences = new ShopPreferences(database.jdbc());
    profiles = new ShopProfiles(database.jdbc());
  }

  @Test
  void areUsualUntilSaidOtherwise() {
    assertThat(preferences.get()).isEqualTo(Liked.USUAL);
    profiles.put(new ShopProfiles.ShopProfile("A shop", ""));
    assertThat(preferences.get()).isEqualTo(Liked.USUAL);
  }

  @Test
  void areKeptBesideTheLetterhead() {
    profiles.put(new ShopProfiles.ShopProfile("A shop", ""));
    Liked liked = new Liked(SpeedLiking.IN_PER_S, 60, Paper.LETTER);
    preferences.put(liked);
    profiles.put(new ShopProfiles.ShopProfile("Renamed", ""));
    assertThat(preferences.get()).isEqualTo(liked);
  }

  @Test
  void thereAreTwoKindsOfMains() {
    assertThatThrownBy(() -> new Liked(SpeedLiking.CM_PER_S, 16, Paper.A4))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
