package isowright.study;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.snakeyaml.engine.v2.exceptions.Mark;

/**
 * Gathers the mistakes of one study file, so that all of them can be told at once. The same mistake
 * met twice (a value reached by two ways) counts once.
 */
final class Mistakes {

  private final Set<Mistake> found = new LinkedHashSet<>();

  /** Adds a mistake at a place of the file; marks count from 0, people from 1. */
  void add(Optional<Mark> place, String key, String message) {
    int line = place.map(mark -> mark.getLine() + 1).orElse(0);
    int column = place.map(mark -> mark.getColumn() + 1).orElse(0);
    found.add(new Mistake(line, column, key, message));
  }

  /** Adds a mistake at a line and column, both from 1. */
  void add(int line, int column, String message) {
    found.add(new Mistake(line, column, "", message));
  }

  /** Whether there is none. */
  boolean none() {
    return found.isEmpty();
  }

  /** All of them, in the order of the file. */
  List<Mistake> inOrder() {
    List<Mistake> all = new ArrayList<>(found);
    all.sort(Comparator.comparingInt(Mistake::line).thenComparingInt(Mistake::column));
    return List.copyOf(all);
  }
}
