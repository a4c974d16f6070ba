package org.hullsum.flux;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.IntervalEvaluator;
import org.hullsum.geometry.Bounds;
import org.hullsum.geometry.Chart;
import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;

/** The kept part of a chart. Not thread-safe. */
final class ChartDomain implements HazardDomain {
  /** Distances of the points of an approach in u and v. */
  private static final double[] DISTANCES = {0x1p-8, 0x1p-12, 0x1p-16, 0x1p-20, 0x1p-24};

  private static final int SIDES = 8;

  private final Bounds bounds;
  private final Optional<IntervalEvaluator> trim;
  private final Optional<IntervalEvaluator.Workspace> trimWorkspace;
  private final FormulaIntegrand points;

  ChartDomain(PulledBackChart chart, Map<String, Double> values) {
    this.bounds = Bounds.of(chart.chart(), values);
    this.trim =
        chart
            .trim()
            .map(
                condition ->
                    IntervalEvaluator.compile(
                        List.of(Chart.U, Chart.V), values, List.of(condition)));
    this.trimWorkspace = trim.map(IntervalEvaluator::workspace);
    this.points =
        new FormulaIntegrand(
            List.of(
                chart.chart().position().x(),
                chart.chart().position().y(),
                chart.chart().position().z(),
                chart.trimmed(org.hullsum.expression.Expression.number(1))),
            values);
  }

  @Override
  public Interval[] root() {
    return new Interval[] {Interval.UNIT, Interval.UNIT};
  }

  @Override
  public Interval[] space(Interval[] box) {
    Box3 range = bounds.over(box[0], box[1]);
    return new Interval[] {range.x(), range.y(), range.z()};
  }

  @Override
  public Standing standing(Interval[] box) {
    if (trim.isEmpty()) {
      return Standing.INSIDE;
    }
    Interval[] kept = new Interval[1];
    trim.get().evaluate(box, kept, trimWorkspace.orElseThrow());
    if (!kept[0].contains(1)) {
      return Standing.OUTSIDE;
    }
    return kept[0].contains(0) ? Standing.PARTLY : Standing.INSIDE;
  }

  @Override
  public Vector3 place(Interval[] box) {
    return position(box[0].middle(), box[1].middle());
  }

  private Vector3 position(double u, double v) {
    double[][] row = at(u, v);
    return new Vector3(row[0][0], row[1][0], row[2][0]);
  }

  private double[][] at(double u, double v) {
    double[][] row = new double[4][1];
    points.evaluate(1, new double[] {u}, new double[] {v}, row);
    return row;
  }

  @Override
  public List<List<Vector3>> approaches(Interval[] box, Standing standing) {
    double u = box[0].middle();
    double v = box[1].middle();
    List<List<Vector3>> approaches = new ArrayList<>();
    for (int side = 0; side < SIDES; side++) {
      double angle = 2 * Math.PI * (side + 0.3) / SIDES;
      double farU = u + DISTANCES[0] * Math.cos(angle);
      double farV = v + DISTANCES[0] * Math.sin(angle);
      if (Interval.UNIT.contains(farU)
          && Interval.UNIT.contains(farV)
          && at(farU, farV)[3][0] != 0) {
        List<Vector3> approach = new ArrayList<>();
        for (double distance : DISTANCES) {
          approach.add(position(u + distance * Math.cos(angle), v + distance * Math.sin(angle)));
        }
        approaches.add(approach);
      }
    }
    return approaches;
  }
}
