package org.hullsum.flux;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.Deque;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.hullsum.expression.BatchEvaluator;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Function;
import org.hullsum.expression.Printer;
import org.hullsum.expression.Switches;
import org.hullsum.expression.Symbols;
import org.hullsum.field.VectorField;
import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Vector3;

/**
 * Looks for surfaces inside a region on which a field jumps: the divergence knows nothing of what
 * is made there.
 *
 * <p>Candidates are the zero sets of what comparisons, {@code sign} and the cut of {@code atan2}
 * depend on. Points of them are found on a lattice by sign change and bisection, and the field is
 * compared on their two sides. So a jump on a piece smaller than the lattice can be missed. Not
 * thread-safe.
 */
public final class JumpSearch {
  /** Points of the lattice along each axis. */
  private static final int LATTICE = 20;

  /** Points looked at on each candidate surface. */
  private static final int MOST_POINTS = 400;

  /** Jumps tested for being inside the region. */
  private static final int MOST_INSIDE_TESTS = 24;

  private static final int HALVINGS = 50;

  /** Distance of the two sides from the surface, relative to the size of the region. */
  private static final double APART = 1e-7;

  /** A difference of the two sides that no continuous field has, relative to the field's size. */
  private static final double JUMP = 1e-4;

  private final BoundaryLines lines;
  private final Box3 box;
  private final BatchEvaluator evaluator;
  private final BatchEvaluator.Workspace workspace;
  private final List<Expression> candidates;
  private final double instant;

  private JumpSearch(
      List<BoundaryPatch> boundary,
      VectorField field,
      List<Expression> candidates,
      Map<String, Double> values,
      OptionalDouble instant) {
    this.lines = new BoundaryLines(boundary, values);
    this.box = EnclosedRegion.of(boundary).box();
    this.candidates = candidates;
    this.instant = instant.orElse(0);
    List<Expression> formulas = new ArrayList<>();
    formulas.add(field.cartesian().x());
    formulas.add(field.cartesian().y());
    formulas.add(field.cartesian().z());
    formulas.addAll(candidates);
    this.evaluator =
        BatchEvaluator.compile(List.of("x", "y", "z", InputSensitivity.TIME), values, formulas);
    this.workspace = evaluator.workspace();
  }

  /**
   * A jump of the field in the region that a boundary encloses, if one is found.
   *
   * @param values of every input
   */
  public static Optional<FieldJump> find(
      List<BoundaryPatch> boundary,
      VectorField field,
      Map<String, Double> values,
      OptionalDouble instant) {
    List<Expression> candidates = candidates(field);
    return candidates.isEmpty()
        ? Optional.empty()
        : new JumpSearch(boundary, field, candidates, values, instant).run();
  }

  private static List<Expression> candidates(VectorField field) {
    List<Expression> candidates = new ArrayList<>();
    boolean dependsOnAngle = dependsOnAngle(field);
    for (Expression component :
        List.of(field.cartesian().x(), field.cartesian().y(), field.cartesian().z())) {
      List<Expression> found = new ArrayList<>(Switches.jumps(component));
      if (dependsOnAngle) {
        found.addAll(cuts(component));
      }
      found.stream().filter(f -> !candidates.contains(f)).forEach(candidates::add);
    }
    return candidates;
  }

  /**
   * Whether an angle by atan2 is in the field as it was stated; the local unit vectors turn with
   * the angle, but without a jump.
   */
  private static boolean dependsOnAngle(VectorField field) {
    for (Expression component :
        List.of(field.components().x(), field.components().y(), field.components().z())) {
      if (!cuts(component).isEmpty()) {
        return true;
      }
      for (String symbol : Symbols.in(component)) {
        Expression definition = field.coordinates().definitions().get(symbol);
        if (definition != null && !cuts(definition).isEmpty()) {
          return true;
        }
      }
    }
    return false;
  }

  /** The first arguments of atan2: where one vanishes and the second is negative is the cut. */
  private static List<Expression> cuts(Expression formula) {
    Set<Expression> seen = Collections.newSetFromMap(new IdentityHashMap<>());
    Deque<Expression> open = new ArrayDeque<>(List.of(formula));
    List<Expression> cuts = new ArrayList<>();
    while (!open.isEmpty()) {
      Expression next = open.pop();
      if (seen.add(next)) {
        next.children().forEach(open::push);
        if (next instanceof Call call && call.function() == Function.ATAN2) {
          cuts.add(call.arguments().get(0));
        }
      }
    }
    return cuts;
  }

