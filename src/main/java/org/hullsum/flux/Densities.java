package org.hullsum.flux;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.Set;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Degree;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Switches;

/**
 * Scalar densities in x, y, z and t, evaluated together over arrays of points at one instant.
 *
 * <p>A point at which one is not finite takes the mean over six points close to it, if that is
 * finite: so a removable 0/0 on the axis of cylindrical coordinates leaves no trace. Not
 * thread-safe.
 */
final class Densities {
  private static final List<String> VARIABLES = List.of("x", "y", "z", InputSensitivity.TIME);

  private static final Set<String> SPACE = Set.of("x", "y", "z");

  /** Distance of the six points, relative to the size of the region. */
  private static final double NEARBY = 0x1p-20;

  private final BatchEvaluator evaluator;
  private final BatchEvaluator.Workspace workspace;
  private final BatchEvaluator switches;
  private final BatchEvaluator.Workspace switchWorkspace;
  private final double[] instants;
  private final double[][] near;
  private final double[][] nearValues;
  private final double distance;
  private final OptionalInt degree;

  /**
   * @param densities what to evaluate
   * @param constants the values of the inputs
   * @param size the size of the region
   * @param block the largest number of points asked for at once
   */
  Densities(
      List<Expression> densities,
      Map<String, Double> constants,
      OptionalDouble instant,
      double size,
      int block) {
    this.evaluator = BatchEvaluator.compile(VARIABLES, constants, densities);
    this.workspace = evaluator.workspace();
    List<Expression> functions = new ArrayList<>();
    densities.forEach(
        g -> Switches.of(g).stream().filter(f -> !functions.contains(f)).forEach(functions::add));
    this.switches = BatchEvaluator.compile(VARIABLES, constants, functions);
    this.switchWorkspace = switches.workspace();
    this.instants = new double[Math.max(block, 6)];
    Arrays.fill(instants, instant.orElse(0));
    this.near = new double[3][6];
    this.nearValues = new double[densities.size()][6];
    this.distance = NEARBY * size;
    this.degree = degree(densities);
  }

  private static OptionalInt degree(List<Expression> densities) {
    int highest = 0;
    for (Expression density : densities) {
      OptionalInt degree = Degree.in(density, SPACE);
      if (degree.isEmpty()) {
        return OptionalInt.empty();
      }
      highest = Math.max(highest, degree.getAsInt());
    }
    return OptionalInt.of(highest);
  }

  int count() {
    return evaluator.outputCount();
  }

  /** The highest total degree in x, y, z, where all densities are polynomials. */
  OptionalInt degree() {
    return degree;
  }

  /** Number of functions on whose zero sets a density may kink or jump. */
  int switchCount() {
    return switches.outputCount();
  }

  void evaluate(int count, double[] x, double[] y, double[] z, double[][] values) {
    evaluator.evaluate(new double[][] {x, y, z, instants}, count, values, workspace);
    for (int k = 0; k < values.length && k < count(); k++) {
      for (int i = 0; i < count; i++) {
        if (!Double.isFinite(values[k][i])) {
          approach(x[i], y[i], z[i], k, i, values);
        }
      }
    }
  }

  private void approach(double x, double y, double z, int k, int i, double[][] values) {
    double[] at = {x, y, z};
    for (int axis = 0; axis < 3; axis++) {
      Arrays.fill(near[axis], at[axis]);
      near[axis][2 * axis] -= distance;
      near[axis][2 * axis + 1] += distance;
    }
    evaluator.evaluate(
        new double[][] {near[0], near[1], near[2], instants}, 6, nearValues, workspace);
    values[k][i] = Arrays.stream(nearValues[k]).sum() / 6;
  }

  void evaluateSwitches(int count, double[] x, double[] y, double[] z, double[][] values) {
    switches.evaluate(new double[][] {x, y, z, instants}, count, values, switchWorkspace);
  }
}
