package turnsheet.core.format.text;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.junit.jupiter.api.Test;
import turnsheet.core.format.api.Contents;
import turnsheet.core.format.api.ReadOptions;

/** Damaged files end in a reading or in a rejection, never in another exception. */
class TextFuzzTest {

  private static final int ROUNDS = 1500;
  private static final byte[] SPICE =
      "\0\n\r\t ,;\"#$%'-+.eE0159bxzrNn[]{}\u00b5\ufeff".getBytes(StandardCharsets.UTF_8);

  @Test
  void survivesRandomDamage() {
    Random random = new Random(20260115);
    List<byte[]> seeds = seeds();
    int refused = 0;
    for (int i = 0; i < ROUNDS; i++) {
      byte[] bytes = damaged(seeds.get(i % seeds.size()), random);
      // every exception but a rejection leaves this call and fails the test
      String outcome = ReadBack.everything(TextSources.of(bytes), options(random));
      refused += outcome.contains("Rejection[") ? 1 : 0;
    }
    // both ways out are met often, or the damage would test nothing
    assertThat(refused).isBetween(ROUNDS / 10, ROUNDS * 9 / 10);
  }

  private static byte[] damaged(byte[] seed, Random random) {
    byte[] bytes = seed.clone();
    int hits = 1 + random.nextInt(4);
    for (int h = 0; h < hits; h++) {
      int at = random.nextInt(bytes.length);
      switch (random.nextInt(4)) {
        case 0 -> bytes[at] = SPICE[random.nextInt(SPICE.length)];
        case 1 -> bytes = java.util.Arrays.copyOf(bytes, Math.max(1, at));
        case 2 -> {
          int from = random.nextInt(bytes.length);
          int count = Math.min(random.nextInt(40), bytes.length - Math.max(at, from));
          System.arraycopy(bytes.clone(), from, bytes, at, count);
        }
        default -> bytes[at] = (byte) random.nextInt(256);
      }
    }
    return bytes;
  }

  private static ReadOptions options(Random random) {
    Contents[] contents = Contents.values();
    return new ReadOptions(
        random.nextInt(4) == 0 ? 1 + random.nextInt(3) : null,
        random.nextInt(4) == 0 ? contents[random.nextInt(contents.length)] : null,
        random.nextInt(6) == 0 ? 1e-6 : null,
        random.nextInt(6) == 0 ? 1e-4 : null);
  }

  private static List<byte[]> seeds() {
    StringBuilder waveform = new StringBuilder("Model;X\nSample Interval;1 ms\ntime;u;v\ns;V;V\n");
    StringBuilder comma = new StringBuilder("# made\nt,v\n");
    StringBuilder edges = new StringBuilder("time_s,level\n0,0\n");
    StringBuilder periods = new StringBuilder("period_us\r\n");
    StringBuilder blanks = new StringBuilder("t [s]  u [V]\n");
    StringBuilder dump =
        new StringBuilder(
            "$timescale 1 us $end $scope module a $end $var wire 1 ! t $end\n$var wire 8 # b [7:0]"
                + " $end $var reg 1 $ u $end $upscope $end $enddefinitions $end\n$dumpvars 0! bx #"
                + " $end\n");
    for (int i = 0; i < 60; i++) {
      waveform.append(String.format(Locale.ROOT, "%d,%03d;%d,5;%d\n", i / 9, i, i % 4, i % 3));
      comma.append(String.format(Locale.ROOT, "%.4f,%e\n", i * 1e-4, Math.sin(i)));
      edges.append(
          String.format(Locale.ROOT, "%.4f,%d\n", 0.1 + i * 0.01 + i % 3 * 1e-3, 1 - i % 2));
      periods.append(600 + i * 7 % 50).append("\r\n");
      blanks.append(String.format(Locale.ROOT, "%10.4f %8.3f\n", i * 1e-2, i * 0.1));
      dump.append("#").append(i * 50).append("\n").append(i % 2).append("! b1010 # 1$\n");
    }
    List<byte[]> seeds = new ArrayList<>();
    for (StringBuilder text : List.of(waveform, comma, edges, periods, blanks, dump)) {
      seeds.add(text.toString().getBytes(StandardCharsets.UTF_8));
    }
    return seeds;
  }
}
