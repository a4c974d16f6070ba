package org.hullsum.cli;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.hullsum.mesh.MeshFault;
import org.hullsum.mesh.MeshFile;
import org.hullsum.mesh.Meshes;
import org.hullsum.mesh.TriangleMesh;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class OrientMeshTest {
  @TempDir Path folder;

  private static ProgramRun run(String... arguments) {
    return ProgramRun.of(new ReadAndAudit(), arguments);
  }

  private static String stl(String solid, Vector3[][] triangles) {
    StringBuilder text = new StringBuilder("solid " + solid + "\n");
    for (Vector3[] t : triangles) {
      text.append("facet normal 0 0 0\nouter loop\n");
      for (Vector3 p : t) {
        text.append("vertex " + p.x() + " " + p.y() + " " + p.z() + "\n");
      }
      text.append("endloop\nendfacet\n");
    }
    return text.append("endsolid\n").toString();
  }

  private Path caseOf(String patches) throws IOException {
    return Files.writeString(
        folder.resolve("ring.yaml"),
        "format: hullsum-case/1\nquantity: volume\n"
            + "fields:\n  flow: {vector: [x*(0.1 1/s), y*(0.2 1/s), \"0.3 m/s\"], unit: m/s}\n"
            + "volumes:\n  ring: {interior: {divergence-of: flow}}\npatches:\n"
            + patches);
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5, 6})
  void trianglesAgainstTheOthersAreTurnedInACopy(int seed) throws IOException, MeshFault {
    Random random = new Random(0x9E3779B97F4A7C15L * seed);
    Vector3[][] sound = Meshes.torus(2, 0.5, 12, 9);
    boolean[] turn = new boolean[sound.length];
    double share = seed < 4 ? 0.2 : 0.8;
    for (int k = 0; k < turn.length; k++) {
      turn[k] = random.nextDouble() < share;
    }
    String original = stl("ring main", Meshes.turned(sound, turn));
    Files.writeString(folder.resolve("ring.v2.stl"), original);
    Path file =
        caseOf(
            """
              skin:
                leaves: ring # all of it
                surface: {mesh: {file: 'ring.v2.stl', unit: m}} # as exported
                flux: {field: flow}
            """);
    String before = Files.readString(file);
    assertEquals(10, run("audit", file.toString()).status());
    ProgramRun orient = run("orient", file.toString());
    assertEquals(0, orient.status(), orient.out() + orient.err());
    assertEquals(original, Files.readString(folder.resolve("ring.v2.stl")));
    assertEquals(before, Files.readString(file));
    String after = Files.readString(folder.resolve("ring-oriented.yaml"));
    String expected = before.replace("'ring.v2.stl'", "'ring-oriented.obj'");
    if (share > 0.5) {
      // Most face inward: the few are turned, then the patch.
      expected = expected.replace("    surface:", "    facing: reversed\n    surface:");
    }
    assertEquals(expected, after);
    assertEquals(0, run("audit", folder.resolve("ring-oriented.yaml").toString()).status());
    TriangleMesh copy = MeshFile.read(folder.resolve("ring-oriented.obj"), 1).build(1);
    assertEquals(List.of("ring main"), copy.parts());
    assertEquals(sound.length, copy.triangleCount());
    for (int t = 0; t < sound.length; t++) {
      boolean asSound = share < 0.5;
      Vector3 area = Meshes.of(new Vector3[][] {sound[t]}).areaVector(0);
      assertEquals(asSound ? 1 : -1, Math.signum(copy.areaVector(t).dot(area)), "triangle " + t);
    }
    try (var files = Files.list(folder)) {
      assertEquals(4, files.count());
    }
  }

  @Test
  void partsOfOneFileReferToOneCopy() throws IOException {
    Vector3[][] box = Meshes.box(Vector3.ZERO, new Vector3(1, 2, 4));
    boolean[] turn = new boolean[12];
    turn[0] = true;
    turn[5] = true;
    turn[6] = true;
    Vector3[][] turned = Meshes.turned(box, turn);
    Files.writeString(
        folder.resolve("box.stl"),
        stl("base", Arrays.copyOfRange(turned, 0, 2))
            + stl("walls", Arrays.copyOfRange(turned, 2, 12)));
    Path file =
        caseOf(
            """
              base:
                leaves: ring
                surface: {mesh: {file: box.stl, part: base, unit: m}}
                flux: {field: flow}
              walls:
                leaves: ring
                surface: {mesh: {file: box.stl, part: walls, unit: m}}
                flux: {field: flow}
            """);
    ProgramRun orient = run("orient", "--in-place", file.toString());
    assertEquals(0, orient.status(), orient.out() + orient.err());
    assertTrue(orient.out().contains("box-oriented.obj: turned 3 triangles"), orient.out());
    assertEquals(0, run("audit", file.toString()).status());
    try (var files = Files.list(folder)) {
      assertEquals(3, files.count());
    }
  }

  @Test
  void copyThatIsThereAlreadyIsNotWrittenOver() throws IOException {
    Vector3[][] box = Meshes.box(Vector3.ZERO, new Vector3(1, 2, 4));
    boolean[] turn = new boolean[12];
    turn[3] = true;
    Files.writeString(folder.resolve("box.stl"), stl("box", Meshes.turned(box, turn)));
    Path there = Files.writeString(folder.resolve("box-oriented.obj"), "# mine\n");
    Path file =
        caseOf("  skin:\n    surface: {mesh: {file: box.stl, unit: m}}\n    flux: {field: flow}\n");
    byte[] before = Files.readAllBytes(file);
    ProgramRun orient = run("orient", "--in-place", file.toString());
    assertEquals(74, orient.status());
    assertTrue(orient.err().contains("is there already"), orient.err());
    assertEquals("# mine\n", Files.readString(there));
    assertArrayEquals(before, Files.readAllBytes(file));
    assertFalse(Files.exists(folder.resolve("ring-oriented.yaml")));
  }

  private static byte[] resource(String name) throws IOException {
    try (InputStream in = OrientMeshTest.class.getResourceAsStream(name)) {
      return in.readAllBytes();
    }
  }

  @Test
  void coreThatFacesTheWrongWayIsTurnedWithTheTrianglesThatDo() throws IOException, MeshFault {
    Path file = Files.write(folder.resolve("jacket.yaml"), resource("jacket.yaml"));
    Files.write(folder.resolve("jacket.stl"), resource("jacket.stl"));
    assertEquals(10, run("audit", file.toString()).status());
    String before = Files.readString(file);
    ProgramRun orient = run("orient", file.toString());
    assertEquals(0, orient.status(), orient.out() + orient.err());
    // 12 of the core; 24 - 14 would be no fewer.
    assertTrue(orient.out().contains("jacket-oriented.obj: turned 10 triangles"), orient.out());
    assertEquals(
        before
            .replace("\"jacket.stl\"", "\"jacket-oriented.obj\"")
            .replace("    surface:", "    facing: reversed\n    surface:"),
        Files.readString(folder.resolve("jacket-oriented.yaml")));
    ProgramRun audit = run("audit", folder.resolve("jacket-oriented.yaml").toString());
    assertEquals(0, audit.status(), audit.out());
    TriangleMesh copy = MeshFile.read(folder.resolve("jacket-oriented.obj"), 1).build(1);
    // As in the file: in its unit.
    assertEquals(new Vector3(400, 300, 200.5), copy.high());
  }

  @Test
  void copyThatIsThereAndTheSameIsTaken() throws IOException {
    Path file = Files.write(folder.resolve("jacket.yaml"), resource("jacket.yaml"));
    Files.write(folder.resolve("jacket.stl"), resource("jacket.stl"));
    assertEquals(0, run("orient", file.toString()).status());
    ProgramRun again = run("orient", "--in-place", file.toString());
    assertEquals(0, again.status(), again.out() + again.err());
    assertEquals(Files.readString(folder.resolve("jacket-oriented.yaml")), Files.readString(file));
  }

  @Test
  void trianglesOfALooseMeshAreTurnedAsTheWeldedOneTells() throws IOException {
    Random random = new Random(0x9E3779B97F4A7C15L);
    Vector3[][] ring = Meshes.torus(2, 0.5, 12, 9);
    boolean[] turn = new boolean[ring.length];
    for (int k = 0; k < ring.length; k++) {
      turn[k] = random.nextInt(4) == 0;
      for (int c = 0; c < 3; c++) {
        ring[k][c] = ring[k][c].plus(new Vector3(1e-6 * random.nextDouble(), 0, 0)).times(1000);
      }
    }
    Files.writeString(folder.resolve("ring.stl"), stl("ring", Meshes.turned(ring, turn)));
    Path file =
        caseOf(
            """
              skin:
                leaves: ring
                surface: {mesh: {file: ring.stl, unit: mm, weld: 0.005 mm}}
                flux: {field: flow}
            """);
    assertEquals(10, run("audit", file.toString()).status());
    ProgramRun orient = run("orient", file.toString());
    assertEquals(0, orient.status(), orient.out() + orient.err());
    ProgramRun audit = run("audit", folder.resolve("ring-oriented.yaml").toString());
    assertFalse(audit.out().contains("orientation"), audit.out());
    assertFalse(audit.out().contains("surface-open"), audit.out());
  }

  @Test
  void filesThatDifferInTheirEndingGetCopiesOfTheirOwnUnderQuotedNames() throws IOException {
    Vector3[][] box = Meshes.box(Vector3.ZERO, new Vector3(1, 2, 4));
    boolean[] turn = new boolean[12];
    turn[0] = true;
    turn[5] = true;
    turn[6] = true;
    Vector3[][] turned = Meshes.turned(box, turn);
    Files.createDirectories(folder.resolve("m"));
    Files.writeString(
        folder.resolve("m/pump's.stl"), stl("base", Arrays.copyOfRange(turned, 0, 2)));
    Files.writeString(
        folder.resolve("m/pump's.txt"), stl("walls", Arrays.copyOfRange(turned, 2, 12)));
    Path file =
        caseOf(
            """
              base:
                leaves: ring
                surface: {mesh: {file: 'm/pump''s.stl', unit: m}}
                flux: {field: flow}
              walls:
                leaves: ring
                surface: {mesh: {file: "./m/pump's.txt", unit: m}}
                flux: {field: flow}
            """);
    String before = Files.readString(file);
    ProgramRun orient = run("orient", "--in-place", file.toString());
    assertEquals(0, orient.status(), orient.out() + orient.err());
    assertEquals(
        before
            // One of its two triangles is turned: either may be the wrong one.
            .replace(
                "ring\n    surface: {mesh: {file: 'm",
                "ring\n    facing: reversed\n    surface: {mesh: {file: 'm")
            .replace("m/pump''s.stl", "m/pump''s-oriented.obj")
            .replace("m/pump's.txt", "m/pump's-oriented-2.obj"),
        Files.readString(file));
    assertEquals(0, run("audit", file.toString()).status());
  }

  @Test
  void partThatAnObjFileCantNameIsLeftAndSaid() throws IOException {
    Vector3[][] box = Meshes.box(Vector3.ZERO, new Vector3(1, 2, 4));
    boolean[] turn = new boolean[12];
    turn[3] = true;
    Files.writeString(folder.resolve("box.stl"), stl("box\\", Meshes.turned(box, turn)));
    Path file =
        caseOf("  skin:\n    surface: {mesh: {file: box.stl, unit: m}}\n    flux: {field: flow}\n");
    ProgramRun orient = run("orient", file.toString());
    assertEquals(10, orient.status(), orient.out() + orient.err());
    assertTrue(orient.out().contains("skin: an OBJ file can't name a part"), orient.out());
    try (var files = Files.list(folder)) {
      assertEquals(2, files.count());
    }
  }
}
