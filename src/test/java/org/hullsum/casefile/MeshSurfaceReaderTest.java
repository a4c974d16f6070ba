package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.hullsum.mesh.MeshWeld;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.model.PatchSurface;
import org.hullsum.problem.Problem;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class MeshSurfaceReaderTest {
  private static final String PLATE =
      """
      solid plate
      facet normal 0 0 1
       outer loop
        vertex 0 0 0
        vertex 1000 0 0
        vertex 0 500 0
       endloop
      endfacet
      endsolid plate
      solid rib
      facet normal 0 1 0
       outer loop
        vertex 0 0 0
        vertex 1000 0 0
        vertex 0 0 500
       endloop
      endfacet
      endsolid rib
      """;

  @TempDir Path folder;

  private ReadOutcome read(String surface, List<Path> allowed) throws IOException {
    Files.createDirectories(folder.resolve("case"));
    Files.writeString(folder.resolve("case/plate.stl"), PLATE);
    Files.writeString(folder.resolve("elsewhere.stl"), PLATE);
    Files.writeString(folder.resolve("case/torn.stl"), PLATE.substring(0, 60));
    Path file = folder.resolve("case/case.yaml");
    Files.writeString(
        file,
        "format: hullsum-case/1\nquantity: volume\nvolumes: none\npatches:\n"
            + "  plate:\n    flux: none\n    surface: {"
            + surface
            + "}\n");
    return CaseReader.read(file, new ReadOptions("case.yaml", Map.of(), allowed, 1));
  }

  private String problem(String surface) throws IOException {
    List<Problem> problems = read(surface, List.of()).problems();
    assertEquals(1, problems.size(), problems::toString);
    return problems.get(0).place() + ": " + problems.get(0).message();
  }

  private static TriangleMesh mesh(ReadOutcome outcome) {
    PatchSurface surface = outcome.found().orElseThrow().patches().get(0).surface().orElseThrow();
    return ((PatchSurface.Triangles) surface).mesh();
  }

  @Test
  void coordinatesAreTakenInTheStatedUnitAndScale() throws IOException {
    ReadOutcome whole = read("mesh: {file: plate.stl, unit: mm, scale: 2}", List.of());
    assertEquals(2, mesh(whole).triangleCount());
    assertEquals(2.0, mesh(whole).high().x());
    assertEquals(2, whole.found().orElseThrow().sources().size());
    assertEquals("plate.stl", whole.found().orElseThrow().sources().get(1).file());
  }

  @Test
  void partIsTakenByItsName() throws IOException {
    TriangleMesh rib = mesh(read("mesh: {file: plate.stl, unit: m, part: rib}", List.of()));
    assertEquals(1, rib.triangleCount());
    assertEquals(500.0, rib.high().z());
    assertEquals(3, rib.vertexCount());
  }

  @Test
  void faultsNameTheirPlaceAndTheWayOut() throws IOException {
    assertTrue(problem("mesh: {file: plate.stl}").endsWith("write `unit`, such as `unit: mm`"));
    assertEquals(
        "case.yaml:7:28: there is no file `lid.stl` beside the case",
        problem("mesh: {file: lid.stl, unit: mm}"));
    assertEquals(
        "case.yaml:7:55: the file has no part `lid`; it has plate, rib",
        problem("mesh: {file: plate.stl, unit: mm, part: lid}"));
    assertEquals(
        "case.yaml:7:45: coordinates are lengths; s is none",
        problem("mesh: {file: plate.stl, unit: s}"));
    assertEquals(
        "case.yaml:7:56: `scale` is a number above 0; here is -1.0",
        problem("mesh: {file: plate.stl, unit: mm, scale: -1}"));
    assertTrue(
        problem("mesh: {file: torn.stl, unit: mm}").startsWith("case.yaml:7:28: torn.stl, line 5"));
    assertTrue(
        problem("mesh: {file: ../elsewhere.stl, unit: mm}").endsWith("with --allow-outside"));
    assertTrue(
        problem("mesh: {file: plate.stl, unit: mm}, placed: {move: [0, 0, 1]}")
            .contains("`placed` is for surfaces given by formulas"));
  }

  @Test
  void filesOutsideTheFolderAreReadWhereAllowed() throws IOException {
    ReadOutcome outcome = read("mesh: {file: ../elsewhere.stl, unit: m}", List.of(folder));
    assertEquals(2, mesh(outcome).triangleCount());
  }

  @Test
  void weldingIsDoneOnRequestAndOnlyWithinASmallLength() throws IOException {
    ReadOutcome outcome = read("mesh: {file: plate.stl, unit: mm, weld: 1 mm}", List.of());
    PatchSurface surface = outcome.found().orElseThrow().patches().get(0).surface().orElseThrow();
    MeshWeld weld = ((PatchSurface.Triangles) surface).weld().orElseThrow();
    assertEquals(new MeshWeld(0.001, 0, 0, 0), weld);
    for (String wrong : List.of("0 mm", "-1 mm", "50 mm")) {
      String problem = problem("mesh: {file: plate.stl, unit: mm, weld: " + wrong + "}");
      assertTrue(problem.startsWith("case.yaml:7:55: `weld` is a length above 0"), problem);
    }
    assertTrue(
        problem("mesh: {file: plate.stl, unit: mm, weld: 1 s}").startsWith("case.yaml:7:55"));
  }
}
