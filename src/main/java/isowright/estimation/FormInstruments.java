package isowright.estimation;

import isowright.technology.LinearForm;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * Instruments for every column of a form in which an endogenous input stands.
 *
 * <p>An endogenous input may stand in several columns: its log, half its square, its products with
 * other inputs. Each such column needs an instrument of its own. They are the columns that the form
 * itself makes where every endogenous input is replaced by one of its instruments, in every
 * combination: for the translog the instrument, half its square, its products with the exogenous
 * inputs and with the instruments of other endogenous inputs.
 */
final class FormInstruments {

  private final LinearForm form;
  private final List<String> inputs;
  private final boolean[] endogenous;
  private final List<String> names = new ArrayList<>();
  private final List<Combination> combinations = new ArrayList<>();

  /**
   * One way to replace the endogenous inputs.
   *
   * @param stands what stands in place of each input; its own place where it is exogenous
   * @param taken the form's columns that are new with it
   */
  private record Combination(Map<Integer, SeriesColumn> stands, int[] taken) {}

  /**
   * @param byInput instruments of each endogenous input, by its place, in the order of the inputs
   */
  FormInstruments(LinearForm form, List<String> inputs, Map<Integer, List<SeriesColumn>> byInput) {
    this.form = form;
    this.inputs = inputs;
    List<String> own = form.coefficientNames(inputs);
    List<String> marked = new ArrayList<>(inputs);
    byInput.keySet().forEach(i -> marked.set(i, inputs.get(i) + "\u0000"));
    List<String> moved = form.coefficientNames(marked);
    this.endogenous = new boolean[own.size()];
    Set<String> seen = new LinkedHashSet<>();
    for (int k = 0; k < endogenous.length; k++) {
      endogenous[k] = !own.get(k).equals(moved.get(k));
      if (!endogenous[k]) {
        seen.add(own.get(k));
      }
    }
    combine(new ArrayList<>(byInput.entrySet()), new LinkedHashMap<>(), seen);
  }

  private void combine(
      List<Map.Entry<Integer, List<SeriesColumn>>> left,
      Map<Integer, SeriesColumn> chosen,
      Set<String> seen) {
    if (left.isEmpty()) {
      add(chosen, seen);
      return;
    }
    for (SeriesColumn one : left.get(0).getValue()) {
      Map<Integer, SeriesColumn> next = new LinkedHashMap<>(chosen);
      next.put(left.get(0).getKey(), one);
      combine(left.subList(1, left.size()), next, seen);
    }
  }

  private void add(Map<Integer, SeriesColumn> chosen, Set<String> seen) {
    List<String> renamed = new ArrayList<>(inputs);
    chosen.forEach((input, series) -> renamed.set(input, series.word()));
    List<String> columns = form.coefficientNames(renamed);
    List<Integer> taken = new ArrayList<>();
    for (int k = 0; k < columns.size(); k++) {
      if (endogenous[k] && seen.add(columns.get(k))) {
        taken.add(k);
        names.add(columns.get(k));
      }
    }
    combinations.add(new Combination(chosen, taken.stream().mapToInt(Integer::intValue).toArray()));
  }

  /** The names of the instruments' columns. */
  List<String> names() {
    return List.copyOf(names);
  }

  /** Which columns of the form an endogenous input stands in. */
  boolean[] endogenous() {
    return endogenous.clone();
  }

  /**
   * Writes the instruments' columns for rows {@code from} to {@code to − 1}.
   *
   * @param z the logged, divided inputs of those rows
   */
  void fill(int from, int to, double[][] z, double[][] into, int offset) {
    int rows = to - from;
    int at = offset;
    double[][] scratch = new double[endogenous.length][rows];
    for (Combination combination : combinations) {
      double[][] moved = z.clone();
      combination
          .stands()
          .forEach(
              (input, series) ->
                  moved[input] = java.util.Arrays.copyOfRange(series.values(), from, to));
      form.regressors(moved, rows, scratch, 0);
      for (int k : combination.taken()) {
        System.arraycopy(scratch[k], 0, into[at++], 0, rows);
      }
    }
  }
}
