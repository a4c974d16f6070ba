package org.hullsum.flux;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Accuracy;
import org.hullsum.quadrature.Integral;

/**
 * Volume integrals by columns along an axis: ∫_V g dV = Σ ∬ (∫ g dh from r down to where its line
 * leaves the region) (n·e)⁺ dS over the boundary, e pointing up.
 *
 * <p>The cross-section is covered by the patches that face up, so that where they end or turn over
 * the integrand stays as smooth as they are. Nothing outside the region is looked at. Every line
 * checks the facings by parity besides. Of the six directions along the axes the one is taken in
 * which the columns end on the fewest different patches. Not thread-safe.
 */
final class ColumnRoute {
  private static final List<Vector3> DIRECTIONS =
      List.of(
          Vector3.Z,
          Vector3.Z.negated(),
          Vector3.X,
          Vector3.X.negated(),
          Vector3.Y,
          Vector3.Y.negated());

  /** Points of the coarse look at each chart, in each direction. */
  private static final int LOOKS = 7;

  /** Part of the allowed error that the inner integrals may take. */
  private static final double INNER_SHARE = 0.1;

  /** The power of s in the inner integrals. */
  private static final int POWER = 0;

  private final List<BoundaryPatch> boundary;
  private final List<Expression> densities;
  private final Map<String, Double> constants;
  private final OptionalDouble instant;
  private final double size;
  private final BoundaryLines lines;

  /**
   * @param densities the one wanted, then others that come along
   * @param size of the volume
   */
  ColumnRoute(
      List<BoundaryPatch> boundary,
      List<Expression> densities,
      Map<String, Double> constants,
      OptionalDouble instant,
      double size) {
    this.boundary = boundary;
    this.densities = densities;
    this.constants = constants;
    this.instant = instant;
    this.size = size;
    this.lines = new BoundaryLines(boundary, constants);
  }

  /** The coarse look along one direction. */
  private static final class Look {
    private final Vector3 up;
    private int pieces;
    private final List<Columns.Stretch> stretches = new ArrayList<>();
    private final List<Double> weights = new ArrayList<>();

    Look(Vector3 up) {
      this.up = up;
    }
  }

  /**
   * Integrates to an accuracy relative to ∭|g|; empty where lines contradict the facings in every
   * direction.
   *
   * @param enough an error that is small enough whatever ∭|g|
   * @param limit largest number of points of each chart: each costs a line through the boundary
   */
  Optional<DensityOutcome> integrate(double relative, double enough, long limit) {
    if (boundary.stream().anyMatch(patch -> patch.surface().mesh().isPresent())) {
      return Optional.empty();
    }
    Optional<Look> best = Optional.empty();
    for (Vector3 up : DIRECTIONS) {
      Optional<Look> look = look(up);
      if (look.isPresent() && (best.isEmpty() || look.get().pieces < best.get().pieces)) {
        best = look;
      }
    }
    return best.flatMap(look -> integrate(look, relative, enough, limit));
  }

  private Optional<Look> look(Vector3 up) {
    Columns columns = new Columns(lines, up, size);
    Look look = new Look(up);
    for (BoundaryPatch patch : boundary) {
      for (PulledBackChart chart : patch.surface().charts()) {
        look(chart, patch.outward(), columns, look);
      }
    }
    return columns.contradicted() || look.stretches.isEmpty()
        ? Optional.empty()
        : Optional.of(look);
  }

  private void look(PulledBackChart chart, int outward, Columns columns, Look look) {
    VectorExpression r = chart.chart().position();
    Expression facing = chart.trimmed(chart.areaVector().dot(VectorExpression.of(look.up)));
    FormulaIntegrand surface =
        new FormulaIntegrand(List.of(r.x(), r.y(), r.z(), facing), constants).at(instant);
    int n = LOOKS * LOOKS;
    double[][] at = ChartIntegral.lattice(LOOKS);
    double[][] rows = new double[4][n];
    surface.evaluate(n, at[0], at[1], rows);
    Set<Integer> bottoms = new HashSet<>();
    boolean turns = false;
    double largest = Arrays.stream(rows[3]).map(Math::abs).max().orElse(0);
    for (int i = 0; i < n; i++) {
      double up = outward * rows[3][i];
      turns |= up < -1e-9 * largest;
      if (up > 1e-9 * largest) {
        Vector3 top = new Vector3(rows[0][i], rows[1][i], rows[2][i]);
        for (Columns.Stretch stretch : columns.below(top).orElse(List.of())) {
          bottoms.add(stretch.bottomPatch());
          look.stretches.add(stretch);
          look.weights.add(up * stretch.length() / n);
        }
      }
    }
    if (!bottoms.isEmpty()) {
      look.pieces += bottoms.size() * bottoms.size() + (turns ? 1 : 0);
    }
  }

  private Optional<DensityOutcome> integrate(
      Look look, double relative, double enough, long limit) {
    Densities evaluated = new Densities(densities, constants, instant, size, RayIntegrals.BLOCK);
    int count = look.stretches.size();
    double[][] starts = new double[3][count];
    double[][] ends = new double[3][count];
    for (int k = 0; k < count; k++) {
      for (int axis = 0; axis < 3; axis++) {
        starts[axis][k] = look.stretches.get(k).top().component(axis);
        ends[axis][k] = look.stretches.get(k).bottom().component(axis);
      }
    }
    double volume = look.weights.stream().mapToDouble(Double::doubleValue).sum();
    double magnitude = magnitude(evaluated, starts, ends, look.weights);
    double allowed = Math.max(Math.max(relative * magnitude, enough), Double.MIN_NORMAL);
    double perRay = INNER_SHARE * allowed / Math.max(volume, Double.MIN_NORMAL);
    int level = RayIntegrals.level(evaluated, POWER, starts, ends, perRay);
    RayIntegrals rays = new RayIntegrals(evaluated, POWER, level, perRay);
    Columns columns = new Columns(lines, look.up, size);
    ColumnIntegrand.Setting setting =
        new ColumnIntegrand.Setting(look.up, columns, rays, densities, constants, instant);
    DensityTotals totals = new DensityTotals(densities.size());
    int charts = boundary.stream().mapToInt(p -> p.surface().charts().size()).sum();
    Accuracy accuracy = new Accuracy(0, allowed / (2 * charts), ChartIntegral.ANY_MAGNITUDE, limit);
    for (BoundaryPatch patch : boundary) {
      for (PulledBackChart chart : patch.surface().charts()) {
        ColumnIntegrand integrand = new ColumnIntegrand(chart, patch.outward(), setting);
        Integral[] parts = integrand.integrate(accuracy);
        totals.add(parts);
        if (parts[0].nonFiniteAt().isPresent()) {
          return Optional.of(
              totals.notFinite(integrand.position(parts[0].nonFiniteAt().get())).outcome());
        }
      }
    }
    return columns.contradicted() ? Optional.empty() : Optional.of(totals.outcome());
  }

  private double magnitude(
      Densities evaluated, double[][] starts, double[][] ends, List<Double> weights) {
    int count = weights.size();
    boolean[] all = new boolean[count];
    Arrays.fill(all, true);
    double[][] results = new double[RayIntegrals.rows(densities.size())][count];
    new RayIntegrals(evaluated, POWER, RayIntegrals.COARSE, Double.POSITIVE_INFINITY)
        .integrate(count, starts, ends, all, results);
    double sum = 0;
    for (int k = 0; k < count; k++) {
      double part = weights.get(k) * results[densities.size()][k];
      sum += Double.isFinite(part) ? part : 0;
    }
    return sum;
  }
}
