package org.hullsum.closure;

import java.util.List;
import java.util.Objects;
import org.hullsum.numeric.Vector3;

/**
 * The geometric integrals of one patch, for its construction normal.
 *
 * @param area ∬ dS
 * @param vectorArea ∬ n dS
 * @param vectorAreaError a bound on the error of each component
 * @param reference the point q about which the moments are taken, near the patch
 * @param moments the nine ∬ (r − q)⊗n dS, row by row: the row is the component of r
 * @param momentsError a bound on the error of each
 */
public record SurfaceMoments(
    double area,
    Vector3 vectorArea,
    double vectorAreaError,
    Vector3 reference,
    List<Double> moments,
    double momentsError) {
  public SurfaceMoments {
    Objects.requireNonNull(vectorArea, "vectorArea");
    Objects.requireNonNull(reference, "reference");
    moments = List.copyOf(moments);
    if (moments.size() != 9) {
      throw new IllegalArgumentException(moments.size() + " moments, not 9");
    }
  }

  /** The vector area and the moments about another point, in a row of 3 + 9 numbers. */
  double[] about(Vector3 point) {
    double[] row = new double[12];
    Vector3 offset = reference.minus(point);
    for (int j = 0; j < 3; j++) {
      row[j] = vectorArea.component(j);
      for (int i = 0; i < 3; i++) {
        row[3 + 3 * i + j] =
            Math.fma(offset.component(i), vectorArea.component(j), moments.get(3 * i + j));
      }
    }
    return row;
  }
}
