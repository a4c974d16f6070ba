package org.hullsum.flux;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Expression;
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

  private final List<Hazard> hazards;
  private final List<Integer> firstGuard = new ArrayList<>();
  private final double instant;
  private final IntervalEvaluator natives;
  private final IntervalEvaluator.Workspace nativesWorkspace;
  private final IntervalEvaluator arguments;
  private final IntervalEvaluator.Workspace argumentsWorkspace;
  private final Interval[] nativeRanges;
  private final Interval[] argumentRanges;
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
    this.hazards = Hazards.in(formulas, constants);
    this.instant = instant.orElse(0);
    List<Expression> watched = new ArrayList<>();
    hazards.forEach(hazard -> watched.add(hazard.argument()));
    for (Hazard hazard : hazards) {
      firstGuard.add(watched.size());
      hazard.guards().forEach(guard -> watched.add(guard.condition()));
    }
    List<String> variables = new ArrayList<>(names);
    variables.add(InputSensitivity.TIME);
    this.natives = IntervalEvaluator.compile(SPACE, constants, definitions);
    this.nativesWorkspace = natives.workspace();
    this.arguments = IntervalEvaluator.compile(variables, constants, watched);
    this.argumentsWorkspace = arguments.workspace();
    this.nativeRanges = new Interval[variables.size()];
    this.argumentRanges = new Interval[watched.size()];
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

  /** Whether the formulas have no hazards at all, wherever they are evaluated. */
  boolean none() {
    return hazards.isEmpty();
  }

  /**
   * A hazard that is possible somewhere in the box; empty where all are proved absent.
   *
   * @param space ranges of x, y and z
   */
  Optional<Hazard> possible(Interval[] space) {
    natives.evaluate(space, nativeRanges, nativesWorkspace);
    nativeRanges[nativeRanges.length - 1] = Interval.point(instant);
    arguments.evaluate(nativeRanges, argumentRanges, argumentsWorkspace);
    for (int k = 0; k < hazards.size(); k++) {
      Hazard hazard = hazards.get(k);
      if (hazard.kind().possible(argumentRanges[k]) && guarded(hazard, firstGuard.get(k))) {
        return Optional.of(hazard);
      }
    }
    return Optional.empty();
  }

  private boolean guarded(Hazard hazard, int first) {
    for (int g = 0; g < hazard.guards().size(); g++) {
      if (!hazard.guards().get(g).possible(argumentRanges[first + g])) {
        return false;
      }
    }
    return true;
  }

  /** The largest absolute value of the formulas at a point; NaN where one is undefined. */
  double size(Vector3 point) {
    double[][] at = {{point.x()}, {point.y()}, {point.z()}};
    double[][] inputs = new double[nativeRanges.length][1];
    nativePoints.evaluate(at, 1, Arrays.copyOf(inputs, inputs.length - 1), nativePointsWorkspace);
    inputs[inputs.length - 1][0] = instant;
    double[][] values = new double[formulas.outputCount()][1];
    formulas.evaluate(inputs, 1, values, formulasWorkspace);
    double largest = 0;
    for (double[] value : values) {
      largest = Double.isNaN(value[0]) ? Double.NaN : Math.max(largest, Math.abs(value[0]));
    }
    return largest;
  }
}
