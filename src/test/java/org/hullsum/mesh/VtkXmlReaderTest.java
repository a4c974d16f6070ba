package org.hullsum.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.zip.Deflater;
import org.hullsum.mesh.VtkXmlFiles.Form;
import org.hullsum.mesh.VtkXmlFiles.Style;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class VtkXmlReaderTest {
  private static final Style TEXT = new Style(Form.ASCII, ByteOrder.LITTLE_ENDIAN, false, false);
  private static final Style RAW =
      new Style(Form.APPENDED_RAW, ByteOrder.LITTLE_ENDIAN, false, false);
  private static final Style PACKED =
      new Style(Form.APPENDED_RAW, ByteOrder.LITTLE_ENDIAN, false, true);

  private static List<Style> styles() {
    return VtkXmlFiles.styles();
  }

  private static String ascii() {
    return new String(VtkXmlFiles.cube(TEXT), StandardCharsets.UTF_8);
  }

  @ParameterizedTest
  @MethodSource("styles")
  void cubeInEveryFormIsClosedWithVolumeOne(Style style) throws Exception {
    RecordedTriangles cube = RecordedTriangles.of(VtkXmlReader::read, VtkXmlFiles.cube(style));
    assertEquals(12, cube.triangleCount());
    assertEquals(8, cube.pointCount());
    assertEquals(1, cube.volume(), 1e-15);
    assertEquals(0, cube.areaVector().norm(), 0);
  }

  @ParameterizedTest
  @MethodSource("styles")
  void surfaceCellsOfAGridInEveryFormAreRead(Style style) throws Exception {
    assertEquals(
        "(0 1 2)(0 2 3)(0 1 2)(0 2 3)(0 1 2)(2 1 3)",
        RecordedTriangles.of(VtkXmlReader::read, VtkXmlFiles.grid(style, 9, 7, 6, 4)).corners());
  }

  @ParameterizedTest
  @CsvSource({"10,volume", "23,curved", "5,'has 4 corners'", "200,not known"})
  void cellsThatAreNoFacesAreRefused(int type, String message) {
    MeshFaults.refusedAtLine(
        VtkXmlReader::read,
        new String(VtkXmlFiles.grid(TEXT, 9, type), StandardCharsets.UTF_8),
        4,
        45,
        message);
  }

  @Test
  void everyFileThatIsCutShortIsRefused() {
    for (Style style : styles()) {
      byte[] whole = VtkXmlFiles.grid(style, 9);
      int closing = "\n</AppendedData>\n</VTKFile>\n".length() + 2;
      for (int length = 0; length < whole.length - closing; length += 3) {
        MeshFaults.of(VtkXmlReader::read, Arrays.copyOf(whole, length));
      }
    }
  }

  @Test
  void faultsInTextAreToldWithLineAndColumn() {
    refused(" 4 8 12 16", " 4 8 12 17", "the last offset is 17");
    refused(" 4 8 12 16", " 4 8 12", "declares 4 polygons and has 3");
    refused(" 4 8 12 16", " 4 8 7 16", "offset 7 is before the offset 8");
    refused(" 4 8 12 16", " 4 8 12 16 20", "more offsets than the 4 cells");
    refused("NumberOfPoints=\"8\" NumberOfVerts", "NumberOfPoints=\"9\" NumberOfVerts", "9 points");
    refused("NumberOfPoints=\"8\" NumberOfV", "NumberOfPoints=\"-8\" NumberOfV", "a count");
    refused("type=\"Float32\"", "type=\"Float16\"", "'Float16' is not a type");
    refused("type=\"PolyData\"", "type=\"ImageData\"", "ImageData");
    refused("LittleEndian", "MiddleEndian", "MiddleEndian");
    refused("byte_order=", "compressor=\"vtkLZ4DataCompressor\" byte_order=", "LZ4");
    refused("VTKFile", "KTVFile", "'VTKFile' is wanted");
    refused("</Verts>", "</Vert>", "the XML is not sound");
    refused(" 3 7 6 ", " 3 8 6 ", "point 8 is not among the 8 points");
    MeshFaults.refusedAtLine(
        VtkXmlReader::read, ascii().replace("1.0 0.0 1.0", "1.0 NaN 1.0"), 9, 66, "not 'NaN'");
  }

  private static void refused(String good, String bad, String message) {
    assertTrue(ascii().contains(good), good);
    MeshFault fault = MeshFaults.of(VtkXmlReader::read, ascii().replace(good, bad));
    assertTrue(fault.getMessage().contains(message), fault.getMessage());
    assertTrue(fault.line().isPresent());
  }

  @Test
  void faultsInRawDataAreToldWithTheByteOfTheFile() {
    byte[] file = VtkXmlFiles.grid(RAW, 9);
    int start = new String(file, StandardCharsets.ISO_8859_1).indexOf("_", file.length / 2) + 1;
    byte[] badCorner = file.clone();
    int corner = start + 4 + 48 + 4 + 16;
    badCorner[corner] = 4;
    MeshFaults.refusedAtByte(
        VtkXmlReader::read, badCorner, corner + 8, "point 4 is not among the 4 points");
    byte[] badSize = file.clone();
    Arrays.fill(badSize, start, start + 4, (byte) 0xff);
    MeshFault fault = MeshFaults.of(VtkXmlReader::read, badSize);
    assertTrue(fault.offset().isPresent(), fault.getMessage());
  }

  @Test
  void everyFlippedBitOfAPackedArrayIsNoticed() {
    byte[] file = VtkXmlFiles.grid(PACKED, 9);
    int start = new String(file, StandardCharsets.ISO_8859_1).indexOf("_", file.length / 2) + 1;
    for (int k = start + 16; k < start + 16 + 20; k++) {
      byte[] flipped = file.clone();
      flipped[k] ^= 4;
      MeshFaults.of(VtkXmlReader::read, flipped);
    }
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "<!DOCTYPE VTKFile [<!ENTITY a \"1 1\"><!ENTITY b \"&a;&a;&a;\">]>",
        "<!DOCTYPE VTKFile SYSTEM \"file:///etc/hostname\">",
        "<!DOCTYPE VTKFile [<!ENTITY % x SYSTEM \"file:///etc/hostname\"> %x;]>"
      })
  void documentTypesAreRefused(String declaration) {
    refused("<VTKFile", declaration + "<VTKFile", "document type");
  }

  @Test
  void packedArrayThatGrowsBeyondAllBoundsIsRefused() {
    Deflater deflater = new Deflater();
    byte[] packed = new byte[1 << 12];
    deflater.setInput(new byte[1 << 20]);
    deflater.finish();
    byte[] block = Arrays.copyOf(packed, deflater.deflate(packed));
    deflater.end();
    int blocks = 100;
    ByteWriter file = new ByteWriter(ByteOrder.LITTLE_ENDIAN);
    file.text("<VTKFile type='PolyData' compressor='vtkZLibDataCompressor'><PolyData>");
    file.text("<Piece NumberOfPoints='99999999'><Points><DataArray type='Float32' offset='0'");
    file.text(" format='appended'/></Points></Piece></PolyData><AppendedData encoding='raw'>_");
    file.ints(blocks, 1 << 20, 0);
    for (int k = 0; k < blocks; k++) {
      file.ints(block.length);
    }
    byte[] head = file.toBytes();
    byte[] whole = Arrays.copyOf(head, head.length + blocks * block.length);
    for (int k = 0; k < blocks; k++) {
      System.arraycopy(block, 0, whole, head.length + k * block.length, block.length);
    }
    MeshFault fault = MeshFaults.of(VtkXmlReader::read, whole);
    assertTrue(fault.getMessage().contains("which no mesh would"), fault.getMessage());
    assertTrue(fault.offset().isPresent());
  }
}
