package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.zip.GZIPOutputStream;
import org.hullsum.mesh.VtkXmlFiles.Form;
import org.hullsum.mesh.VtkXmlFiles.Style;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class MeshFileTest {
  private static final String OBJ = "v 0 0 0\nv 1 0 0\nv 0 1 0\nf 1 2 3\n";
  private static final String PLY =
      """
      ply
      format ascii 1.0
      element vertex 3
      property float x
      property float y
      property float z
      element face 1
      property list uchar int vertex_index
      end_header
      0 0 0
      1 0 0
      0 1 0
      3 0 1 2
      """;
  private static final String VTK =
      """
      # vtk DataFile Version 3.0

      ASCII
      DATASET POLYDATA
      POINTS 3 float
      0 0 0 1 0 0 0 1 0
      POLYGONS 1 4
      3 0 1 2
      """;
  private static final String STL =
      """
      solid lid
      facet normal 0 0 1
      outer loop
      vertex 0 0 0
      vertex 1 0 0
      vertex 0 1 0
      endloop
      endfacet
      endsolid lid
      """;

  private static byte[] content(String format) {
    return switch (format) {
      case "OBJ" -> OBJ.getBytes(StandardCharsets.UTF_8);
      case "PLY" -> PLY.getBytes(StandardCharsets.UTF_8);
      case "VTK_LEGACY" -> VTK.getBytes(StandardCharsets.UTF_8);
      case "STL" -> STL.getBytes(StandardCharsets.UTF_8);
      default ->
          VtkXmlFiles.grid(new Style(Form.APPENDED_RAW, ByteOrder.BIG_ENDIAN, true, true), 9);
    };
  }

  private static byte[] gzip(byte[] content) throws IOException {
    ByteArrayOutputStream packed = new ByteArrayOutputStream();
    try (GZIPOutputStream stream = new GZIPOutputStream(packed)) {
      stream.write(content);
    }
    return packed.toByteArray();
  }

  private static MeshFormat read(byte[] file, String name) throws IOException, MeshFault {
    RecordedTriangles sink = new RecordedTriangles();
    MeshFormat format = MeshFile.read(RecordedTriangles.channel(file), file.length, name, sink);
    assertTrue(sink.triangleCount() > 0);
    assertFalse(format.carriesUnit());
    return format;
  }

  @ParameterizedTest
  @CsvSource({
    "PLY, sump.stl",
    "VTK_LEGACY, sump",
    "VTK_XML, sump.vtk",
    "STL, sump.obj",
    "OBJ, sump.dat",
    "OBJ, sump.obj",
    "PLY, sump.ply",
    "VTK_XML, sump.vtp.gz",
    "STL, sump.STL"
  })
  void contentSaysTheFormatBeforeTheName(MeshFormat format, String name) throws Exception {
    byte[] content = content(format.name());
    assertEquals(format, read(content, name));
    assertEquals(format, read(gzip(content), name + ".gz"));
  }

  @Test
  void fileOnDiskIsRead(@TempDir Path folder) throws Exception {
    Path file = Files.write(folder.resolve("sump.dat"), gzip(content("PLY")));
    assertEquals(MeshFormat.PLY, MeshFile.read(file, new RecordedTriangles()));
  }

  @Test
  void binaryStlIsKnownByItsSizeAlone() throws Exception {
    byte[] file = new byte[84 + 50];
    file[80] = 1;
    assertEquals(MeshFormat.STL, read(file, "sump"));
    refused(Arrays.copyOf(file, 130), "neither the content nor the ending");
  }

  @Test
  void membersOneBehindTheOtherAreOneFile() throws Exception {
    byte[] content = content("PLY");
    ByteArrayOutputStream both = new ByteArrayOutputStream();
    both.writeBytes(gzip(Arrays.copyOf(content, 50)));
    both.writeBytes(gzip(Arrays.copyOfRange(content, 50, content.length)));
    assertEquals(MeshFormat.PLY, read(both.toByteArray(), "sump"));
  }

  @Test
  void brokenAndForeignFilesAreRefused() throws Exception {
    byte[] packed = gzip(content("PLY"));
    refused(new byte[0], "is empty");
    refused(new byte[] {1, 2, 3}, "neither the content nor the ending");
    refused(Arrays.copyOf(packed, 5), "gzip");
    refused(Arrays.copyOf(packed, packed.length - 9), "gzip");
    byte[] flipped = packed.clone();
    flipped[packed.length - 6] ^= 1;
    refused(flipped, "gzip");
    refused(gzip(packed), "neither the content nor the ending");
  }

  @Test
  void packedFileThatGrowsBeyondAllBoundsIsRefused() throws Exception {
    byte[] blank = new byte[1 << 20];
    Arrays.fill(blank, (byte) ' ');
    ByteArrayOutputStream packed = new ByteArrayOutputStream();
    try (GZIPOutputStream stream = new GZIPOutputStream(packed)) {
      stream.write(OBJ.getBytes(StandardCharsets.UTF_8));
      for (int k = 0; k < 100; k++) {
        stream.write(blank);
      }
    }
    refused(packed.toByteArray(), "which no mesh would");
  }

  private static void refused(byte[] file, String message) {
    MeshFault fault = assertThrows(MeshFault.class, () -> read(file, "sump"));
    assertTrue(fault.getMessage().contains(message), fault.getMessage());
    assertTrue(fault.offset().isPresent());
  }
}
