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

  /** The part of {@link #slackArea} that lies along the seams of one patch. */
  public double slackArea(int patch) {
    double sum = 0;
    for (Seam seam : seams) {
      sum += seam.patches().contains(patch) ? seam.slack() * seam.length() : 0;
    }
    return sum;
  }

  /** Whether each stretch of every rim meets exactly one other. */
  public boolean close() {
    return gaps.isEmpty() && seams.stream().noneMatch(Seam::isCrowded);
  }
}
