package org.hullsum.quadrature;

import java.util.Arrays;
import java.util.Optional;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.DecompositionSolver;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * The mean over a duct's section of a speed that is known at scattered points and is zero at the
 * wall.
 *
 * <p>The speed is g·h with g = (distance from the wall)^(1/7), in a rectangle the product of both
 * directions, and h the thin-plate spline through the values: φ(d) = d² ln d and a plane. So the
 * mean is a sum Σ w_i v_i whose weights depend on the places only; profiles that are g times a
 * plane are exact.
 *
 * <p>The bound of {@link #bound} adds two parts: the largest change of the mean with the exponents
 * 1/5 and 1/10 in place of 1/7, and Σ |z_i e_i| with e_i the error at point i of the spline through
 * all others and z_i its weight in h, as if every one of them had the same sign. It is an estimate
 * from the readings, pessimistic for smooth profiles: what stands between the readings and shows at
 * none of them it can't know.
 *
 * <p>Cost O(n³) for n points. Immutable.
 *
 * <p>References: J. Duchon, Splines minimizing rotation-invariant semi-norms in Sobolev spaces,
 * 1977; S. Rippa, An algorithm for selecting a good value for the parameter c in radial basis
 * function interpolation, Adv. Comput. Math. 11, 1999 (the errors of all splines that leave one
 * out, from one inverse).
 */
public final class ScatteredMean {
  /** Fewer tell no profile. */
  public static final int FEWEST = 6;

  /** The reciprocal exponents of the wall's law: the one that is used, then those it is held to. */
  private static final double[] LAWS = {7, 5, 10};

  private static final int ACROSS = 32;
  private static final int AROUND = 64;

  /** Distance from the wall as this power of the variable, which smooths the law at the wall. */
  private static final int WALL_POWER = 4;

  /** In radii, or half sides: where a reading is nearly zero, the spline would be divided by it. */
  private static final double NEAREST_TO_WALL = 1e-3;

  /** In radii, or half sides: what is farther from any reading is not interpolated but guessed. */
  private static final double FARTHEST = 0.8;

  private static final double SAME_PLACE = 1e-6;

  private static final double SINGULAR = 1e-12;

  /** Why there is no mean. */
  public enum Fault {
    /** Too few readings. */
    FEW,
    /** A reading at the wall. */
    AT_WALL,
    /** Two readings at one place. */
    SAME_PLACE,
    /** A part of the section is far from any reading. */
    HOLE,
    /** They stand on one line. */
    ON_A_LINE
  }

  /**
   * What is at fault.
   *
   * @param fault the kind
   * @param reading index of a reading, the second one of two; −1 where none is meant
   * @param x of the place, for a hole
   * @param y of the place
   */
  public record Refusal(Fault fault, int reading, double x, double y) {}

  /**
   * A mean, or why there is none.
   *
   * @param mean empty where refused
   * @param refusal empty where there is a mean
   */
  public record Outcome(Optional<ScatteredMean> mean, Optional<Refusal> refusal) {
    private static Outcome refused(Fault fault, int reading, double x, double y) {
      return new Outcome(Optional.empty(), Optional.of(new Refusal(fault, reading, x, y)));
    }
  }

  private final double[][] wallFactors;
  private final double[][] inHeights;
  private final RealMatrix inverse;

  private ScatteredMean(double[][] wallFactors, double[][] inHeights, RealMatrix inverse) {
    this.wallFactors = wallFactors;
    this.inHeights = inHeights;
    this.inverse = inverse;
  }

  /**
   * The mean over a section.
   *
   * @param round whether it is the unit disk, else the square from −1 to 1
   * @param x of each reading
   * @param y of each reading
   */
  public static Outcome of(boolean round, double[] x, double[] y) {
    int n = x.length;
    if (n < FEWEST) {
      return Outcome.refused(Fault.FEW, -1, 0, 0);
    }
    for (int i = 0; i < n; i++) {
      if (wallDistance(round, x[i], y[i]) < NEAREST_TO_WALL) {
        return Outcome.refused(Fault.AT_WALL, i, x[i], y[i]);
      }
      for (int j = 0; j < i; j++) {
        if (Math.hypot(x[i] - x[j], y[i] - y[j]) < SAME_PLACE) {
          return Outcome.refused(Fault.SAME_PLACE, i, x[i], y[i]);
        }
      }
    }
    double[][] nodes = round ? diskNodes() : squareNodes();
    for (double[] node : nodes) {
      double nearest = Double.POSITIVE_INFINITY;
      for (int i = 0; i < n; i++) {
        nearest = Math.min(nearest, Math.hypot(x[i] - node[0], y[i] - node[1]));
      }
      if (nearest > FARTHEST) {
        return Outcome.refused(Fault.HOLE, -1, node[0], node[1]);
      }
    }
    DecompositionSolver solver = new LUDecomposition(system(x, y), SINGULAR).getSolver();
    return solver.isNonSingular()
        ? new Outcome(
            Optional.of(solved(round, new double[][] {x, y}, nodes, solver)), Optional.empty())
        : Outcome.refused(Fault.ON_A_LINE, -1, 0, 0);
  }

  private static ScatteredMean solved(
      boolean round, double[][] at, double[][] nodes, DecompositionSolver solver) {
    int n = at[0].length;
    RealMatrix inverse = solver.getInverse();
    double[][] factors = new double[LAWS.length][n];
    double[][] inHeights = new double[LAWS.length][];
    for (int law = 0; law < LAWS.length; law++) {
      for (int i = 0; i < n; i++) {
        factors[law][i] = wallFactor(round, at[0][i], at[1][i], LAWS[law]);
      }
      double[] moments = new double[n + 3];
      for (double[] node : nodes) {
        double weight = node[2] * wallFactor(round, node[0], node[1], LAWS[law]);
        for (int i = 0; i < n; i++) {
          moments[i] += weight * kernel(node[0] - at[0][i], node[1] - at[1][i]);
        }
        moments[n] += weight;
        moments[n + 1] += weight * node[0];
        moments[n + 2] += weight * node[1];
      }
      inHeights[law] = Arrays.copyOf(inverse.operate(moments), n);
    }
    return new ScatteredMean(factors, inHeights, inverse);
  }

  private static RealMatrix system(double[] x, double[] y) {
    int n = x.length;
    double[][] a = new double[n + 3][n + 3];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        a[i][j] = kernel(x[i] - x[j], y[i] - y[j]);
      }
      double[] plane = {1, x[i], y[i]};
      for (int k = 0; k < plane.length; k++) {
        a[i][n + k] = plane[k];
        a[n + k][i] = plane[k];
      }
    }
    return new Array2DRowRealMatrix(a, false);
  }

  private static double kernel(double dx, double dy) {
    double square = dx * dx + dy * dy;
    return square == 0 ? 0 : 0.5 * square * Math.log(square);
  }

  private static double wallDistance(boolean round, double x, double y) {
    return round ? 1 - Math.hypot(x, y) : Math.min(1 - Math.abs(x), 1 - Math.abs(y));
  }

  private static double wallFactor(boolean round, double x, double y, double law) {
    double product = round ? 1 - Math.hypot(x, y) : (1 - Math.abs(x)) * (1 - Math.abs(y));
    return Math.pow(Math.max(0, product), 1 / law);
  }

  /** Each x, y and its share of the area; the shares add to 1 but for rounding. */
  private static double[][] diskNodes() {
    GaussRule rule = GaussRule.of(ACROSS);
    double[][] nodes = new double[ACROSS * AROUND][];
    for (int i = 0; i < ACROSS; i++) {
      double w = rule.node(i);
      double r = 1 - Math.pow(w, WALL_POWER);
      double share = 2 * r * WALL_POWER * Math.pow(w, WALL_POWER - 1) * rule.weight(i) / AROUND;
      for (int j = 0; j < AROUND; j++) {
        double angle = 2 * Math.PI * (j + 0.5) / AROUND;
        nodes[i * AROUND + j] = new double[] {r * Math.cos(angle), r * Math.sin(angle), share};
      }
    }
    return nodes;
  }

  private static double[][] squareNodes() {
    double[][] line = sideNodes();
    double[][] nodes = new double[line.length * line.length][];
    for (int i = 0; i < line.length; i++) {
      for (int j = 0; j < line.length; j++) {
        nodes[i * line.length + j] = new double[] {line[i][0], line[j][0], line[i][1] * line[j][1]};
      }
    }
    return nodes;
  }

  /** From −1 to 1, smoothed at both ends. */
  private static double[][] sideNodes() {
    int half = ACROSS / 2;
    GaussRule rule = GaussRule.of(half);
    double[][] nodes = new double[2 * half][];
    for (int i = 0; i < half; i++) {
      double w = rule.node(i);
      double x = 1 - Math.pow(w, WALL_POWER);
      double share = 0.5 * WALL_POWER * Math.pow(w, WALL_POWER - 1) * rule.weight(i);
      nodes[i] = new double[] {x, share};
      nodes[half + i] = new double[] {-x, share};
    }
    return nodes;
  }

  /** The share of each reading in the mean. */
  public double[] weights() {
    return weights(0);
  }

  private double[] weights(int law) {
    double[] weights = new double[inHeights[law].length];
    for (int i = 0; i < weights.length; i++) {
      weights[i] = inHeights[law][i] / wallFactors[law][i];
    }
    return weights;
  }

  /** How far the mean of the given readings may be from the true one. */
  public double bound(double[] values) {
    double mean = mean(values, 0);
    double ofLaw = 0;
    for (int law = 1; law < LAWS.length; law++) {
      ofLaw = Math.max(ofLaw, Math.abs(mean(values, law) - mean));
    }
    int n = values.length;
    double[] heights = new double[n + 3];
    for (int i = 0; i < n; i++) {
      heights[i] = values[i] / wallFactors[0][i];
    }
    double[] coefficients = inverse.operate(heights);
    double ofSpline = 0;
    for (int i = 0; i < n; i++) {
      ofSpline += Math.abs(inHeights[0][i] * coefficients[i] / inverse.getEntry(i, i));
    }
    return ofLaw + ofSpline;
  }

  private double mean(double[] values, int law) {
    double[] weights = weights(law);
    double sum = 0;
    for (int i = 0; i < values.length; i++) {
      sum += weights[i] * values[i];
    }
    return sum;
  }
}
