/**
 * How long the work takes: a wide study from file to fits, least-cost answers a second, whole runs
 * of the program. Run on request: {@code mvn -Pbenchmark verify}.
 *
 * <p><b>Comes in:</b> nothing; records are made on the spot, always the same ones. <b>Goes out:</b>
 * a table of steps and times on standard output.
 *
 * <p><b>Read first:</b> {@link isowright.benchmark.Benchmark}.
 *
 * <p><b>Does not belong here:</b> assertions on time; the tests have none.
 */
@NullMarked
package isowright.benchmark;

import org.jspecify.annotations.NullMarked;
