package org.hullsum.flux;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.OptionalDouble;
import org.apache.commons.numbers.core.Sum;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;
import org.hullsum.geometry.Bounds;
import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Accuracy;
import org.hullsum.quadrature.Integral;

/**
 * The geometric integrals of one patch, for its construction normal.
 *
 * <p>Moments are taken about a point in the middle of the patch, so that a patch far from the
 * origin loses no digits. All are in working units.
 *
 * @param area ∬ dS
 * @param areaError a bound
 * @param vectorArea ∬ n dS
 * @param vectorAreaError a bound on the error of each component
 * @param reference the point q about which the moments are taken
 * @param moments the nine ∬ (r − q)⊗n dS, row by row: the row is the component of r
 * @param momentsError a bound on the error of each
 * @param halfSquares ∬ ½|r − q|² n dS, from which the centroid of what is enclosed follows
 * @param box a box that contains the patch
 * @param evaluations number of points at which the integrands were evaluated
 * @param status whether the accuracy asked for was reached
 */
public record PatchGeometry(
    double area,
    double areaError,
    Vector3 vectorArea,
    double vectorAreaError,
    Vector3 reference,
    List<Double> moments,
    double momentsError,
    Vector3 halfSquares,
    Box3 box,
    long evaluations,
    Integral.Status status) {
  private static final int AREA = 0;
  private static final int VECTOR = 1;
  private static final int MOMENTS = 4;
  private static final int SQUARES = 13;
  private static final int COMPONENTS = 16;

  private static final double ROUNDING = 4 * Math.ulp(1.0);

  public PatchGeometry {
    Objects.requireNonNull(vectorArea, "vectorArea");
    Objects.requireNonNull(reference, "reference");
    Objects.requireNonNull(halfSquares, "halfSquares");
    Objects.requireNonNull(box, "box");
    Objects.requireNonNull(status, "status");
    moments = List.copyOf(moments);
  }

  /**
   * Integrates over a surface.
   *
   * @param values of every input
   * @param digits errors are to be within 10^−digits of the area, times the patch's size for the
   *     moments
   */
  public static PatchGeometry of(
      PulledBackSurface surface, Map<String, Double> values, int digits) {
    if (surface.surface().isEmpty()) {
      return MeshSums.of(surface.mesh().orElseThrow());
    }
    Box3 box = Bounds.of(surface.surface().get(), values);
    Vector3 reference = box.centre();
    double size = box.diagonal() > 0 ? box.diagonal() : 1;
    List<ChartIntegral> charts = new ArrayList<>();
    double coarseArea = 0;
    for (PulledBackChart chart : surface.charts()) {
      List<Expression> integrands = integrands(chart, reference, size);
      ChartIntegral integral =
          new ChartIntegral(chart, integrands, List.of(integrands.get(AREA)), values);
      coarseArea += integral.coarseMeans(OptionalDouble.empty())[0];
      charts.add(integral);
    }
    // Far from the origin positions carry no more digits than this.
    double rounding = ROUNDING * (1 + reference.norm() / size);
    double absolute = Math.max(Math.pow(10, -digits), rounding) * coarseArea / (2 * charts.size());
    if (!Double.isFinite(absolute)) {
      return notFinite(box);
    }
    Accuracy accuracy =
        new Accuracy(
            0,
            Math.max(absolute, Double.MIN_NORMAL),
            ChartIntegral.ANY_MAGNITUDE,
            Accuracy.USUAL_LIMIT);
    Sum[] sums = new Sum[COMPONENTS];
    double[] errors = new double[COMPONENTS];
    for (int k = 0; k < COMPONENTS; k++) {
      sums[k] = Sum.create();
    }
    long evaluations = 0;
    Integral.Status status = Integral.Status.REACHED;
    for (ChartIntegral chart : charts) {
      Integral[] parts = chart.integrate(OptionalDouble.empty(), accuracy);
      for (int k = 0; k < COMPONENTS; k++) {
        sums[k].add(parts[k].value());
        errors[k] += parts[k].errorBound();
        status = parts[k].reached() ? status : parts[k].status();
      }
      evaluations += parts[0].evaluations();
    }
    return gathered(sums, errors, reference, size, box, evaluations, status);
  }

  /** Of a surface whose formulas, or their products, leave the range of numbers. */
  private static PatchGeometry notFinite(Box3 box) {
    Vector3 none = new Vector3(Double.NaN, Double.NaN, Double.NaN);
    return new PatchGeometry(
        Double.NaN,
        Double.POSITIVE_INFINITY,
        none,
        Double.POSITIVE_INFINITY,
        none,
        Collections.nCopies(9, Double.NaN),
        Double.POSITIVE_INFINITY,
        none,
        box,
        0,
        Integral.Status.NOT_FINITE);
  }

  /** Area element, N, and the moments in units of the patch's size. */
  static List<Expression> integrands(PulledBackChart chart, Vector3 reference, double size) {
    VectorExpression normal = chart.areaVector();
    VectorExpression offset =
        chart
            .chart()
            .position()
            .minus(VectorExpression.of(reference))
            .times(Expression.number(1 / size));
    Expression halfSquare = Expression.number(0.5).times(offset.dot(offset));
    List<Expression> all = new ArrayList<>();
    all.add(FluxIntegrator.length(normal));
    addComponents(normal, all);
    addComponents(normal.times(offset.x()), all);
    addComponents(normal.times(offset.y()), all);
    addComponents(normal.times(offset.z()), all);
    addComponents(normal.times(halfSquare), all);
    return all;
  }

  private static void addComponents(VectorExpression vector, List<Expression> all) {
    all.add(vector.x());
    all.add(vector.y());
    all.add(vector.z());
  }

  private static PatchGeometry gathered(
      Sum[] sums,
      double[] errors,
      Vector3 reference,
      double size,
      Box3 box,
      long evaluations,
      Integral.Status status) {
    List<Double> moments = new ArrayList<>();
    for (int k = MOMENTS; k < SQUARES; k++) {
      moments.add(size * sums[k].getAsDouble());
    }
    return new PatchGeometry(
        sums[AREA].getAsDouble(),
        errors[AREA],
        vector(sums, VECTOR),
        largest(errors, VECTOR, MOMENTS),
        reference,
        moments,
        size * largest(errors, MOMENTS, SQUARES),
        vector(sums, SQUARES).times(size * size),
        box,
        evaluations,
        status);
  }

  private static Vector3 vector(Sum[] sums, int from) {
    return new Vector3(
        sums[from].getAsDouble(), sums[from + 1].getAsDouble(), sums[from + 2].getAsDouble());
  }

  private static double largest(double[] errors, int from, int to) {
    double largest = 0;
    for (int k = from; k < to; k++) {
      largest = Math.max(largest, errors[k]);
    }
    return largest;
  }
}
