package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ObjReaderTest {
  private static final String SQUARE = "v 0 0 0\nv 1 0 0\nv 1 1 0\nv 0 1 0\n";

  private static RecordedTriangles read(String file) throws Exception {
    return RecordedTriangles.of(ObjReader::read, file);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "f 1 2 3 4",
        "f 1/1 2/2 3/3 4/4 # the lid",
        "f 1//9 2//9 3//9 4//9",
        "f 1/1/1 2/1/1 3/1/1 4/1/1\r\n",
        "f -4 -3 -2 -1",
        "f -4/-1 2/-1/-2 -2 4",
        "f 1 2 \\\n 3 4",
        "f 1 2\\\r\n3 4\n",
        "\tf\t1  2 3 4 ",
        "fo 1 2 3 4"
      })
  void cornersAreReadInEveryForm(String face) throws Exception {
    assertEquals("(0 1 2)(0 2 3)", read(SQUARE + face).corners());
  }

  @Test
  void numbersAreReadInEveryForm() throws Exception {
    RecordedTriangles told =
        read(
            "v +1. .5 -0.25e+1 1.0\nv 1E1 -1e-1 0 255 0 0\nv 12345678901234567890e-19 0 0\nf 1 2 3");
    RecordedTriangles same =
        read("v 1 0.5 -2.5\nv 10 -0.1 0\nv 1.2345678901234567890 0 0\nf 1 2 3");
    assertEquals(same.areaVector(), told.areaVector());
  }

  @Test
  void groupsAndObjectsArePartsThatMayComeBack() throws Exception {
    String faces = "f 1 2 3\n";
    RecordedTriangles told =
        read(
            SQUARE
                + faces
                + "o tank\ng lid  north\n"
                + faces
                + faces
                + "g floor\n"
                + faces
                + "g lid north\n"
                + faces
                + "g lid north\n"
                + faces
                + "g\n"
                + faces);
    assertEquals(List.of("1:lid north", "3:floor", "4:lid north", "6:"), told.parts());
  }

  @Test
  void otherStatementsArePassed() throws Exception {
    String others =
        """
        # comment with a folder at its end C:\\
        mtllib sump.mtl
        vt 0 0
        vn 0 0 1
        vp 1 2
        s off
        usemtl steel
        l 1 2
        p 1
        lod 3 \\
        4
        """;
    assertEquals("(0 1 2)", read(others + SQUARE + others + "f 1 2 3\n" + others).corners());
  }

  @Test
  void faultsAreToldWithLineAndColumn() {
    refused("f 1 2 5", 5, 7, "point 5 is not among the 4 points so far");
    refused("f 1 2 -5", 5, 7, "point -5");
    refused("f 0 1 2", 5, 3, "point 0");
    refused("f 1 2 99999999999999999999", 5, 7, "64 bits");
    refused("f 1 2", 5, 6, "a polygon of 2 corners");
    refused("f 1 2 x", 5, 7, "not 'x'");
    refused("f 1 2 3/1/1/1", 5, 12, "a corner written as v");
    refused("v 1 2", 5, 6, "the coordinate z is wanted where the file ends");
    refused("v 1 2 inf", 5, 7, "not 'inf'");
    refused("v 1 2 1e400", 5, 7, "must be finite");
    refused("surf 0 1 0 1 1 2 3 4", 5, 1, "free-form");
    refused("call roof.obj", 5, 1, "another file");
    refused("\u0000\u0001", 5, 1, "a statement of an OBJ file");
    refused("s off\n", 6, 1, "has had no face");
    refused("f 1 3 2 4", 5, 10, "encloses no area");
  }

  private static void refused(String statement, int line, int column, String message) {
    MeshFaults.refusedAtLine(ObjReader::read, SQUARE + statement, line, column, message);
  }
}
