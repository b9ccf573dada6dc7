package isowright.study;

/**
 * A mistake in a study file.
 *
 * @param line the line, from 1; 0 where the mistake concerns the whole file
 * @param column the column, from 1; 0 likewise
 * @param key the key, as a path such as {@code inputs.labour.price}; empty for the whole file
 * @param message what was found, what is allowed, and the nearest allowed word
 */
public record Mistake(int line, int column, String key, String message) {}
