package org.hullsum.flux;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Map;
import java.util.Random;
import java.util.stream.Stream;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.flux.Assemblies.Piece;
import org.hullsum.geometry.Surface;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class PatchGeometryTest {
  private static final int DIGITS = 10;
  private static final double ACCURACY = 1e-10;

  private static PatchGeometry geometry(Surface surface) {
    return PatchGeometry.of(PulledBackSurface.of(surface), Map.of(), DIGITS);
  }

  static Stream<Assembly> assemblies() {
    return Stream.of(11L, 12L, 13L)
        .flatMap(seed -> Assemblies.random(new Random(seed)).stream())
        .toList()
        .stream();
  }

  @ParameterizedTest
  @MethodSource("assemblies")
  void closedSurfaceHasNoVectorAreaAndItsVolumeInEveryMoment(Assembly assembly) {
    Vector3 closure = Vector3.ZERO;
    double area = 0;
    double[] moments = new double[9];
    for (Piece piece : assembly.pieces()) {
      PatchGeometry g = geometry(piece.surface());
      area += g.area();
      closure = closure.plus(g.vectorArea().times(piece.outward()));
      for (int i = 0; i < 3; i++) {
        for (int j = 0; j < 3; j++) {
          moments[3 * i + j] +=
              piece.outward()
                  * (g.moments().get(3 * i + j)
                      + g.reference().component(i) * g.vectorArea().component(j));
        }
      }
    }
    assertEquals(0, closure.norm(), ACCURACY * area, assembly.name());
    double volume = (moments[0] + moments[4] + moments[8]) / 3;
    for (int k = 0; k < 9; k++) {
      double expected = k % 4 == 0 ? volume : 0;
      assertEquals(expected, moments[k], 3 * ACCURACY * area, assembly.name() + " moment " + k);
    }
    if (Double.isFinite(assembly.volume())) {
      assertEquals(assembly.volume(), volume, ACCURACY * assembly.volume(), assembly.name());
    }
  }

  @Test
  void torusHasItsArea() {
    PatchGeometry g = geometry(Assemblies.torus(2, 0.5).pieces().get(0).surface());
    double exact = 4 * Math.PI * Math.PI * 2 * 0.5;
    assertEquals(exact, g.area(), ACCURACY * exact);
    assertTrue(Math.abs(g.area() - exact) <= g.areaError());
  }

  @Test
  void momentsOfAPatchFarAwayKeepTheirDigits() {
    Vector3 far = new Vector3(3e6, -2e6, 5e6);
    PatchGeometry g = geometry(Assemblies.disk(far, new Vector3(1, 2, 2), 0.5));
    assertEquals(Math.PI / 4, g.area(), 1e-9);
    for (double moment : g.moments()) {
      assertEquals(0, moment, 1e-9);
    }
    assertEquals(0, g.reference().minus(far).norm(), 1e-8);
  }
}
