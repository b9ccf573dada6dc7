package isowright.records;

import java.util.Optional;

/**
 * How numbers are written in a CSV file.
 *
 * @param decimal the decimal mark
 * @param group the mark between groups of three digits; absent: none
 */
public record NumberFormat(char decimal, Optional<Character> group) {}
