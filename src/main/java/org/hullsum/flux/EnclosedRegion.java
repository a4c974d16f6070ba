package org.hullsum.flux;

import java.util.List;
import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Vector3;

/**
 * Volume, centroid and box of the region that a boundary encloses, from the integrals of its
 * patches.
 *
 * <p>V = ⅓ ∬ (r − o)·n dS, and the centroid is o + (1/V) ∬ ½|r − o|² n dS, for any o; it is taken
 * in the middle of the box.
 *
 * @param volume V
 * @param volumeError a bound
 * @param centroid of the region; the middle of the box where V vanishes
 * @param box a box that contains the boundary
 */
record EnclosedRegion(double volume, double volumeError, Vector3 centroid, Box3 box) {

  static EnclosedRegion of(List<BoundaryPatch> boundary) {
    Box3 box = boundary.get(0).geometry().box();
    for (BoundaryPatch patch : boundary) {
      box = box.hullWith(patch.geometry().box());
    }
    Vector3 middle = box.centre();
    double volume = 0;
    double error = 0;
    Vector3 first = Vector3.ZERO;
    for (BoundaryPatch patch : boundary) {
      PatchGeometry g = patch.geometry();
      Vector3 offset = g.reference().minus(middle);
      List<Double> m = g.moments();
      double trace = m.get(0) + m.get(4) + m.get(8) + offset.dot(g.vectorArea());
      volume += patch.outward() * trace / 3;
      error += g.momentsError() + offset.norm() * g.vectorAreaError();
      Vector3 half =
          g.halfSquares()
              .plus(leftProduct(offset, m))
              .plus(g.vectorArea().times(0.5 * offset.dot(offset)));
      first = first.plus(half.times(patch.outward()));
    }
    Vector3 centroid = middle.plus(first.times(1 / volume));
    boolean sound = centroid.isFinite() && box.contains(centroid);
    return new EnclosedRegion(volume, error, sound ? centroid : middle, box);
  }

  /** d·M: component j is Σ_i d_i M_ij. */
  private static Vector3 leftProduct(Vector3 d, List<Double> m) {
    double[] product = new double[3];
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        product[j] += d.component(i) * m.get(3 * i + j);
      }
    }
    return new Vector3(product[0], product[1], product[2]);
  }
}
