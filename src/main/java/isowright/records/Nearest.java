package isowright.records;

import java.util.Collection;
import java.util.Comparator;
import java.util.Locale;
import java.util.Optional;

/**
 * Which of the allowed words was probably meant?
 *
 * <p>Two words are compared without regard to case and to the separators space, {@code _}, {@code
 * -} and {@code .}. Their distance is the least number of letters put in, left out, changed or
 * exchanged with a neighbour that turns one into the other, no stretch being edited twice (Damerau
 * 1964, <i>Communications of the ACM</i> 7, 171–176, with Levenshtein 1966). A word is near when
 * the distance is at most a third of the longer word, or when one of at least four letters stands
 * at the beginning or end of the other and makes up two fifths of it ({@code hours} for {@code
 * labour_hours}). Nothing is suggested when nothing is near.
 *
 * <p>Ties go to the smaller difference in length, then to the first in the order of the alphabet,
 * so that the answer never depends on the order in which the allowed words come.
 */
public final class Nearest {

  /** A fragment shorter than this stands in too many words to say which was meant. */
  private static final int SHORTEST_FRAGMENT = 4;

  private Nearest() {}

  /**
   * The allowed word nearest to the one found.
   *
   * @param found what was written
   * @param allowed what could have been written
   * @return the nearest, absent when none is near
   */
  public static Optional<String> word(String found, Collection<String> allowed) {
    String plain = plain(found);
    if (plain.isEmpty()) {
      return Optional.empty();
    }
    return allowed.stream()
        .map(word -> candidate(plain, word))
        .flatMap(Optional::stream)
        .min(
            Comparator.comparingInt(Candidate::rank)
                .thenComparingInt(Candidate::lengthDifference)
                .thenComparing(Candidate::word))
        .map(Candidate::word);
  }

  private record Candidate(String word, int rank, int lengthDifference) {}

  private static Optional<Candidate> candidate(String plain, String word) {
    String other = plain(word);
    int longer = Math.max(plain.length(), other.length());
    int shorter = Math.min(plain.length(), other.length());
    if (shorter == 0) {
      return Optional.empty();
    }
    int reach = longer / 3;
    int distance = longer - shorter > reach ? Integer.MAX_VALUE : distance(plain, other);
    if (distance <= reach) {
      return Optional.of(new Candidate(word, distance, longer - shorter));
    }
    if (shorter >= SHORTEST_FRAGMENT && 5 * shorter >= 2 * longer && contains(plain, other)) {
      // After every word that is near letter by letter.
      return Optional.of(new Candidate(word, Integer.MAX_VALUE, longer - shorter));
    }
    return Optional.empty();
  }

  private static boolean contains(String a, String b) {
    String longer = a.length() >= b.length() ? a : b;
    String shorter = a.length() >= b.length() ? b : a;
    return longer.startsWith(shorter) || longer.endsWith(shorter);
  }

  /** Lower case, without separators. */
  static String plain(String word) {
    StringBuilder letters = new StringBuilder(Math.min(word.length(), 64));
    for (int i = 0; i < word.length(); i++) {
      char c = word.charAt(i);
      if (c != '_' && c != '-' && c != '.' && !Character.isWhitespace(c)) {
        letters.append(c);
      }
    }
    return letters.toString().toLowerCase(Locale.ROOT);
  }

  /**
   * The distance between two words by the recurrence over their beginnings; three rows of it are
   * enough, since an exchange reaches two letters back.
   */
  static int distance(String a, String b) {
    int[] beforeLast = new int[b.length() + 1];
    int[] last = new int[b.length() + 1];
    int[] row = new int[b.length() + 1];
    for (int j = 0; j <= b.length(); j++) {
      last[j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      row[0] = i;
      for (int j = 1; j <= b.length(); j++) {
        int change = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        int least = Math.min(last[j - 1] + change, Math.min(last[j], row[j - 1]) + 1);
        boolean exchanged =
            i > 1
                && j > 1
                && a.charAt(i - 1) == b.charAt(j - 2)
                && a.charAt(i - 2) == b.charAt(j - 1);
        row[j] = exchanged ? Math.min(least, beforeLast[j - 2] + 1) : least;
      }
      int[] spare = beforeLast;
      beforeLast = last;
      last = row;
      row = spare;
    }
    return last[b.length()];
  }
}
