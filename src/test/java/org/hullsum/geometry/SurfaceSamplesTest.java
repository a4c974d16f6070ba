package org.hullsum.geometry;

import static org.hullsum.geometry.Formulas.number;
import static org.hullsum.geometry.Formulas.point;
import static org.hullsum.geometry.Formulas.sin;
import static org.hullsum.geometry.Formulas.symbol;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SplittableRandom;
import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

/** Interior points for parity, and boxes around surfaces. */
class SurfaceSamplesTest {
  private static final Map<String, Double> NONE = Map.of();

  private static Surface cylinder() throws SurfaceFault {
    return new CylinderShape(
            point(0, 0, 0), point(0, 0, 10), number(2.5), Optional.empty(), Optional.empty())
        .surface(NONE);
  }

  @Test
  void samplesAreKeptSpreadAndClearOfEdges() throws SurfaceFault {
    Surface opened =
        new Trim(List.of(), List.of(new Body.Cylinder(point(0, 0, 5), point(0, 3, 5), number(1))))
            .trimmed(cylinder(), NONE);
    List<SurfaceSample> samples = SurfaceSamples.of(opened, NONE, 4);
    assertEquals(4, samples.size());
    for (int i = 0; i < samples.size(); i++) {
      Vector3 r = samples.get(i).at().position();
      assertTrue(r.y() < 0 || Math.hypot(r.x(), r.z() - 5) > 1.1, "kept " + r);
      assertTrue(r.z() > 0.5 && r.z() < 9.5, "away from the rims " + r);
      assertTrue(samples.get(i).clearance() > 0.3);
      for (int j = 0; j < i; j++) {
        assertTrue(samples.get(j).at().position().minus(r).norm() > 1, "spread");
      }
    }
    assertEquals(samples, SurfaceSamples.of(opened, NONE, 4));
  }

  @Test
  void samplesAreFoundOnASmallRemainder() throws SurfaceFault {
    Surface plug =
        new Trim(
                List.of(new Body.Cylinder(point(0, 0, 5), point(3, 0.1, 5), number(0.06))),
                List.of())
            .trimmed(cylinder(), NONE);
    List<SurfaceSample> samples = SurfaceSamples.of(plug, NONE, 3);
    assertFalse(samples.isEmpty());
    for (SurfaceSample sample : samples) {
      assertTrue(sample.clearance() < 0.1 && sample.clearance() > 0);
    }
  }

  @Test
  void nothingIsFoundWhereNothingIsKept() throws SurfaceFault {
    Surface none =
        new Trim(List.of(new Body.Sphere(point(100, 0, 0), number(1))), List.of())
            .trimmed(cylinder(), NONE);
    assertEquals(List.of(), SurfaceSamples.of(none, NONE, 3));
  }

  @Test
  void boxesContainWhatTheyEnclose() throws SurfaceFault {
    Surface wave =
        new GraphShape(
                GraphShape.Subject.Z,
                sin(symbol("x").times(symbol("y"))),
                new PlaneRegion.Box(Span.of(0, 2), Span.of(0, 3)))
            .surface(NONE);
    Box3 whole = Bounds.of(wave, NONE);
    assertEquals(-1, whole.z().low(), 0.3);
    assertEquals(1, whole.z().high(), 0.3);
    Chart chart = wave.charts().get(0);
    Bounds bounds = Bounds.of(chart, NONE);
    ChartEvaluator evaluator = ChartEvaluator.of(chart, NONE);
    SplittableRandom random = new SplittableRandom(4);
    for (int i = 0; i < 500; i++) {
      Interval u = Interval.hull(random.nextDouble(), random.nextDouble());
      Interval v = Interval.hull(random.nextDouble(), random.nextDouble());
      Box3 box = bounds.over(u, v);
      Vector3 r =
          evaluator
              .at(
                  random.nextDouble(u.low(), Math.nextUp(u.high())),
                  random.nextDouble(v.low(), Math.nextUp(v.high())),
                  evaluator.workspace())
              .position();
      assertTrue(box.contains(r) && whole.contains(r), "box " + i);
    }
  }
}
