package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.hullsum.closure.SewnAssemblies;
import org.hullsum.flux.Assemblies;
import org.hullsum.flux.Assemblies.Piece;
import org.hullsum.geometry.Surface;
import org.hullsum.model.Case;
import org.hullsum.model.Facing;
import org.hullsum.model.FluxStatement;
import org.hullsum.model.Patch;
import org.hullsum.model.PatchSurface;
import org.hullsum.model.StatedFlux;
import org.hullsum.model.Volume;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Place;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Random closed surfaces with random patches reversed, from the case to the findings. */
class OrientationBatteryTest {
  private static final long SPREAD = 0x9E3779B97F4A7C15L;
  private static final Place PLACE = Place.wholeFile("case.yaml");
  private static final Case EMPTY = Audits.text(new BoxCase().interior("").yaml());

  /** The faces of a box at its least and its largest x. */
  private static final int LEAST_X = 2;

  private static final int LARGEST_X = 3;

  static IntStream seeds() {
    return IntStream.rangeClosed(1, 200);
  }

  private static Patch patch(
      String name, String leaves, String enters, Surface surface, boolean asDrawn) {
    return new Patch(
        name,
        Optional.empty(),
        Optional.empty(),
        leaves,
        enters,
        Optional.of(new PatchSurface.Formulas(surface)),
        asDrawn ? new Facing.AsDrawn() : new Facing.Reversed(),
        List.of(
            new StatedFlux(new FluxStatement.None(), Optional.empty(), Optional.empty(), PLACE)),
        List.of(),
        PLACE,
        PLACE);
  }

  private static Set<String> found(CaseResult result, FindingCode code) {
    return result.findings().stream()
        .filter(f -> f.code() == code)
        .map(Finding::on)
        .flatMap(Optional::stream)
        .collect(Collectors.toCollection(TreeSet::new));
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void exactlyTheReversedPatchesAreNamed(int seed) {
    Random random = new Random(SPREAD * seed);
    List<Piece> pieces = new SewnAssemblies(random).next().pieces();
    double share = seed % 10 == 0 ? 1 : random.nextDouble();
    Set<String> reversed = new TreeSet<>();
    List<Patch> patches = new ArrayList<>();
    for (int k = 0; k < pieces.size(); k++) {
      boolean turn = random.nextDouble() < share;
      String name = "p" + k;
      boolean asDrawn = (pieces.get(k).outward() > 0) != turn;
      patches.add(patch(name, "box", Volume.SURROUNDINGS, pieces.get(k).surface(), asDrawn));
      if (turn) {
        reversed.add(name);
      }
    }
    CaseResult result = Audits.audit(Audits.with(EMPTY, patches));
    assertEquals(Optional.of(true), result.surfaces().get(0).closed());
    assertEquals(reversed, found(result, FindingCode.ORIENTATION_REVERSED));
    assertEquals(Set.of(), found(result, FindingCode.ORIENTATION_CONFLICT));
    assertEquals(Set.of(), found(result, FindingCode.SURFACE_OPEN));
    assertEquals(Set.of(), found(result, FindingCode.SURFACE_OVERLAP));
  }

  /**
   * A box without one of its faces.
   *
   * @param apart its index
   */
  private static void addBox(
      String volume, Vector3 low, Vector3 high, int apart, List<Patch> patches) {
    List<Piece> pieces = Assemblies.box(low, high).pieces();
    for (int k = 0; k < pieces.size(); k++) {
      if (k != apart) {
        Piece piece = pieces.get(k);
        patches.add(
            patch(volume + k, volume, Volume.SURROUNDINGS, piece.surface(), piece.outward() > 0));
      }
    }
  }

  @Test
  void sharedPatchWithBothVolumesOnOneSideIsAConflictAndOneBetweenThemIsNot() {
    for (int seed = 1; seed <= 30; seed++) {
      Random random = new Random(SPREAD * seed);
      double x = 0.5 + random.nextDouble();
      Vector3 high = new Vector3(x, 0.5 + random.nextDouble(), 0.5 + random.nextDouble());
      double depth = x * (0.2 + 0.6 * random.nextDouble());
      boolean sameSide = seed % 2 == 0;
      List<Patch> patches = new ArrayList<>();
      addBox("near", Vector3.ZERO, high, LARGEST_X, patches);
      if (sameSide) {
        addBox("far", new Vector3(x - depth, 0, 0), high, LARGEST_X, patches);
      } else {
        Vector3 end = new Vector3(x + depth, high.y(), high.z());
        addBox("far", new Vector3(x, 0, 0), end, LEAST_X, patches);
      }
      Piece between = Assemblies.box(Vector3.ZERO, high).pieces().get(LARGEST_X);
      patches.add(patch("shared", "near", "far", between.surface(), between.outward() > 0));
      CaseResult result =
          Audits.audit(Audits.with(Audits.withVolumes(EMPTY, "near", "far"), patches));
      assertEquals(
          sameSide ? Set.of("shared") : Set.of(),
          found(result, FindingCode.ORIENTATION_CONFLICT),
          "seed " + seed);
      assertTrue(found(result, FindingCode.ORIENTATION_REVERSED).isEmpty(), "seed " + seed);
    }
  }
}
