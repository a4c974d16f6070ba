package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.ByteOrder;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class PlyReaderTest {
  private static final String CUBE =
      """
      ply
      format ascii 1.0
      comment the pump sump of Marrow Point
      obj_info lengths in no unit
      element vertex 8
      property float x
      property float y
      property float z
      element face 6
      property list uchar int vertex_indices
      end_header
      0 0 0
      1 0 0
      1 1 0
      0 1 0
      0 0 1
      1 0 1
      1 1 1
      0 1 1
      4 0 3 2 1
      4 4 5 6 7
      4 0 1 5 4
      4 1 2 6 5
      4 2 3 7 6
      4 3 0 4 7
      """;

  private static Stream<ByteOrder> orders() {
    return Stream.of(ByteOrder.LITTLE_ENDIAN, ByteOrder.BIG_ENDIAN);
  }

  @Test
  void asciiCubeOfSquaresIsClosedWithVolumeOne() throws Exception {
    RecordedTriangles cube = RecordedTriangles.of(PlyReader::read, CUBE);
    assertEquals(12, cube.triangleCount());
    assertEquals(8, cube.pointCount());
    assertEquals(1, cube.volume(), 1e-15);
    assertEquals(0, cube.areaVector().norm(), 0);
  }

  @ParameterizedTest
  @MethodSource("orders")
  void binaryWithOtherElementsPropertiesAndTypesInAnyOrderIsRead(ByteOrder order) throws Exception {
    String name = order == ByteOrder.BIG_ENDIAN ? "big" : "little";
    ByteWriter file = new ByteWriter(order);
    file.text("ply\nformat binary_" + name + "_endian 1.0\n");
    file.text("element camera 2\nproperty float f\nproperty ushort n\n");
    file.text("element tag 1\nproperty list ushort double weights\n");
    file.text("element face 2\nproperty uchar red\nproperty list uint ushort vertex_index\n");
    file.text("property list char short extra\n");
    file.text("element vertex 4\nproperty list uchar uchar tags\nproperty double z\n");
    file.text("property int x\nproperty char confidence\nproperty float y\nend_header\n");
    file.floats(1).shorts(2).floats(3).shorts(4);
    file.shorts(2).doubles(5, 6);
    file.bytes((byte) 255).ints(3).shorts(0, 1, 2).bytes((byte) 1).shorts(7);
    file.bytes((byte) 255).ints(3).shorts(0, 2, 3).bytes((byte) 0);
    file.bytes((byte) 2, (byte) 1, (byte) 1).doubles(0.5).ints(0).bytes((byte) 9).floats(0);
    file.bytes((byte) 0).doubles(0.5).ints(2).bytes((byte) 9).floats(0);
    file.bytes((byte) 0).doubles(0.5).ints(2).bytes((byte) 9).floats(3);
    file.bytes((byte) 0).doubles(0.5).ints(0).bytes((byte) 9).floats(3);
    RecordedTriangles rectangle = RecordedTriangles.of(PlyReader::read, file.toBytes());
    assertEquals("(0 1 2)(0 2 3)", rectangle.corners());
    assertEquals(6, rectangle.areaVector().z(), 0);
    assertEquals(0.5 * 6 / 3, rectangle.volume(), 1e-15);
  }

  @Test
  void everyKindOfLineEndIsTaken() throws Exception {
    for (String end : new String[] {"\r\n", "\r"}) {
      assertEquals(
          1, RecordedTriangles.of(PlyReader::read, CUBE.replace("\n", end)).volume(), 1e-15);
    }
  }

  @Test
  void stripsTurnEverySecondTriangleAndBeginAgainAfterMinusOne() throws Exception {
    String strips =
        CUBE.substring(0, CUBE.indexOf("element face"))
            + "element tristrips 1\nproperty list int int vertex_indices\nend_header\n"
            + CUBE.substring(CUBE.indexOf("0 0 0"), CUBE.indexOf("4 0 3 2 1"))
            + "9 0 1 3 2 -1 4 5 7 -1\n";
    RecordedTriangles told = RecordedTriangles.of(PlyReader::read, strips);
    assertEquals("(0 1 3)(3 1 2)(4 5 7)", told.corners());
    assertEquals(1.5, told.areaVector().z(), 0);
  }

  @Test
  void faultsInTextAreToldWithLineAndColumn() {
    refused("4 3 0 4 7", "4 3 0 4 8", 25, 9, "point 8 is not among the 8 points");
    refused("4 3 0 4 7", "4 3 0 4 -1", 25, 9, "point -1");
    refused("4 3 0 4 7", "2 3 0", 25, 5, "a polygon of 2 corners");
    refused("4 3 0 4 7", "-4 3 0 4 7", 25, 1, "a list of -4 numbers");
    refused("4 3 0 4 7", "4 3 0 4 7 7", 25, 11, "the end of the line");
    refused("4 3 0 4 7", "4 3 0 4 7\n1", 26, 1, "goes on behind the last element");
    refused("4 3 0 4 7\n", "2000000000 3 0 4 7\n", 26, 1, "where the file ends");
    refused("1 0 1", "1 nan 1", 17, 3, "a finite number is wanted, not 'nan'");
    refused("1 0 1", "1 0 1e999", 17, 5, "a point must be finite");
    refused("1 0 1", "1 0,5 1", 17, 3, "not '0,5'");
    refused("vertex 8", "vertex -8", 5, 16, "a count of -8");
    refused("vertex 8", "vertex 99999999999999999999", 5, 16, "that fits into 64 bits");
    refused("vertex 8", "vertex 8000000000", 11, 1, "more than are read");
    refused("property float y", "property half y", 7, 10, "'half' is not a type");
    refused("property float y", "property float b", 11, 1, "has no number 'y'");
    refused("vertex_indices", "corners", 11, 1, "has no list 'vertex_indices'");
    refused("ascii", "utf8", 2, 8, "'utf8' is not a format");
    refused("element face 6", "element vertex 6", 9, 9, "declared twice");
    refused("end_header", "end_of_header", 11, 1, "'end_of_header' is not a line");
    refused("ply", "plx", 1, 1, "begins with the word 'ply'");
  }

  private static void refused(String good, String bad, int line, int column, String message) {
    MeshFaults.refusedAtLine(PlyReader::read, CUBE.replace(good, bad), line, column, message);
  }

  @Test
  void faultsInBinaryAreToldWithTheByte() {
    String header =
        """
        ply
        format binary_little_endian 1.0
        element vertex 2000000000
        property float x
        property float y
        property float z
        element face 1
        property list uint int vertex_indices
        end_header
        """;
    ByteWriter cutShort = new ByteWriter(ByteOrder.LITTLE_ENDIAN).text(header).floats(1, 2, 3, 4);
    MeshFaults.refusedAtByte(
        PlyReader::read, cutShort.toBytes(), cutShort.size(), "ends inside a number");
    ByteWriter notFinite =
        new ByteWriter(ByteOrder.LITTLE_ENDIAN).text(header).floats(1, Double.NaN, 3);
    MeshFaults.refusedAtByte(
        PlyReader::read, notFinite.toBytes(), notFinite.size(), "a point must be finite");
  }
}
