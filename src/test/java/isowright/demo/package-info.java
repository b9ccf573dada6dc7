/**
 * The invented records of the demo study, and the proof that the committed files are exactly what
 * the generator makes.
 *
 * <p><b>Comes in:</b> nothing but constants. <b>Goes out:</b> {@code notebooks-data/glassworks.csv}
 * and {@code .xlsx}.
 *
 * <p><b>Read first:</b> {@link isowright.demo.GlassworksTruth}, {@link
 * isowright.demo.GlassworksGenerator}.
 *
 * <p><b>Does not belong here:</b> anything that the program itself uses; the demo's formulas are
 * written a second time on purpose, so that they check those of the program.
 */
@NullMarked
package isowright.demo;

import org.jspecify.annotations.NullMarked;
