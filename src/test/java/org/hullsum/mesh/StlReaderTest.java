package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.Channels;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;

class StlReaderTest {
  static byte[] binary(Vector3[][] triangles, String header) {
    ByteBuffer bytes =
        ByteBuffer.allocate(84 + 50 * triangles.length).order(ByteOrder.LITTLE_ENDIAN);
    bytes.put(Arrays.copyOf(header.getBytes(StandardCharsets.US_ASCII), 80));
    bytes.putInt(triangles.length);
    for (Vector3[] t : triangles) {
      bytes.putFloat(Float.NaN).putFloat(0).putFloat(0);
      for (Vector3 p : t) {
        bytes.putFloat((float) p.x()).putFloat((float) p.y()).putFloat((float) p.z());
      }
      bytes.putShort((short) 7);
    }
    return bytes.array();
  }

  private static String text(Vector3[][] triangles, String name) {
    StringBuilder text = new StringBuilder("solid " + name + "\n");
    for (Vector3[] t : triangles) {
      text.append("  facet normal 0 0 0\n    outer loop\n");
      for (Vector3 p : t) {
        text.append("      vertex ")
            .append(p.x())
            .append(' ')
            .append(p.y())
            .append(' ')
            .append(p.z())
            .append('\n');
      }
      text.append("    endloop\n  endfacet\n");
    }
    return text.append("endsolid ").append(name).append('\n').toString();
  }

  private static TriangleMesh read(byte[] bytes) throws IOException, MeshFault {
    TriangleMeshBuilder builder = new TriangleMeshBuilder();
    StlReader.read(Channels.newChannel(new ByteArrayInputStream(bytes)), builder);
    return builder.build(1);
  }

  private static TriangleMesh read(String text) throws IOException, MeshFault {
    return read(text.getBytes(StandardCharsets.US_ASCII));
  }

  private static MeshFault fault(byte[] bytes) {
    return assertThrows(MeshFault.class, () -> read(bytes));
  }

  private static final Vector3[][] BOX = Meshes.box(Vector3.ZERO, new Vector3(1, 2, 4));

  @Test
  void binaryFileIsReadAlsoWhereItsHeaderBeginsWithSolid() throws IOException, MeshFault {
    for (String header : List.of("made by hand", "solid but binary")) {
      TriangleMesh mesh = read(binary(BOX, header));
      assertEquals(12, mesh.triangleCount());
      assertEquals(8, mesh.vertexCount());
      assertEquals(8, MeshTopology.of(mesh).shells().get(0).volume());
    }
  }

  @Test
  void textHasAPartForEachSolid() throws IOException, MeshFault {
    Vector3[][] bottom = Arrays.copyOfRange(BOX, 0, 2);
    Vector3[][] rest = Arrays.copyOfRange(BOX, 2, 12);
    TriangleMesh mesh = read(text(bottom, "floor plate") + text(rest, "walls"));
    assertEquals(List.of("floor plate", "walls"), mesh.parts());
    assertEquals(0, mesh.part(1));
    assertEquals(1, mesh.part(2));
    assertEquals(2, mesh.only(0).triangleCount());
    assertTrue(MeshTopology.of(mesh).isClosed());
  }

  @Test
  void carelesslyWrittenTextIsUnderstood() throws IOException, MeshFault {
    String careless =
        text(BOX, "A")
            .replace("\n", "\r\n")
            .replace("facet", "FACET")
            .replace("1.0", "+1.E+00")
            .replace("normal 0 0 0", "normal nan nan nan")
            .replaceFirst("(?s)endsolid.*", "");
    assertEquals(12, read(careless).triangleCount());
  }

  @Test
  void faultsNameTheByteOrTheLine() {
    byte[] good = binary(BOX, "x");
    assertEquals(
        "the file states 12 triangles in bytes 80 to 83 and ends within number 12; export it again,"
            + " or mend the count",
        fault(Arrays.copyOf(good, good.length - 1)).getMessage());
    assertEquals(84 + 11 * 50, fault(Arrays.copyOf(good, good.length - 1)).offset().getAsLong());
    byte[] counted = good.clone();
    counted[83] = (byte) 0xff;
    assertTrue(fault(counted).getMessage().contains("states 4278190092 triangles"));
    byte[] longer = Arrays.copyOf(good, good.length + 3);
    longer[good.length + 1] = 7;
    assertEquals(good.length, fault(longer).offset().getAsLong());
    byte[] infinite = good.clone();
    infinite[84 + 12 + 3] = 0x7f;
    infinite[84 + 12 + 2] = (byte) 0x80;
    assertEquals(96, fault(infinite).offset().getAsLong());
    assertEquals(0, fault(new byte[0]).offset().getAsLong());
    MeshFault four =
        fault(
            text(BOX, "A")
                .replaceFirst("    endloop", "      vertex 0 0 0\n    endloop")
                .getBytes(StandardCharsets.US_ASCII));
    assertEquals(7, four.line().getAsInt());
    assertEquals("a fourth corner: a facet of an STL file has three", four.getMessage());
    assertEquals(
        "the file ends where vertex should stand",
        fault("solid a\nfacet normal 0 0 1\nouter loop\n".getBytes(StandardCharsets.US_ASCII))
            .getMessage());
  }

