package org.hullsum.closure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.Random;
import org.hullsum.expression.VectorExpression;
import org.hullsum.flux.Assemblies;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.flux.Assemblies.Piece;
import org.hullsum.geometry.Body;
import org.hullsum.geometry.Surface;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PatchWindingTest {
  private static PatchWinding.Value of(Surface surface, Vector3 point) {
    return PatchWinding.of(surface, Map.of()).at(point);
  }

  private static void agrees(double expected, PatchWinding.Value value, double largest) {
    assertTrue(value.error() <= largest, "" + value);
    assertEquals(expected, value.number(), value.error(), "" + value);
  }

  /** Share of the full sphere that a disk takes, seen from a point on its axis. */
  private static double disk(double radius, double height) {
    return 0.5 * (1 - height / Math.hypot(height, radius));
  }

  @Test
  void diskIsSeenUnderItsSolidAngle() {
    Surface disk = Assemblies.disk(Vector3.ZERO, Vector3.Z, 0.7);
    for (double height : new double[] {0.05, 0.3, 1, 4}) {
      agrees(disk(0.7, height), of(disk, new Vector3(0, 0, -height)), 2e-3);
      agrees(-disk(0.7, height), of(disk, new Vector3(0, 0, height)), 2e-3);
    }
  }

  @Test
  void roundHoleInAPlateTakesAwayItsOwnAngle() {
    Surface plate =
        Assemblies.rectangle(new Vector3(-1, -1, 0), Vector3.X.times(2), Vector3.Y.times(2));
    for (double radius : new double[] {0.02, 0.2, 0.6}) {
      Body hole =
          new Body.Cylinder(
              Assemblies.point(0, 0, -1), Assemblies.point(0, 0, 1), Assemblies.number(radius));
      Surface drilled = Assemblies.trimmed(plate, List.of(), List.of(hole));
      for (double height : new double[] {0.1, 0.5, 1}) {
        Vector3 below = new Vector3(0, 0, -height);
        // A square of side 2a at the height h: 4 atan(a² / (h √(2a² + h²))).
        double square = Math.atan(1 / (height * Math.sqrt(2 + height * height))) / Math.PI;
        agrees(square - disk(radius, height), of(drilled, below), 1e-3);
      }
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18})
  void closedAssembliesAreWoundOnceInsideAndNotOutside(long seed) {
    Random random = new Random(seed);
    Assembly assembly = new SewnAssemblies(random).next();
    List<PatchWinding> patches =
        assembly.pieces().stream().map(p -> PatchWinding.of(p.surface(), Map.of())).toList();
    int told = 0;
    int inside = 0;
    for (int k = 0; k < 60; k++) {
      Vector3 p =
          new Vector3(
              1.2 * random.nextGaussian(), 1.2 * random.nextGaussian(), random.nextGaussian());
      double sum = 0;
      double error = 0;
      for (int i = 0; i < patches.size(); i++) {
        Piece piece = assembly.pieces().get(i);
        PatchWinding.Value value = patches.get(i).at(p);
        sum += piece.outward() * value.number();
        error += value.error();
      }
      if (error < 0.2) {
        told++;
        inside += sum > 0.5 ? 1 : 0;
        assertEquals(Math.rint(sum), sum, error, assembly.name() + " " + p);
        assertTrue(Math.rint(sum) == 0 || Math.rint(sum) == 1, sum + " " + assembly.name());
      }
    }
    assertTrue(told > 45, told + " of " + assembly.name());
    assertTrue(inside < told);
  }

  @Test
  void wholeSphereIsOneInsideAndRefinedItIsSurer() {
    PatchWinding sphere = PatchWinding.of(Assemblies.sphere(Vector3.ZERO, 1), Map.of());
    agrees(1, sphere.at(new Vector3(0.2, 0.1, 0)), 2e-3);
    agrees(0, sphere.at(new Vector3(0.9, 0.9, 0.9)), 2e-2);
    PatchWinding finer = sphere.refined(0.1);
    assertTrue(finer.deviation() < 0.1 * sphere.deviation());
    Vector3 near = new Vector3(0, -0.99, 0.01);
    assertTrue(finer.at(near).error() < 0.5 * sphere.at(near).error());
    agrees(1, finer.at(near), 0.05);
    // Between the sphere and its triangles nothing is known.
    assertEquals(Double.POSITIVE_INFINITY, sphere.at(new Vector3(0, -1, 0)).error());
  }

  @Test
  void surfaceWithoutFinitePositionsHasNoValue() {
    VectorExpression broken =
        Assemblies.point(0, 0, 0)
            .plus(
                new VectorExpression(
                    Assemblies.number(1).over(Assemblies.number(0)),
                    Assemblies.number(0),
                    Assemblies.number(0)));
    Surface plate = Assemblies.rectangle(Vector3.ZERO, Vector3.X, Vector3.Y);
    Surface nowhere =
        new Surface(
            "parametric",
            List.of(new org.hullsum.geometry.Chart(broken, false, false, java.util.Set.of())),
            plate.trim());
    PatchWinding winding = PatchWinding.of(nowhere, Map.of());
    assertEquals(0, winding.area());
    assertEquals(Double.POSITIVE_INFINITY, winding.deviation());
  }
}
