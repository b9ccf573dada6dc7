package isowright.records;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class NearestTest {

  private static final List<String> HEADINGS =
      List.of("plant", "year", "tonnes", "labour_hours", "wage", "machine_hours", "machine_cost");

  @ParameterizedTest
  @CsvSource({
    "tones, tonnes",
    "TONNES, tonnes",
    "plnat, plant",
    "labor hours, labour_hours",
    "LabourHours, labour_hours",
    "machine-cost, machine_cost",
    "machine_costs, machine_cost",
    "Year, year",
    "wge, wage",
    "labour, labour_hours"
  })
  void findsTheWordThatWasMeant(String found, String meant) {
    assertThat(Nearest.word(found, HEADINGS)).contains(meant);
  }

  @ParameterizedTest
  @CsvSource({"energy", "x", "''", "'  '", "q7", "capital"})
  void saysNothingWhenNothingIsNear(String found) {
    assertThat(Nearest.word(found, HEADINGS)).isEmpty();
  }

  @Test
  void anExchangeOfNeighboursIsOneStep() {
    assertThat(Nearest.distance("plnat", "plant")).isEqualTo(1);
    assertThat(Nearest.distance("plant", "plant")).isZero();
    assertThat(Nearest.distance("", "plant")).isEqualTo(5);
    assertThat(Nearest.distance("kitten", "sitting")).isEqualTo(3); // two changed, one put in
  }

  @Test
  void theOrderOfTheAllowedWordsDoesNotMatter() {
    List<String> words = new ArrayList<>(List.of("cost_b", "cost_a", "cost_d", "cost_c"));
    Random random = new Random(5);
    for (int i = 0; i < 20; i++) {
      Collections.shuffle(words, random);
      assertThat(Nearest.word("cost_x", words)).contains("cost_a");
    }
  }

  @Test
  void distanceIsSymmetricAndBoundedByTheLongerWord() {
    Random random = new Random(11);
    for (int i = 0; i < 500; i++) {
      String a = word(random);
      String b = word(random);
      int distance = Nearest.distance(a, b);
      assertThat(distance).isEqualTo(Nearest.distance(b, a));
      assertThat(distance)
          .isBetween(Math.abs(a.length() - b.length()), Math.max(a.length(), b.length()));
      assertThat(distance == 0).isEqualTo(a.equals(b));
    }
  }

  @Test
  void aVeryLongWordCostsNothing() {
    assertThat(Nearest.word("a".repeat(1_000_000), HEADINGS)).isEmpty();
  }

  private static String word(Random random) {
    StringBuilder letters = new StringBuilder();
    for (int i = random.nextInt(8); i > 0; i--) {
      letters.append((char) ('a' + random.nextInt(3)));
    }
    return letters.toString();
  }
}
