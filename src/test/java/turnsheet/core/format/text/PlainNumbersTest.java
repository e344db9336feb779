package turnsheet.core.format.text;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.util.Random;
import org.junit.jupiter.api.Test;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;

/**
 * Lists of bare numbers are read by a shorter way where a line ends with a line feed alone. The
 * same list with carriage returns takes the way of all tables: both must tell the same.
 */
class PlainNumbersTest {

  private static final int ROUNDS = 3000;
  private static final String SPICE = "0123456789..,,  \t;\"#%/-+eE\u00b5x";

  @Test
  void bothWaysTellTheSame() {
    Random random = new Random(20261201);
    int refused = 0;
    for (int round = 0; round < ROUNDS; round++) {
      StringBuilder text = list(random);
      for (int hit = random.nextInt(4); hit > 0; hit--) {
        damage(text, random);
      }
      Contents contents = random.nextBoolean() ? Contents.EDGE_TIMES : null;
      ReadOptions options = new ReadOptions(null, contents, null, null);
      String plain = outcome(text.toString(), options);
      assertThat(plain).isEqualTo(outcome(text.toString().replace("\n", "\r\n"), options));
      refused += plain.contains("Rejection[") ? 1 : 0;
    }
    // both ways out are met often, or the comparison would show nothing
    assertThat(refused).isBetween(ROUNDS / 20, ROUNDS * 9 / 10);
  }

  @Test
  void aListLongerThanTheBufferIsTheSameToo() {
    StringBuilder text = new StringBuilder("time_s\n");
    for (int i = 0; i < 40_000; i++) {
      text.append(i / 1000)
          .append('.')
          .append(String.format(java.util.Locale.ROOT, "%03d", i % 1000))
          .append('\n');
    }
    ReadOptions options = new ReadOptions(null, Contents.EDGE_TIMES, null, null);
    String right = outcome(text.toString(), options);
    assertThat(right).isEqualTo(outcome(text.toString().replace("\n", "\r\n"), options));
    text.insert(text.length() - 8, "no");
    String wrong = outcome(text.toString(), options);
    assertThat(wrong).contains("Line 40000");
    assertThat(wrong).isEqualTo(outcome(text.toString().replace("\n", "\r\n"), options));
  }

  private static StringBuilder list(Random random) {
    StringBuilder text = new StringBuilder(random.nextBoolean() ? "time_s\n" : "");
    String form = "%." + random.nextInt(18) + "f\n";
    double time = 0;
    for (int i = 0; i < 40; i++) {
      time += 1 + 0.1 * random.nextDouble();
      String number = String.format(java.util.Locale.ROOT, form, time);
      text.append(number);
    }
    return random.nextInt(4) == 0 ? new StringBuilder(text.toString().replace('.', ',')) : text;
  }

  private static void damage(StringBuilder text, Random random) {
    int at = random.nextInt(text.length());
    if (text.charAt(at) == '\n') {
      text.insert(at, '\n');
    } else {
      text.setCharAt(at, SPICE.charAt(random.nextInt(SPICE.length())));
    }
  }

  private static String outcome(String text, ReadOptions options) {
    return ReadBack.everything(TextSources.of(text.getBytes(StandardCharsets.UTF_8)), options);
  }
}
