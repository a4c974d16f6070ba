package org.hullsum.closure;

import java.util.Arrays;
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

  /**
   * Several patches as one, each with the sign of its side.
   *
   * @param signs +1 or −1 for each patch
   */
  public static SurfaceMoments sum(List<SurfaceMoments> patches, List<Integer> signs) {
    Vector3 reference = patches.get(0).reference;
    double[] total = new double[12];
    double area = 0;
    double vectorError = 0;
    double momentsError = 0;
    for (int p = 0; p < patches.size(); p++) {
      SurfaceMoments patch = patches.get(p);
      double[] row = patch.about(reference);
      for (int k = 0; k < total.length; k++) {
        total[k] += signs.get(p) * row[k];
      }
      area += patch.area;
      vectorError += patch.vectorAreaError;
      momentsError +=
          patch.momentsError + patch.reference.minus(reference).norm() * patch.vectorAreaError;
    }
    return new SurfaceMoments(
        area,
        new Vector3(total[0], total[1], total[2]),
        vectorError,
        reference,
        Arrays.stream(total, 3, total.length).boxed().toList(),
        momentsError);
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
