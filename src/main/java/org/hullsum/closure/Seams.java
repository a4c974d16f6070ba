package org.hullsum.closure;

import java.util.List;

/**
 * How the patches of one volume are sewn together.
 *
 * @param seams where they meet
 * @param gaps where they do not
 * @param slack largest distance accepted in a match
 * @param slackArea sum over the seams of slack times length: a bound on the area that is missing or
 *     there twice along them
 */
public record Seams(List<Seam> seams, List<Gap> gaps, double slack, double slackArea) {
  public Seams {
    seams = List.copyOf(seams);
    gaps = List.copyOf(gaps);
  }

  /** Whether each stretch of every rim meets exactly one other. */
  public boolean close() {
    return gaps.isEmpty() && seams.stream().noneMatch(Seam::isCrowded);
  }
}
