package org.hullsum.closure;

/**
 * What the lines through one point of a patch say of its two sides.
 *
 * <p>A line meets the patch's own crossing once; on a closed surface the numbers of the other
 * crossings on its two sides then differ in parity, and the even side is outside.
 */
final class PointTally {
  private int out;
  private int in;
  private int alike;
  private int frontOdd;
  private int backOdd;

  /**
   * Enters one line.
   *
   * @param front number of crossings on the side to which the normal points
   * @param back number on the other
   * @param here number of other patches that pass through the point itself
   */
  void enter(int front, int back, int here) {
    boolean oddFront = front % 2 == 1;
    boolean oddBack = back % 2 == 1;
    frontOdd += oddFront ? 1 : 0;
    backOdd += oddBack ? 1 : 0;
    if (oddFront == oddBack || here > 0) {
      alike++;
    } else if (oddBack) {
      out++;
    } else {
      in++;
    }
  }

  int lines() {
    return out + in + alike;
  }

  int frontOdd() {
    return frontOdd;
  }

  int backOdd() {
    return backOdd;
  }

  /** Whether all lines agree that the normal points out. */
  boolean saysOut() {
    return out > 0 && in == 0 && alike == 0;
  }

  /** Whether all lines agree that it points in. */
  boolean saysIn() {
    return in > 0 && out == 0 && alike == 0;
  }

  /** Whether a line found both sides alike, or two lines disagree. */
  boolean isAtOdds() {
    return alike > 0 || (in > 0 && out > 0);
  }
}
