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
 * Either failing proves the surface open; both holding proves nothing (a cube with six equal
 * centred holes passes). A surface that lacks one plane piece of vector area g with its centre at c
 * has A = −g and M = V·I − c⊗g, so that V = w·M w for every unit w square to g, and c = (V g − M
 * g)/|g|².
 *
 * @param closureVector A
 * @param closureError a bound on the error of each component
 * @param moments M about the origin, row by row
 * @param momentsError a bound on the error of each
 * @param holds whether the necessary conditions hold within the error bounds
 * @param enclosedVolume V, where the conditions hold
 * @param gap the one plane gap that explains A and M, where they fail and it does
 */
public record MomentClosure(
    Vector3 closureVector,
    double closureError,
    List<Double> moments,
    double momentsError,
    boolean holds,
    Optional<Double> enclosedVolume,
    Optional<PlaneGap> gap) {
  /** Mismatch that comes from rounded coordinates and is no gap, relative to the area. */
  public static final double USUAL_SLACK = 1e-9;

  /** Up to this number of patches every choice of signs is tried: 2^19 of them. */
  private static final int MOST_PATCHES_FOR_ALL_SIGNS = 20;

  /** How well one plane gap must explain the moments, relative to |g| times the size. */
  private static final double GAP_FIT = 1e-6;

  /**
   * The plane piece that is missing.
   *
   * @param vectorArea g, outward
   * @param centre c, the centroid of the piece
   * @param volume V with the piece in place
   */
  public record PlaneGap(Vector3 vectorArea, Vector3 centre, double volume) {}

  public MomentClosure {
    Objects.requireNonNull(closureVector, "closureVector");
    Objects.requireNonNull(enclosedVolume, "enclosedVolume");
    Objects.requireNonNull(gap, "gap");
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
        holds ? Optional.of(trace(total) / 3) : Optional.empty(),
        holds ? Optional.empty() : frame.planeGap(total));
  }

  /**
   * Whether the necessary conditions fail for every choice of signs, so that the surface is open
   * whatever the facings; empty where there are too many patches to try.
   */
  public static Optional<Boolean> failsForEverySign(List<SurfaceMoments> patches, double slack) {
    int n = patches.size();
    if (n == 0 || n > MOST_PATCHES_FOR_ALL_SIGNS) {
      return Optional.empty();
    }
    Frame frame = Frame.of(patches, slack);
    double[] total = new double[12];
    boolean[] turned = new boolean[n];
    for (double[] row : frame.rows) {
      add(total, row, 1);
    }
    for (int code = 1; code <= 1 << (n - 1); code++) {
      if (frame.holds(total)) {
        return Optional.of(false);
      }
      int next = Integer.numberOfTrailingZeros(code);
      if (next < n - 1) {
        turned[next] = !turned[next];
        add(total, frame.rows[next], turned[next] ? -2 : 2);
      }
    }
    return Optional.of(true);
  }

  private static void add(double[] total, double[] row, double factor) {
    for (int k = 0; k < total.length; k++) {
      total[k] = Math.fma(factor, row[k], total[k]);
    }
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
    private final double size;
    private final double vectorError;
    private final double momentError;

    private Frame(
        Vector3 centre, double[][] rows, double size, double vectorError, double momentError) {
      this.centre = centre;
      this.rows = rows;
      this.size = size;
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
          centre,
          rows,
          size,
          vectorError + slack * totalArea,
          momentError + slack * totalArea * size);
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

    Optional<PlaneGap> planeGap(double[] total) {
      Vector3 gap = new Vector3(-total[0], -total[1], -total[2]);
      double area = gap.norm();
      if (!(area > vectorError)) {
        return Optional.empty();
      }
      Vector3 g = gap.times(1 / area);
      Vector3 first = squareTo(g);
      Vector3 second = g.cross(first);
      double volume = 0.5 * (first.dot(product(total, first)) + second.dot(product(total, second)));
      Vector3 offset = g.times(volume).minus(product(total, g)).times(1 / area);
      double[] rest = total.clone();
      for (int i = 0; i < 3; i++) {
        for (int j = 0; j < 3; j++) {
          rest[3 + 3 * i + j] += offset.component(i) * gap.component(j);
        }
      }
      return isMultipleOfIdentity(rest, momentError + GAP_FIT * area * size)
          ? Optional.of(new PlaneGap(gap, centre.plus(offset), volume))
          : Optional.empty();
    }

    private static Vector3 squareTo(Vector3 g) {
      Vector3 other = Math.abs(g.x()) < 0.6 ? Vector3.X : Vector3.Y;
      return g.cross(other).unit();
    }

    private static Vector3 product(double[] total, Vector3 w) {
      return new Vector3(row(total, 0, w), row(total, 1, w), row(total, 2, w));
    }

    private static double row(double[] total, int i, Vector3 w) {
      return total[3 + 3 * i] * w.x() + total[4 + 3 * i] * w.y() + total[5 + 3 * i] * w.z();
    }
  }
}
