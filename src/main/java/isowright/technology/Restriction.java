package isowright.technology;

import java.util.Locale;

/**
 * What a technology may be held to when it is fitted, from the weakest to the strongest; each
 * implies those before it.
 *
 * <p>What a restriction means for a form is for the form to say ({@link Form#restricted}); a form
 * that obeys it at any parameters is not changed by it.
 */
public enum Restriction {
  /** The mix that is cheapest at given prices has the same proportions at every scale. */
  HOMOTHETIC,
  /** Returns to scale are the same at every mix and scale. */
  HOMOGENEOUS,
  /** Twice of every input yields twice the output. */
  CONSTANT_RETURNS;

  /** The word used in files. */
  public String word() {
    return name().toLowerCase(Locale.ROOT).replace('_', '-');
  }
}
