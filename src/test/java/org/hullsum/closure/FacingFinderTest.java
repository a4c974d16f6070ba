package org.hullsum.closure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.hullsum.closure.FoundFacing.Reason;
import org.hullsum.closure.FoundFacing.Side;
import org.hullsum.expression.Expression;
import org.hullsum.flux.Assemblies;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.flux.Assemblies.Piece;
import org.hullsum.geometry.Chart;
import org.hullsum.geometry.Surface;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

class FacingFinderTest {
  private static VolumeFacings find(List<Surface> surfaces) {
    return new FacingFinder(surfaces.stream().map(s -> PatchProbe.of(s, Map.of())).toList())
        .find(IntStream.range(0, surfaces.size()).boxed().toList());
  }

  private static List<Side> sides(VolumeFacings facings) {
    return facings.facings().stream().map(FoundFacing::side).toList();
  }

  /** The same surface with its construction normal turned: u and v exchanged. */
  static Surface turned(Surface surface) {
    List<Chart> charts =
        surface.charts().stream()
            .map(
                chart ->
                    new Chart(
                        chart.position().replace(Map.of(Chart.U, Chart.v(), Chart.V, Chart.u())),
                        chart.periodicV(),
                        chart.periodicU(),
                        Set.of()))
            .toList();
    return new Surface(surface.kind(), charts, surface.trim());
  }

  static Stream<Arguments> assembliesWithSeeds() {
    List<Arguments> all = new ArrayList<>();
    for (long seed = 31; seed <= 36; seed++) {
      Random random = new Random(seed);
      for (Assembly assembly : Assemblies.random(random)) {
        all.add(Arguments.of(assembly, seed));
        all.add(Arguments.of(Assemblies.moved(assembly, Assemblies.randomPlacement(random)), seed));
      }
      all.add(Arguments.of(Assemblies.branch(), seed));
    }
    return all.stream();
  }

  @ParameterizedTest(name = "{0}, seed {1}")
  @MethodSource("assembliesWithSeeds")
  void facingsAreFoundHoweverTheNormalsAreConstructed(Assembly assembly, long seed) {
    Random random = new Random(seed);
    List<Surface> surfaces = new ArrayList<>();
    List<Side> expected = new ArrayList<>();
    for (Piece piece : assembly.pieces()) {
      boolean turn = random.nextBoolean();
      surfaces.add(turn ? turned(piece.surface()) : piece.surface());
      expected.add((piece.outward() > 0) == turn ? Side.IN : Side.OUT);
    }
    VolumeFacings facings = find(surfaces);
    assertEquals(expected, sides(facings), "" + facings);
    assertTrue(facings.determined());
    assertEquals(List.of(), facings.overlaps());
  }

  @Test
  void allPatchesReversedAreAllFoundInward() {
    List<Surface> surfaces =
        Assemblies.can(1, -1, 2).pieces().stream().map(p -> turned(p.surface())).toList();
    assertEquals(List.of(Side.IN, Side.IN, Side.IN), sides(find(surfaces)));
  }

  @Test
  void cavityFacesIntoItself() {
    List<Surface> surfaces =
        Assemblies.shell(0.3, 1).pieces().stream().map(Piece::surface).toList();
    assertEquals(List.of(Side.OUT, Side.IN), sides(find(surfaces)));
  }

  @Test
  void wallBetweenTwoVolumesIsFoundOppositeInThem() {
    Assembly lower = Assemblies.box(new Vector3(0, 0, 0), new Vector3(1, 1, 1));
    Assembly upper = Assemblies.box(new Vector3(0, 0, 1), new Vector3(1, 1, 3));
    List<Surface> surfaces = new ArrayList<>();
    lower.pieces().forEach(p -> surfaces.add(p.surface()));
    upper.pieces().subList(1, 6).forEach(p -> surfaces.add(p.surface()));
    FacingFinder finder =
        new FacingFinder(surfaces.stream().map(s -> PatchProbe.of(s, Map.of())).toList());
    VolumeFacings below = finder.find(List.of(0, 1, 2, 3, 4, 5));
    VolumeFacings above = finder.find(List.of(1, 6, 7, 8, 9, 10));
    FoundFacing fromBelow = below.facings().get(1);
    FoundFacing fromAbove = above.facings().get(0);
    assertEquals(Side.OUT, fromBelow.side());
    assertEquals(Side.IN, fromAbove.side());
    assertTrue(fromBelow.fits(fromAbove));
    assertFalse(fromBelow.fits(fromBelow));
  }

