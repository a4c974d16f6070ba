package org.hullsum.closure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.stream.IntStream;
import org.hullsum.expression.VectorExpression;
import org.hullsum.flux.Assemblies;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.flux.Assemblies.Piece;
import org.hullsum.flux.PatchGeometry;
import org.hullsum.flux.PulledBackSurface;
import org.hullsum.geometry.Body;
import org.hullsum.geometry.Surface;
import org.hullsum.geometry.SurfaceSums;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class SeamFinderTest {
  /** Spreads small seeds, of which the platform's generator makes much the same first number. */
  private static final long SPREAD = 0x9E3779B97F4A7C15L;

  private static List<PatchRims> rims(List<Piece> pieces) {
    return pieces.stream().map(p -> PatchRims.of(p.surface(), Map.of())).toList();
  }

  /** ⅓ ∬ r · n dS by construction normals. */
  private static double[] volumes(List<Piece> pieces) {
    return pieces.stream().mapToDouble(p -> volume(p.surface())).toArray();
  }

  private static double volume(Surface surface) {
    if (surface.trim().isEmpty()) {
      return SurfaceSums.volume(surface, Map.of(), Vector3.ZERO);
    }
    PatchGeometry geometry = PatchGeometry.of(PulledBackSurface.of(surface), Map.of(), 6);
    List<Double> moments = geometry.moments();
    double trace = moments.get(0) + moments.get(4) + moments.get(8);
    return (trace + geometry.reference().dot(geometry.vectorArea())) / 3;
  }

  static IntStream seeds() {
    return IntStream.rangeClosed(1, 210);
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void randomAssemblyIsSewnAndARemovedPatchLeavesItsBoundary(int seed) {
    Random random = new Random(seed * SPREAD);
    Assembly assembly = new SewnAssemblies(random).next();
    List<PatchRims> rims = rims(assembly.pieces());
    assertSewnAndTurnedOutward(assembly, rims);
    assertRimsAreTheBoundary(assembly, rims, random.nextInt(rims.size()));
  }

  private static void assertSewnAndTurnedOutward(Assembly assembly, List<PatchRims> rims) {
    Seams seams = new SeamFinder(rims).find(new int[rims.size()]);
    assertEquals(List.of(), seams.gaps(), assembly.name());
    assertTrue(seams.close(), assembly.name());
    List<Shell> shells =
        ShellFinder.shells(
            rims.size(),
            seams,
            volumes(assembly.pieces()),
            (shell, patch) -> assembly.name().equals("nested") && patch > 0);
    for (Shell shell : shells) {
      assertTrue(shell.oriented(), assembly.name());
      List<Integer> outward =
          shell.patches().stream().map(p -> assembly.pieces().get(p).outward()).toList();
      assertEquals(outward, shell.signs(), assembly.name());
    }
  }

  private static void assertRimsAreTheBoundary(
      Assembly assembly, List<PatchRims> rims, int removed) {
    List<Piece> left = new ArrayList<>(assembly.pieces());
    Piece taken = left.remove(removed);
    List<PatchRims> rest = new ArrayList<>(rims);
    PatchRims own = rest.remove(removed);
    List<Gap> gaps =
        new SeamFinder(rest).find(left.stream().mapToInt(Piece::outward).toArray()).gaps();
    Sums found = new Sums();
    for (Gap gap : gaps) {
      assertTrue(gap.whole(), assembly.name());
      found.length += gap.length();
      found.centre = found.centre.plus(gap.centre().times(gap.length()));
      found.area = found.area.plus(gap.vectorArea());
    }
    Sums expected = new Sums();
    own.rims().forEach(rim -> rim.walk(0, rim.length(), expected::add));
    double size = own.size();
    String name = assembly.name() + ", patch " + removed;
    assertEquals(expected.length, found.length, 1e-7 * size, name);
    double shift = found.centre.minus(expected.centre).norm();
    assertEquals(0, shift, 1e-7 * size * (1 + found.length), name);
    Vector3 outward = expected.area.times(0.5 * taken.outward());
    assertEquals(0, found.area.minus(outward).norm(), 1e-7 * size * size, name);
    PatchGeometry geometry = PatchGeometry.of(PulledBackSurface.of(taken.surface()), Map.of(), 8);
    Vector3 integrated = geometry.vectorArea().times(taken.outward());
    assertEquals(0, found.area.minus(integrated).norm(), 2e-7 * size * size, name);
  }

  private static final class Sums {
    private double length;
    private Vector3 centre = Vector3.ZERO;
    private Vector3 area = Vector3.ZERO;

    void add(Vector3 position, Vector3 step) {
      length += step.norm();
      centre = centre.plus(position.times(step.norm()));
      area = area.plus(position.cross(step));
    }
  }

  @Test
  void branchOnAShellIsSewnAlongTheirCurve() {
    Seams seams = new SeamFinder(rims(Assemblies.branch().pieces())).find(new int[5]);
    assertTrue(seams.close());
    assertEquals(4, seams.seams().size());
    assertTrue(seams.slack() < 1e-8, "slack " + seams.slack());
  }

  @Test
  void cubeWithSixEqualHolesHasSixRims() {
    List<Piece> pieces = new ArrayList<>();
    for (int axis = 0; axis < 3; axis++) {
      for (int sign : new int[] {1, -1}) {
        pieces.add(new Piece(faceWithHole(axis, sign), 1));
      }
    }
    Seams seams = new SeamFinder(rims(pieces)).find(new int[] {1, 1, 1, 1, 1, 1});
    assertFalse(seams.close());
    assertEquals(6, seams.gaps().size());
    for (Gap gap : seams.gaps()) {
      assertEquals(2 * Math.PI * 0.3, gap.length(), 1e-8);
      assertEquals(Math.PI * 0.09, gap.vectorArea().norm(), 1e-8);
      assertEquals(1, gap.vectorArea().unit().dot(gap.centre().unit()), 1e-12);
      assertEquals(1, gap.centre().norm(), 1e-8);
    }
  }

  private static Surface faceWithHole(int axis, int sign) {
    Vector3[] axes = {Vector3.X, Vector3.Y, Vector3.Z};
    Vector3 normal = axes[axis].times(sign);
    Vector3 a = axes[(axis + 1) % 3].times(2);
    Vector3 b = axes[(axis + 2) % 3].times(2 * sign);
    Vector3 corner = normal.minus(a.times(0.5)).minus(b.times(0.5));
    Body bore =
        new Body.Cylinder(
            VectorExpression.of(normal.times(0.5)),
            VectorExpression.of(normal.times(1.5)),
            Assemblies.number(0.3));
    return Assemblies.trimmed(Assemblies.rectangle(corner, a, b), List.of(), List.of(bore));
  }
}
