package org.hullsum.flux;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Hazard;
import org.hullsum.expression.IntervalEvaluator;
import org.hullsum.field.Coordinates;
import org.hullsum.field.VectorField;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;

/**
 * The hazards of some formulas in native coordinates, over boxes of space at one instant, and the
 * size of the formulas at points.
 *
 * <p>The native coordinates are enclosed first, so that what their own definitions do on the axis
 * does not count. Not thread-safe.
 */
final class HazardCheck {
  private static final List<String> SPACE = List.of("x", "y", "z");

  private final double instant;
  private final int count;
  private final IntervalEvaluator natives;
  private final IntervalEvaluator.Workspace nativesWorkspace;
  private final IntervalEvaluator enclosures;
  private final IntervalEvaluator.Workspace enclosuresWorkspace;
  private final Interval[] nativeRanges;
  private final Interval[] ranges;
  private final BatchEvaluator nativePoints;
  private final BatchEvaluator.Workspace nativePointsWorkspace;
  private final BatchEvaluator formulas;
  private final BatchEvaluator.Workspace formulasWorkspace;

  private HazardCheck(
      List<String> names,
      List<Expression> definitions,
      List<Expression> formulas,
      Map<String, Double> constants,
      OptionalDouble instant) {
    this.instant = instant.orElse(0);
    this.count = names.size();
    List<String> variables = new ArrayList<>(names);
    variables.add(InputSensitivity.TIME);
    this.natives = IntervalEvaluator.compile(SPACE, constants, definitions);
    this.nativesWorkspace = natives.workspace();
    this.enclosures = IntervalEvaluator.compile(variables, constants, formulas);
    this.enclosuresWorkspace = enclosures.workspace();
    this.nativeRanges = new Interval[variables.size()];
    this.ranges = new Interval[formulas.size()];
    this.nativePoints = BatchEvaluator.compile(SPACE, constants, definitions);
    this.nativePointsWorkspace = nativePoints.workspace();
    this.formulas = BatchEvaluator.compile(variables, constants, formulas);
    this.formulasWorkspace = this.formulas.workspace();
  }

  /** The components of a field in its native coordinates. */
  static HazardCheck of(VectorField field, Map<String, Double> constants, OptionalDouble instant) {
    Coordinates coordinates = field.coordinates();
    return new HazardCheck(
        List.copyOf(coordinates.definitions().keySet()),
        List.copyOf(coordinates.definitions().values()),
        List.of(field.components().x(), field.components().y(), field.components().z()),
        constants,
        instant);
  }

  /** A formula in x, y, z. */
  static HazardCheck of(Expression density, Map<String, Double> constants, OptionalDouble instant) {
    List<Expression> position = SPACE.stream().<Expression>map(Expression::symbol).toList();
    return new HazardCheck(SPACE, position, List.of(density), constants, instant);
  }

  /** Whether the formulas are defined wherever they are evaluated. */
  boolean none() {
    return enclosures.hazards().isEmpty();
  }

  /**
   * A hazard that is possible somewhere in the box; empty where all are proved absent.
   *
   * @param space ranges of x, y and z
   */
  Optional<Hazard> possible(Interval[] space) {
    natives.evaluate(space, nativeRanges, nativesWorkspace);
    nativeRanges[count] = Interval.point(instant);
    enclosures.evaluate(nativeRanges, ranges, enclosuresWorkspace);
    List<Hazard> hazards = enclosures.hazards();
    for (int k = 0; k < hazards.size(); k++) {
      if (enclosures.mayBeUndefined(k, enclosuresWorkspace)) {
        return Optional.of(hazards.get(k));
      }
    }
    return Optional.empty();
  }

  /** The largest absolute value of the formulas at a point; NaN where one is undefined. */
  double size(Vector3 point) {
    double[][] at = {{point.x()}, {point.y()}, {point.z()}};
    double[][] inputs = new double[count + 1][1];
    nativePoints.evaluate(at, 1, Arrays.copyOf(inputs, count), nativePointsWorkspace);
    inputs[count][0] = instant;
    double[][] values = new double[formulas.outputCount()][1];
    formulas.evaluate(inputs, 1, values, formulasWorkspace);
    double largest = 0;
    for (double[] value : values) {
      largest = Double.isNaN(value[0]) ? Double.NaN : Math.max(largest, Math.abs(value[0]));
    }
    return largest;
  }
}
