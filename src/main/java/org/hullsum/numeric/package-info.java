/**
 * The lowest floor of the numerics: vectors, intervals with outward rounding, boxes.
 *
 * <p>Values are immutable and carry no units; what a number means is said where it is used. Sums
 * that matter are taken with commons-numbers' {@code Sum}.
 *
 * <p>Imports nothing of this project. Start reading at {@link org.hullsum.numeric.Vector3} and
 * {@link org.hullsum.numeric.Interval}.
 */
package org.hullsum.numeric;
