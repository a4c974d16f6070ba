package org.hullsum.closure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.stream.IntStream;
import org.hullsum.flux.Assemblies;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.flux.Assemblies.Piece;
import org.hullsum.flux.PatchGeometry;
import org.hullsum.flux.PulledBackSurface;
import org.hullsum.geometry.Surface;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class SeamFinderTest {
  static List<PatchRims> rims(List<Piece> pieces) {
    return pieces.stream().map(p -> PatchRims.of(p.surface(), Map.of())).toList();
  }

  static double[] volumes(List<Piece> pieces) {
    return pieces.stream().mapToDouble(p -> volume(p.surface())).toArray();
  }

  private static double volume(Surface surface) {
    PatchGeometry geometry = PatchGeometry.of(PulledBackSurface.of(surface), Map.of(), 6);
    double trace =
        geometry.moments().get(0) + geometry.moments().get(4) + geometry.moments().get(8);
    return (trace + geometry.reference().dot(geometry.vectorArea())) / 3;
  }

  static IntStream seeds() {
    return IntStream.range(0, 220);
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void randomAssembliesAreSewnWithoutGapsAndEveryPatchIsTurnedOutward(int seed) {
    Assembly assembly = new SewnAssemblies(new Random(seed)).next();
    Seams seams = new SeamFinder(rims(assembly.pieces())).find(new int[assembly.pieces().size()]);
    assertEquals(List.of(), seams.gaps(), assembly.name());
    assertTrue(seams.close(), assembly.name());
    List<Shell> shells =
        ShellFinder.shells(
            assembly.pieces().size(),
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

  @ParameterizedTest
  @MethodSource("seeds")
  void rimOfARemovedPatchIsItsBoundary(int seed) {
    Random random = new Random(1000 + seed);
    Assembly assembly = new SewnAssemblies(random).next();
    int removed = random.nextInt(assembly.pieces().size());
    List<Piece> left = new ArrayList<>(assembly.pieces());
    Piece taken = left.remove(removed);
    int[] signs = left.stream().mapToInt(Piece::outward).toArray();
    List<Gap> gaps = new SeamFinder(rims(left)).find(signs).gaps();
    PatchRims own = PatchRims.of(taken.surface(), Map.of());
    double length = 0;
    Vector3 centre = Vector3.ZERO;
    Vector3 area = Vector3.ZERO;
    for (Gap gap : gaps) {
      assertTrue(gap.whole(), assembly.name());
      length += gap.length();
      centre = centre.plus(gap.centre().times(gap.length()));
      area = area.plus(gap.vectorArea());
    }
    Sums expected = new Sums();
    own.rims().forEach(rim -> rim.walk(0, rim.length(), expected::add));
    double size = own.size();
    assertEquals(expected.length, length, 1e-7 * size, assembly.name());
    assertEquals(
        0, centre.minus(expected.centre).norm(), 1e-7 * size * (1 + length), assembly.name());
    Vector3 outward = expected.area.times(0.5 * taken.outward());
    assertEquals(0, area.minus(outward).norm(), 1e-7 * size * size, assembly.name());
    if (!own.rims().isEmpty()) {
      PatchGeometry geometry = PatchGeometry.of(PulledBackSurface.of(taken.surface()), Map.of(), 8);
      Vector3 integrated = geometry.vectorArea().times(taken.outward());
      assertEquals(0, area.minus(integrated).norm(), 2e-7 * size * size, assembly.name());
    }
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

  @org.junit.jupiter.api.Test
  void branchOnAShellIsSewnAlongTheirCurve() {
    Seams seams = new SeamFinder(rims(Assemblies.branch().pieces())).find(new int[5]);
    assertTrue(seams.close());
    assertEquals(4, seams.seams().size());
    assertTrue(seams.slack() < 1e-8, "slack " + seams.slack());
  }
}