  private double[][] evaluate(double[][] points) {
    int count = points[0].length;
    double[] instants = new double[count];
    Arrays.fill(instants, instant);
    double[][] values = new double[evaluator.outputCount()][count];
    evaluator.evaluate(
        new double[][] {points[0], points[1], points[2], instants}, count, values, workspace);
    return values;
  }

  private double[] evaluate(Vector3 point) {
    double[][] values = evaluate(new double[][] {{point.x()}, {point.y()}, {point.z()}});
    return Arrays.stream(values).mapToDouble(row -> row[0]).toArray();
  }

  private Optional<FieldJump> run() {
    double[][] lattice = lattice();
    double[][] values = evaluate(lattice);
    double size = 0;
    for (int i = 0; i < values[0].length; i++) {
      double here = Math.abs(values[0][i]) + Math.abs(values[1][i]) + Math.abs(values[2][i]);
      size += Double.isFinite(here) ? here / values[0].length : 0;
    }
    for (int k = 0; k < candidates.size(); k++) {
      Optional<FieldJump> jump = onZeroSet(k, lattice, values[3 + k], size);
      if (jump.isPresent()) {
        return jump;
      }
    }
    return Optional.empty();
  }

  private double[][] lattice() {
    int n = LATTICE;
    double[][] points = new double[3][n * n * n];
    for (int i = 0; i < points[0].length; i++) {
      points[0][i] = at(0, i % n);
      points[1][i] = at(1, i / n % n);
      points[2][i] = at(2, i / (n * n));
    }
    return points;
  }

  private double at(int axis, int step) {
    // Off the middle planes, on which fields like to switch.
    double fraction = (step + 0.4) / LATTICE;
    return box.along(axis).low() + fraction * box.along(axis).width();
  }

  private Optional<FieldJump> onZeroSet(
      int candidate, double[][] lattice, double[] signs, double size) {
    int[] strides = {1, LATTICE, LATTICE * LATTICE};
    int points = 0;
    int tests = 0;
    for (int i = 0; i < signs.length; i++) {
      for (int axis = 0; axis < 3; axis++) {
        boolean last = i / strides[axis] % LATTICE == LATTICE - 1;
        if (last || !(signs[i] * signs[i + strides[axis]] < 0)) {
          continue;
        }
        if (points++ >= MOST_POINTS || tests >= MOST_INSIDE_TESTS) {
          return Optional.empty();
        }
        Vector3 place =
            root(candidate, point(lattice, i), point(lattice, i + strides[axis]), signs[i] < 0);
        Optional<FieldJump> jump = jumpAt(candidate, place, size);
        if (jump.isPresent()) {
          tests++;
          if (lines.inside(place).equals(Optional.of(true))) {
            return jump;
          }
        }
      }
    }
    return Optional.empty();
  }

  private static Vector3 point(double[][] lattice, int i) {
    return new Vector3(lattice[0][i], lattice[1][i], lattice[2][i]);
  }

  private Vector3 root(int candidate, Vector3 from, Vector3 to, boolean rising) {
    Vector3 low = from;
    Vector3 high = to;
    for (int step = 0; step < HALVINGS; step++) {
      Vector3 middle = low.plus(high).times(0.5);
      if (evaluate(middle)[3 + candidate] < 0 == rising) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return low.plus(high).times(0.5);
  }

  /** Compares the field on the two sides of the zero set at a point of it. */
  private Optional<FieldJump> jumpAt(int candidate, Vector3 place, double size) {
    double apart = APART * box.diagonal();
    Vector3 gradient =
        new Vector3(
            slope(candidate, place, Vector3.X.times(apart)),
            slope(candidate, place, Vector3.Y.times(apart)),
            slope(candidate, place, Vector3.Z.times(apart)));
    if (!gradient.isFinite() || gradient.equals(Vector3.ZERO)) {
      return Optional.empty();
    }
    Vector3 normal = gradient.unit();
    double[] ahead = evaluate(place.plus(normal.times(apart)));
    double[] behind = evaluate(place.minus(normal.times(apart)));
    Vector3 jump = new Vector3(ahead[0] - behind[0], ahead[1] - behind[1], ahead[2] - behind[2]);
    double local = Math.abs(ahead[0]) + Math.abs(ahead[1]) + Math.abs(ahead[2]);
    return jump.norm() > JUMP * Math.max(size, local)
        ? Optional.of(
            new FieldJump(
                place,
                Printer.print(candidates.get(candidate)),
                jump.norm(),
                Math.abs(jump.dot(normal))))
        : Optional.empty();
  }

  private double slope(int candidate, Vector3 place, Vector3 step) {
    return evaluate(place.plus(step))[3 + candidate] - evaluate(place.minus(step))[3 + candidate];
  }
}
