package org.hullsum.closure;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.apache.commons.numbers.core.Sum;
import org.hullsum.numeric.Vector3;

/**
 * What the vector areas A and moments M of a volume's patches say of its surface, with the signs
 * found for them.
 *
 * <p>For a closed outward surface A = ∬ n dS = 0 and M = ∬ r⊗n dS = V·I, by the divergence theorem.
 * Either failing proves that the surface is open or a sign wrong; both holding proves nothing (a
 * cube with six equal centred holes passes). They confirm what the seams say, and give V.
 *
 * @param closureVector A
 * @param closureError a bound on the error of each component
 * @param moments M about the origin, row by row
 * @param momentsError a bound on the error of each
 * @param holds whether the necessary conditions hold within the error bounds
 * @param enclosedVolume V, where the conditions hold
 */
public record MomentClosure(
    Vector3 closureVector,
    double closureError,
    List<Double> moments,
    double momentsError,
    boolean holds,
    Optional<Double> enclosedVolume) {
  /** Mismatch that comes from rounded coordinates and is no gap, relative to the area. */
  public static final double USUAL_SLACK = 1e-9;

  public MomentClosure {
    Objects.requireNonNull(closureVector, "closureVector");
    Objects.requireNonNull(enclosedVolume, "enclosedVolume");
    moments = List.copyOf(moments);
  }

  /**
   * Sums up a volume's patches.
   *
   * @param patches each once
   * @param signs +1 where the construction normal points out of the volume, else −1
   * @param slack mismatch to be passed over, relative to the area
   */
  public static MomentClosure of(List<SurfaceMoments> patches, List<Integer> signs, double slack) {
    if (patches.size() != signs.size()) {
      throw new IllegalArgumentException(signs.size() + " signs for " + patches.size());
    }
    Frame frame = Frame.of(patches, slack);
    double[] total = new double[12];
    for (int k = 0; k < total.length; k++) {
      Sum sum = Sum.create();
      for (int p = 0; p < patches.size(); p++) {
        sum.add(signs.get(p) * frame.rows[p][k]);
      }
      total[k] = sum.getAsDouble();
    }
    Vector3 vector = new Vector3(total[0], total[1], total[2]);
    boolean holds = frame.holds(total);
    return new MomentClosure(
        vector,
        frame.vectorError,
        aboutOrigin(total, frame.centre),
        frame.momentError + frame.centre.norm() * frame.vectorError,
        holds,
        holds ? Optional.of(trace(total) / 3) : Optional.empty());
  }

  private static double trace(double[] total) {
    return total[3] + total[7] + total[11];
  }

  private static List<Double> aboutOrigin(double[] total, Vector3 centre) {
    List<Double> moments = new ArrayList<>();
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        moments.add(Math.fma(centre.component(i), total[j], total[3 + 3 * i + j]));
      }
    }
    return moments;
  }

  /** The rows of all patches about one point in their midst, with what may be neglected. */
  private static final class Frame {
    private final Vector3 centre;
    private final double[][] rows;
    private final double vectorError;
    private final double momentError;

    private Frame(Vector3 centre, double[][] rows, double vectorError, double momentError) {
      this.centre = centre;
      this.rows = rows;
      this.vectorError = vectorError;
      this.momentError = momentError;
    }

    static Frame of(List<SurfaceMoments> patches, double slack) {
      double totalArea = patches.stream().mapToDouble(SurfaceMoments::area).sum();
      Vector3 centre = Vector3.ZERO;
      for (SurfaceMoments patch : patches) {
        centre = centre.plus(patch.reference().times(1.0 / patches.size()));
      }
      double size = 0;
      double vectorError = 0;
      double momentError = 0;
      for (SurfaceMoments patch : patches) {
        double offset = patch.reference().minus(centre).norm();
        size = Math.max(size, offset + Math.sqrt(patch.area()));
        vectorError += patch.vectorAreaError();
        momentError += patch.momentsError() + offset * patch.vectorAreaError();
      }
      Vector3 origin = centre;
      double[][] rows = patches.stream().map(p -> p.about(origin)).toArray(double[][]::new);
      return new Frame(
          centre, rows, vectorError + slack * totalArea, momentError + slack * totalArea * size);
    }

    boolean holds(double[] total) {
      for (int j = 0; j < 3; j++) {
        if (!(Math.abs(total[j]) <= vectorError)) {
          return false;
        }
      }
      return isMultipleOfIdentity(total, momentError);
    }

    private static boolean isMultipleOfIdentity(double[] total, double tolerance) {
      double mean = trace(total) / 3;
      for (int i = 0; i < 3; i++) {
        for (int j = 0; j < 3; j++) {
          double expected = i == j ? mean : 0;
          if (!(Math.abs(total[3 + 3 * i + j] - expected) <= tolerance)) {
            return false;
          }
        }
      }
      return true;
    }
  }
}