  @Test
  void damagedFilesGiveAFaultOrAMeshAndNothingElse() throws IOException {
    Random random = new Random(11);
    byte[][] seeds = {binary(BOX, "x"), text(BOX, "A").getBytes(StandardCharsets.US_ASCII)};
    for (int k = 0; k < 4000; k++) {
      byte[] bytes = seeds[k % 2].clone();
      for (int flips = random.nextInt(6); flips >= 0; flips--) {
        bytes[random.nextInt(bytes.length)] = (byte) random.nextInt(256);
      }
      byte[] cut = Arrays.copyOf(bytes, random.nextInt(bytes.length + 1));
      try {
        assertTrue(read(random.nextBoolean() ? bytes : cut).triangleCount() > 0);
      } catch (MeshFault fault) {
        assertTrue(fault.offset().isPresent() || fault.line().isPresent());
      }
    }
  }

  @Test
  void binaryFileWhoseHeadHoldsTheWordsOfATextIsBinary() throws IOException, MeshFault {
    TriangleMesh mesh = read(binary(BOX, "solid box of 12 facet triangles"));
    assertEquals(12, mesh.triangleCount());
  }

  @Test
  void zerosBehindTheLastTriangleAreFilling() throws IOException, MeshFault {
    byte[] filled = Arrays.copyOf(binary(BOX, "filled"), 1024);
    assertEquals(12, read(filled).triangleCount());
  }

  @Test
  void wrongCountIsToldWithWhatTheFileHolds() {
    byte[] few = binary(BOX, "few");
    few[80] = 10;
    MeshFault more = fault(few);
    assertEquals(84 + 500, more.offset().orElseThrow());
    assertTrue(more.getMessage().contains("states 10 triangles"), more.getMessage());
    assertTrue(more.getMessage().contains("2 triangles more behind them"), more.getMessage());
    byte[] many = binary(BOX, "many");
    many[80] = 20;
    assertTrue(fault(many).getMessage().contains("ends after number 12"), "many");
    byte[] minus = binary(BOX, "minus");
    Arrays.fill(minus, 80, 84, (byte) 0xff);
    assertTrue(fault(minus).getMessage().contains("states 4294967295 triangles"), "minus");
    byte[] none = binary(BOX, "none");
    none[80] = 0;
    assertTrue(fault(none).getMessage().contains("12 triangles more behind them"), "none");
    byte[] torn = Arrays.copyOf(binary(BOX, "torn"), 84 + 120);
    assertTrue(fault(torn).getMessage().contains("ends within number 3"), "torn");
  }

  @Test
  void byteOrderMarkAndBlanksBeforeATextArePassed() throws IOException, MeshFault {
    byte[] text = ("\uFEFF" + text(BOX, "box")).getBytes(StandardCharsets.UTF_8);
    assertEquals(12, read(text).triangleCount());
    assertEquals(12, read("\n\t " + text(BOX, "box")).triangleCount());
  }

  @Test
  void strangeTextIsRefusedWithItsLine() {
    String sound = text(BOX, "box");
    String[][] faults = {
      {"vertex 1.0 0.0 0.0", "vertex 1,0 0.0 0.0"},
      {"vertex 1.0 0.0 0.0", "vertex 1.0 0.0"},
      {"vertex 1.0 0.0 0.0", "vertex 1e999 0.0 0.0"},
      {"endloop", "vertex 1 1 1\nendloop"},
      {"outer loop", "outerloop"},
      {"endfacet", "endfact"},
      {"facet normal", "color 1 0 0\nfacet normal"}
    };
    for (String[] fault : faults) {
      MeshFault told =
          fault(sound.replaceFirst(fault[0], fault[1]).getBytes(StandardCharsets.UTF_8));
      assertTrue(told.line().orElseThrow() > 1, told.getMessage());
    }
  }
}
