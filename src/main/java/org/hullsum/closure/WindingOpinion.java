package org.hullsum.closure;

import java.util.Collections;
import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * What winding numbers say of the facings of one volume's patches.
 *
 * @param numbers beside each patch on both sides of which something could be looked at, with the
 *     facings found by other means; empty where a facing was not found
 * @param votes for each patch, with no say of any other means
 */
public record WindingOpinion(Optional<List<Numbers>> numbers, List<Vote> votes) {
  /**
   * The winding numbers beside a patch that are farthest from what they should be.
   *
   * @param patch its index among those of the volume
   * @param inside on its inner side, where it should be 1
   * @param outside on its outer side, where it should be 0
   * @param error a bound on the error of both
   */
  public record Numbers(int patch, double inside, double outside, double error) {
    /** Distance from a whole number that is no longer that number. */
    public static final double CLOSE = 0.25;

    /** Whether both are what they should be. */
    public boolean fit() {
      double largest = CLOSE + error;
      return Math.abs(inside - 1) <= largest && Math.abs(outside) <= largest;
    }
  }

  /**
   * The side of the volume to which the construction normal of a patch points.
   *
   * @param side undetermined where neither side is clearly better
   * @param misfit root mean square of how far winding numbers near it are from 0 and 1 at best
   * @param otherwise the same at best if the patch faced the other way
   */
  public record Vote(FoundFacing.Side side, double misfit, double otherwise) {
    public Vote {
      Objects.requireNonNull(side, "side");
    }
  }

  public WindingOpinion {
    numbers = numbers.map(List::copyOf);
    votes = List.copyOf(votes);
  }

  /** What is said where nothing could be looked at. */
  static WindingOpinion none(int patches) {
    Vote vote = new Vote(FoundFacing.Side.UNDETERMINED, Double.NaN, Double.NaN);
    return new WindingOpinion(Optional.empty(), Collections.nCopies(patches, vote));
  }
}
