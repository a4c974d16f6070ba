package org.hullsum.audit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.hullsum.problem.FindingCode;
import org.junit.jupiter.api.Test;

class OutwardFacingTest {
  private static final List<String> FACES =
      List.of("left", "right", "front", "back", "floor", "lid");

  private static BoxCase drawnInward() {
    BoxCase box = new BoxCase();
    FACES.forEach(face -> box.patch(face, "    facing: outward\n"));
    // Drawn the other way round.
    return box.surface("lid", "{rectangle: {corner: [0, 0, 1], edges: [[0, 3, 0], [2, 0, 0]]}}")
        .surface("left", "{rectangle: {corner: [0, 0, 0], edges: [[0, 3, 0], [0, 0, 1]]}}");
  }

  @Test
  void patchesThatAreToFaceOutwardDoSoHoweverTheyAreDrawn() {
    CaseResult sound = Audits.audit(new BoxCase().yaml());
    CaseResult turned = Audits.audit(drawnInward().yaml());
    assertEquals(Optional.of(Verdict.BALANCED), turned.verdict());
    assertTrue(turned.findings().isEmpty(), () -> turned.findings().toString());
    for (int p = 0; p < FACES.size(); p++) {
      PatchResult patch = turned.patches().get(p);
      assertEquals("outward", patch.declaredFacing());
      assertEquals(Optional.of(PatchResult.FoundFacing.OUTWARD), patch.foundFacing());
      assertEquals(sound.patches().get(p).vectorArea(), patch.vectorArea());
      assertEquals(sound.patches().get(p).fluxes().get(0).value(), patch.fluxes().get(0).value());
    }
  }

  @Test
  void sharedPatchFacesOutOfTheVolumeThatItLeaves() {
    StringBuilder text = new StringBuilder("format: hullsum-case/1\nunits: none\n");
    text.append("fields:\n  flow: {vector: [\"1\", \"0\", \"0\"]}\n");
    text.append("volumes:\n  near: {}\n  far: {}\npatches:\n");
    plate(text, "inlet", "enters: near", 0, "[0, 0, 1], [0, 3, 0]");
    plate(text, "middle", "leaves: near\n    enters: far", 1, "[0, 0, 1], [0, 3, 0]");
    plate(text, "outlet", "leaves: far", 2, "[0, 0, 1], [0, 3, 0]");
    for (int k = 0; k < 2; k++) {
      String volume = k == 0 ? "near" : "far";
      wall(text, volume + "-front", volume, k + ", 0, 0", "[1, 0, 0], [0, 0, 1]");
      wall(text, volume + "-back", volume, k + ", 3, 0", "[1, 0, 0], [0, 0, 1]");
      wall(text, volume + "-floor", volume, k + ", 0, 0", "[1, 0, 0], [0, 3, 0]");
      wall(text, volume + "-lid", volume, k + ", 0, 1", "[1, 0, 0], [0, 3, 0]");
    }
    CaseResult result = Audits.audit(text.toString());
    assertEquals(Optional.of(Verdict.BALANCED), result.verdict(), result.findings().toString());
    assertTrue(
        result.findings().stream().noneMatch(f -> f.code() == FindingCode.ORIENTATION_REVERSED));
    for (int p = 0; p < 3; p++) {
      assertEquals(3, result.patches().get(p).fluxes().get(0).value().orElseThrow(), 1e-12);
    }
  }

  private static void plate(StringBuilder text, String name, String sides, int x, String edges) {
    text.append("  ").append(name).append(":\n    ").append(sides);
    text.append("\n    surface: {rectangle: {corner: [").append(x).append(", 0, 0], edges: [");
    text.append(edges).append("]}}\n    facing: outward\n    flux: {field: flow}\n");
  }

  private static void wall(
      StringBuilder text, String name, String volume, String corner, String edges) {
    text.append("  ").append(name).append(":\n    leaves: ").append(volume);
    text.append("\n    surface: {rectangle: {corner: [").append(corner).append("], edges: [");
    text.append(edges).append("]}}\n    facing: outward\n    flux: none\n");
  }

  @Test
  void whereOutwardCanNotBeToldWhatFollowsTheNormalIsNotKnown() {
    BoxCase alone = drawnInward();
    FACES.subList(0, 5).forEach(alone::without);
    CaseResult open = Audits.audit(alone.yaml());
    assertEquals(Optional.of(Verdict.UNDECIDED), open.verdict());
    assertTrue(
        open.findings().stream()
            .anyMatch(
                f -> f.code() == FindingCode.PATCH_DEGENERATE && f.message().contains("`outward`")),
        () -> open.findings().toString());
    PatchResult lid = open.patches().get(open.patches().size() - 1);
    assertEquals(Optional.of(PatchResult.FoundFacing.UNDETERMINED), lid.foundFacing());
    assertTrue(lid.fluxes().get(0).value().isEmpty());
  }
}
