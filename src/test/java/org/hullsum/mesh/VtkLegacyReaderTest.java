package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.ByteOrder;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class VtkLegacyReaderTest {
  private static final String HEAD = "# vtk DataFile Version 3.0\nbrine tank, \\ lid\nASCII\n";
  private static final String POINTS =
      """
      DATASET POLYDATA
      POINTS 8 float
      0 0 0 1 0 0 1 1 0
      0 1 0 0 0 1 1 0 1
      1 1 1 0 1 1
      """;
  private static final String SQUARES =
      """
      POLYGONS 6 30
      4 0 3 2 1
      4 4 5 6 7
      4 0 1 5 4
      4 1 2 6 5
      4 2 3 7 6
      4 3 0 4 7
      """;

  private static RecordedTriangles read(String file) throws Exception {
    return RecordedTriangles.of(VtkLegacyReader::read, file);
  }

  private static void isUnitCube(RecordedTriangles told) {
    assertEquals(12, told.triangleCount());
    assertEquals(8, told.pointCount());
    assertEquals(1, told.volume(), 1e-15);
    assertEquals(0, told.areaVector().norm(), 0);
  }

  @ParameterizedTest
  @ValueSource(strings = {"1.0", "2.0", "3.0", "4.2"})
  void asciiPolygonsOfEveryVersionAreRead(String version) throws Exception {
    isUnitCube(read(HEAD.replace("3.0", version) + POINTS + SQUARES));
  }

  @Test
  void otherSectionsArePassed() throws Exception {
    String field =
        """
        FIELD FieldData 5
        TIME 1 1 double
        0.5
        METADATA
        INFORMATION 1
        NAME unit LOCATION nowhere
        DATA 1 3

        names 1 2 string
        the%20north lid
        POINTS 7 float
        flags 1 3 bit
        1 0 1
        NULL_ARRAY
        none 3 0 vtkIdType
        """;
    String rest =
        """
        METADATA
        COMPONENT_NAMES
        x

        VERTICES 1 2
        1 0
        LINES 2 6
        2 0 1
        2 1 2
        """;
    String values = "CELL_DATA 6\nSCALARS p float 1\nLOOKUP_TABLE default\n1 2 3 4 5 6\n";
    isUnitCube(
        read(
            HEAD
                + field
                + POINTS.replace("POLYDATA\n", "polydata\n" + field)
                + rest
                + SQUARES
                + values));
  }

  @Test
  void offsetsAndConnectivityAreRead() throws Exception {
    String offsets =
        """
        METADATA
        INFORMATION 0

        LINES 2 2
        OFFSETS vtktypeint64
        0 2
        CONNECTIVITY vtktypeint64
        0 1
        POLYGONS 3 7
        OFFSETS vtktypeint64
        0 4 7
        CONNECTIVITY vtktypeint64
        0 1 2 3
        4 5 6
        TRIANGLE_STRIPS 2 4
        OFFSETS vtktypeint32
        0 4
        CONNECTIVITY vtktypeint32
        0 1 3 2
        """;
    assertEquals(
        "(0 1 2)(0 2 3)(4 5 6)(0 1 3)(3 1 2)",
        read(HEAD.replace("3.0", "5.1") + POINTS + offsets).corners());
  }

  @ParameterizedTest
  @CsvSource({"3.0", "5.1"})
  void binaryPolygonsAreRead(String version) throws Exception {
    ByteWriter file = new ByteWriter(ByteOrder.BIG_ENDIAN);
    file.text("# vtk DataFile Version " + version + "\nbinary\nBINARY\n");
    file.text("FIELD before 3\nbits 1 9 bit\n").bytes((byte) 1, (byte) 2);
    file.text("\nnames 1 3 string\n").bytes((byte) 0xc2, (byte) '\n', (byte) 'b');
    file.bytes((byte) 0x80, (byte) 1, (byte) 'c').bytes((byte) 0x40, (byte) 0, (byte) 0, (byte) 0);
    file.text("\nids 2 1 vtkIdType\n").ints(0x0a0a0a0a, 7);
    file.text("\nDATASET POLYDATA\nPOINTS 4 double\n");
    file.doubles(0, 0, 0, 2, 0, 0, 2, 2, 0, 0, 2, 0);
    if (version.equals("5.1")) {
      file.text("\nPOLYGONS 3 7\nOFFSETS vtktypeint64\n").longs(0, 4, 7);
      file.text("\nCONNECTIVITY vtktypeint64\n").longs(0, 1, 2, 3, 3, 2, 1);
    } else {
      file.text("\nPOLYGONS 2 9\n").ints(4, 0, 1, 2, 3, 3, 3, 2, 1);
    }
    file.text("\nPOINT_DATA 4\nSCALARS p float\nLOOKUP_TABLE default\n").floats(1, 2, 3, 4);
    RecordedTriangles told = RecordedTriangles.of(VtkLegacyReader::read, file.toBytes());
    assertEquals("(0 1 2)(0 2 3)(3 2 1)", told.corners());
    assertEquals(2, told.areaVector().z(), 0);
  }

  private static String grid(String types) {
    return HEAD
        + POINTS.replace("POLYDATA", "UNSTRUCTURED_GRID")
        + """
        CELLS 6 27
        4 0 3 2 1
        4 4 5 7 6
        3 0 1 5
        4 0 5 4 0
        4 0 1 3 2
        2 0 1
        CELL_TYPES 6
        """
        + types;
  }

  @Test
  void surfaceCellsOfAGridAreRead() throws Exception {
    assertEquals(
        "(0 3 2)(0 2 1)(4 5 6)(4 6 7)(0 1 5)(0 5 4)(0 1 3)(3 1 2)",
        read(grid("9\n8\n5\n7\n6\n3\n")).corners());
    assertEquals(
        "(0 1 2)(2 1 3)",
        read(HEAD.replace("3.0", "5.1")
                + POINTS.replace("POLYDATA", "UNSTRUCTURED_GRID")
                + "CELLS 2 4\nOFFSETS vtktypeint64\n0 4\nCONNECTIVITY vtktypeint64\n0 1 2 3\n"
                + "CELL_TYPES 1\n6\n")
            .corners());
  }

  @Test
  void cellsThatAreNoFacesAreRefused() {
    MeshFaults.refusedAtLine(
        VtkLegacyReader::read, grid("10 8 5 7 6 3"), 17, 13, "cell 0 of type 10: a volume cell");
    MeshFaults.refusedAtLine(
        VtkLegacyReader::read, grid("9 8 22 7 6 3"), 17, 13, "cell 2 of type 22: a curved");
    MeshFaults.refusedAtLine(
        VtkLegacyReader::read, grid("9 8 99 7 6 3"), 17, 13, "cell 2 of type 99: a cell of a type");
    MeshFaults.refusedAtLine(
        VtkLegacyReader::read, grid("9 8 9 7 6 3"), 17, 12, "cell 2 of type 9: the cell has 3");
    MeshFaults.refusedAtLine(
        VtkLegacyReader::read, grid("9 8 5 7 6"), 17, 10, "where the file ends");
  }

  @Test
  void faultsInTextAreToldWithLineAndColumn() {
    refused("4 3 0 4 7", "4 3 0 4 8", 15, 9, "point 8 is not among the 8 points");
    refused("4 3 0 4 7", "5 3 0 4 7", 15, 1, "a cell of 5 corners where 5 numbers are left");
    refused("4 3 0 4 7", "-4 3 0 4 7", 15, 1, "a cell of -4 corners");
    refused("4 3 0 4 7", "3 3 0 4 7", 15, 7, "1 more numbers are declared");
    refused("6 30", "600000000 3000000000", 16, 1, "where the file ends");
    refused("6 30", "-6 30", 9, 10, "is -6");
    refused("8 float", "8 half", 5, 10, "'half' is not a type");
    refused("1 1 1", "1 1 NaN", 8, 5, "a finite number is wanted, not 'NaN'");
    refused("POLYGONS", "CELLS", 9, 1, "'CELLS' does not belong");
    refused("POLYDATA", "RECTILINEAR_GRID", 4, 9, "RECTILINEAR_GRID");
    refused("ASCII", "TEXT", 3, 1, "'ASCII' or 'BINARY'");
    refused("3.0", "6.0", 1, 24, "version 6 is not known");
  }

  private static void refused(String good, String bad, int line, int column, String message) {
    MeshFaults.refusedAtLine(
        VtkLegacyReader::read, (HEAD + POINTS + SQUARES).replace(good, bad), line, column, message);
  }

  @Test
  void faultsInBinaryAreToldWithTheByte() {
    ByteWriter file = new ByteWriter(ByteOrder.BIG_ENDIAN);
    file.text("# vtk DataFile Version 3.0\nbinary\nBINARY\nDATASET POLYDATA\n");
    file.text("POINTS 2000000000 float\n").floats(1, 2, 3, 4);
    MeshFaults.refusedAtByte(
        VtkLegacyReader::read, file.toBytes(), file.size(), "ends inside a number");
  }
}