  @Test
  void boxWithoutItsLidIsUndeterminedButLeansTheRightWay() {
    List<Surface> surfaces = new ArrayList<>();
    Assembly box = Assemblies.box(new Vector3(0, 0, 0), new Vector3(1, 1, 2));
    box.pieces().forEach(p -> surfaces.add(p.surface()));
    surfaces.remove(1);
    VolumeFacings facings = find(surfaces);
    FoundFacing bottom = facings.facings().get(0);
    assertEquals(Side.UNDETERMINED, bottom.side());
    assertEquals(Optional.of(Reason.OPEN_OR_COINCIDENT), bottom.reason());
    for (FoundFacing facing : facings.facings()) {
      if (facing.side() == Side.UNDETERMINED) {
        assertEquals(Optional.of(Side.OUT), facing.leaning(), "" + facing);
      }
    }
  }

  @Test
  void patchStatedTwiceIsAnOverlap() {
    List<Surface> surfaces = new ArrayList<>();
    Assembly can = Assemblies.can(1, 0, 1);
    can.pieces().forEach(p -> surfaces.add(p.surface()));
    surfaces.add(turned(can.pieces().get(2).surface()));
    VolumeFacings facings = find(surfaces);
    assertEquals(1, facings.overlaps().size());
    assertEquals(2, facings.overlaps().get(0).first());
    assertEquals(3, facings.overlaps().get(0).second());
    assertEquals(1, facings.overlaps().get(0).place().z(), 1e-9);
    assertEquals(Side.UNDETERMINED, facings.facings().get(2).side());
  }

  @Test
  void singleOpenDiskIsUndeterminedAndLeansNowhere() {
    FoundFacing facing =
        find(List.of(Assemblies.disk(Vector3.ZERO, Vector3.Z, 1))).facings().get(0);
    assertEquals(Side.UNDETERMINED, facing.side());
    assertEquals(Optional.of(Reason.OPEN_OR_COINCIDENT), facing.reason());
    assertEquals(Optional.empty(), facing.leaning());
  }

  /** A Möbius strip has no sides; its boundary is open. */
  @Test
  void moebiusStripIsUndetermined() {
    Expression angle = Expression.number(2 * Math.PI).times(Chart.u());
    Expression half = Expression.number(Math.PI).times(Chart.u());
    Expression across = Chart.v().minus(Expression.number(0.5));
    Expression ring =
        Expression.number(1)
            .plus(across.times(Expression.call(org.hullsum.expression.Function.COS, half)));
    Chart chart =
        new Chart(
            new org.hullsum.expression.VectorExpression(
                ring.times(Expression.call(org.hullsum.expression.Function.COS, angle)),
                ring.times(Expression.call(org.hullsum.expression.Function.SIN, angle)),
                across.times(Expression.call(org.hullsum.expression.Function.SIN, half))),
            false,
            false,
            Set.of(Chart.Side.V_START, Chart.Side.V_END));
    FoundFacing facing =
        find(List.of(new Surface("parametric", List.of(chart), Optional.empty()))).facings().get(0);
    assertEquals(Side.UNDETERMINED, facing.side());
  }

  @Test
  void twoTouchingBallsStatedAsOneVolumeAreBothOutward() {
    List<Surface> surfaces =
        List.of(Assemblies.sphere(Vector3.ZERO, 1), Assemblies.sphere(new Vector3(3, 0, 0), 1.5));
    assertEquals(List.of(Side.OUT, Side.OUT), sides(find(surfaces)));
  }

  /** Of two balls that run into each other the parts inside the other face the other way. */
  @Test
  void ballsThatRunIntoEachOtherHavePointsAtOdds() {
    List<Surface> surfaces =
        List.of(Assemblies.sphere(Vector3.ZERO, 1), Assemblies.sphere(new Vector3(0.3, 0, 0), 1));
    VolumeFacings facings = find(surfaces);
    assertTrue(
        facings.facings().stream()
            .anyMatch(f -> f.reason().equals(Optional.of(Reason.POINTS_AT_ODDS))),
        "" + facings);
  }

  /** A cap that is half a percent of its sphere, on the disk that closes it. */
  @Test
  void smallPartThatTheTrimLeavesIsFound() {
    double height = 0.99;
    org.hullsum.geometry.Body above =
        new org.hullsum.geometry.Body.HalfSpace(
            Assemblies.point(0, 0, height), Vector3.Z.negated());
    List<Surface> surfaces =
        List.of(
            Assemblies.trimmed(Assemblies.sphere(Vector3.ZERO, 1), List.of(above), List.of()),
            Assemblies.disk(new Vector3(0, 0, height), Vector3.Z, Math.sqrt(1 - height * height)));
    assertEquals(List.of(Side.OUT, Side.IN), sides(find(surfaces)));
  }
}
