package org.hullsum.closure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import org.hullsum.closure.FoundFacing.Side;
import org.hullsum.closure.WindingOpinion.Numbers;
import org.hullsum.flux.Assemblies;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.flux.Assemblies.Piece;
import org.hullsum.mesh.Meshes;
import org.hullsum.mesh.TriangleTree;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class SecondOpinionTest {
  /** Each patch by itself: no seam says anything. */
  private static List<Shell> apart(int patches) {
    List<Shell> shells = new ArrayList<>();
    for (int k = 0; k < patches; k++) {
      shells.add(new Shell(List.of(k), List.of(1), true, false, false));
    }
    return shells;
  }

  private static SecondOpinion on(List<Piece> pieces) {
    return SecondOpinion.on(
        pieces.stream().map(p -> PatchWinding.of(p.surface(), Map.of())).toList());
  }

  private static int[] outward(List<Piece> pieces) {
    return pieces.stream().mapToInt(Piece::outward).toArray();
  }

  private static List<Side> sides(WindingOpinion opinion) {
    return opinion.votes().stream().map(WindingOpinion.Vote::side).toList();
  }

  private static List<Side> expected(List<Piece> pieces) {
    return pieces.stream().map(p -> p.outward() > 0 ? Side.OUT : Side.IN).toList();
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18, 19, 20})
  void closedAssembliesFitTheirFacingsAndFindThemAlone(long seed) {
    Assembly assembly = new SewnAssemblies(new Random(seed)).next();
    List<Piece> pieces = assembly.pieces();
    WindingOpinion opinion = on(pieces).of(apart(pieces.size()), outward(pieces));
    assertEquals(pieces.size(), opinion.numbers().orElseThrow().size(), assembly.name());
    for (Numbers numbers : opinion.numbers().orElseThrow()) {
      assertTrue(numbers.fit(), assembly.name() + " " + numbers);
      assertEquals(1, numbers.inside(), numbers.error() + 1e-9);
      assertEquals(0, numbers.outside(), numbers.error() + 1e-9);
    }
    int decided = 0;
    for (int k = 0; k < pieces.size(); k++) {
      Side side = opinion.votes().get(k).side();
      decided += side == Side.UNDETERMINED ? 0 : 1;
      assertTrue(
          side == Side.UNDETERMINED || side == expected(pieces).get(k),
          assembly.name() + " " + k + " " + opinion.votes().get(k));
    }
    assertTrue(decided >= 0.8 * pieces.size(), decided + " of " + pieces.size() + assembly);
  }

  @Test
  void cavityFacesIntoItself() {
    List<Piece> shell = Assemblies.shell(0.3, 1).pieces();
    WindingOpinion opinion = on(shell).of(apart(2), outward(shell));
    assertEquals(List.of(Side.OUT, Side.IN), sides(opinion));
    assertTrue(opinion.numbers().orElseThrow().stream().allMatch(Numbers::fit));
  }

  @Test
  void wrongFacingIsToldWithItsNumbersAndNotBlamedOnItsNeighbours() {
    List<Piece> box = Assemblies.box(new Vector3(-1, -1, -1), new Vector3(1, 1, 1)).pieces();
    int[] signs = outward(box);
    signs[2] = -signs[2];
    WindingOpinion opinion = on(box).of(apart(6), signs);
    List<Numbers> numbers = opinion.numbers().orElseThrow();
    assertTrue(numbers.stream().anyMatch(n -> !n.fit()), "" + numbers);
    assertEquals(expected(box), sides(opinion));
  }

  @Test
  void boxWithoutItsLidIsToldAlone() {
    List<Piece> box = new ArrayList<>();
    box.addAll(Assemblies.box(new Vector3(0, 0, 0), new Vector3(1, 1, 2)).pieces());
    box.remove(1);
    WindingOpinion opinion = on(box).of(apart(5), new int[5]);
    assertEquals(Optional.empty(), opinion.numbers());
    assertEquals(expected(box), sides(opinion));
  }

  @Test
  void openAssembliesAreNeverToldWrongly() {
    int decided = 0;
    int patches = 0;
    for (long seed = 1; seed <= 40; seed++) {
      Random random = new Random(seed);
      Assembly assembly = new SewnAssemblies(random).next();
      List<Piece> open = new ArrayList<>(assembly.pieces());
      open.remove(random.nextInt(open.size()));
      List<Side> sides = sides(on(open).of(apart(open.size()), new int[open.size()]));
      for (int k = 0; k < open.size(); k++) {
        boolean told = sides.get(k) != Side.UNDETERMINED;
        assertTrue(
            !told || sides.get(k) == expected(open).get(k),
            assembly.name() + ", seed " + seed + ", patch " + k);
        decided += told ? 1 : 0;
        patches++;
      }
    }
    assertTrue(decided > 0.7 * patches, decided + " of " + patches);
  }

  @Test
  void singleDiskHasNoInside() {
    List<Piece> disk = List.of(new Piece(Assemblies.disk(Vector3.ZERO, Vector3.Z, 1), 1));
    assertEquals(List.of(Side.UNDETERMINED), sides(on(disk).of(apart(1), new int[1])));
  }

  @Test
  void patchesPulledApartAreToldAlone() {
    // A cube of plates that meet nowhere: each a tenth of its side away from the next.
    List<PatchWinding> shrunk = new ArrayList<>();
    Vector3[][] cube = Meshes.box(new Vector3(-1, -1, -1), new Vector3(1, 1, 1));
    List<Side> sides = new ArrayList<>();
    Random random = new Random(8);
    for (int f = 0; f < 6; f++) {
      boolean turn = random.nextBoolean();
      Vector3 middle = cube[2 * f][0].plus(cube[2 * f][2]).times(0.5);
      Vector3[][] face = {cube[2 * f].clone(), cube[2 * f + 1].clone()};
      for (Vector3[] t : face) {
        for (int k = 0; k < 3; k++) {
          t[k] = middle.plus(t[k].minus(middle).times(0.9));
        }
      }
      Vector3[][] given = turn ? Meshes.turned(face, new boolean[] {true, true}) : face;
      shrunk.add(PatchWinding.of(TriangleTree.of(Meshes.of(given))));
      sides.add(turn ? Side.IN : Side.OUT);
    }
    assertEquals(sides, sides(SecondOpinion.on(shrunk).of(apart(6), new int[6])));
  }

  @Test
  void narrowGapBetweenSheetsIsLookedInto() {
    // Two plates of a box of one hundredth of its width.
    List<Piece> box = Assemblies.box(Vector3.ZERO, new Vector3(1, 1, 0.01)).pieces();
    WindingOpinion opinion = on(box).of(apart(6), outward(box));
    assertTrue(opinion.numbers().orElseThrow().stream().allMatch(Numbers::fit));
    assertEquals(6, opinion.numbers().orElseThrow().size());
    List<Piece> balls = Assemblies.shell(0.98, 1).pieces();
    WindingOpinion thin = on(balls).of(apart(2), outward(balls));
    assertTrue(thin.numbers().orElseThrow().stream().allMatch(Numbers::fit), "" + thin);
    assertEquals(2, thin.numbers().orElseThrow().size());
    assertEquals(List.of(Side.OUT, Side.IN), sides(thin));
  }

  @Test
  void groupsTurnTogether() {
    List<Piece> box = Assemblies.box(Vector3.ZERO, new Vector3(1, 1, 1)).pieces();
    int[] signs = outward(box);
    List<Integer> mixed = new ArrayList<>();
    for (int k = 0; k < 6; k++) {
      mixed.add(-signs[k]);
    }
    Shell group = new Shell(List.of(0, 1, 2, 3, 4, 5), mixed, true, true, false);
    assertEquals(expected(box), sides(on(box).of(List.of(group), signs)));
    int[] all = Arrays.stream(signs).map(s -> -s).toArray();
    assertFalse(
        on(box).of(List.of(group), all).numbers().orElseThrow().stream().allMatch(Numbers::fit));
  }
}
