package org.hullsum.mesh;

import java.io.ByteArrayOutputStream;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Base64;
import java.util.List;
import java.util.zip.Deflater;

/** Writes VTK files in XML in every form that the reader takes. */
final class VtkXmlFiles {
  /** Where and how arrays are written. */
  enum Form {
    ASCII,
    INLINE,
    APPENDED_BASE64,
    APPENDED_RAW
  }

  /** How a file is written. */
  record Style(Form form, ByteOrder order, boolean longHeaders, boolean zlib) {}

  private static final int BLOCK = 64;

  private final Style style;
  private final StringBuilder head = new StringBuilder();
  private final ByteArrayOutputStream appended = new ByteArrayOutputStream();

  private VtkXmlFiles(Style style) {
    this.style = style;
  }

  static List<Style> styles() {
    List<Style> styles = new ArrayList<>();
    for (Form form : Form.values()) {
      for (ByteOrder order : List.of(ByteOrder.LITTLE_ENDIAN, ByteOrder.BIG_ENDIAN)) {
        for (int k = 0; k < 4; k++) {
          styles.add(new Style(form, order, (k & 1) == 1, (k & 2) == 2));
        }
      }
    }
    return styles;
  }

  /** The unit cube of squares and strips in two pieces. */
  static byte[] cube(Style style) {
    VtkXmlFiles file = new VtkXmlFiles(style);
    file.begin("PolyData");
    file.head.append("<Piece NumberOfPoints=\"8\" NumberOfVerts=\"1\" NumberOfPolys=\"4\">\n");
    file.head.append("<PointData>");
    file.array("Float64", "pressure", new double[] {1, 2, 3, 4, 5, 6, 7, 8});
    file.head.append("</PointData><Points>");
    file.array(
        "Float32",
        "Points",
        new double[] {0, 0, 0, 1, 0, 0, 1, 1, 0, 0, 1, 0, 0, 0, 1, 1, 0, 1, 1, 1, 1, 0, 1, 1});
    file.head.append("</Points><Verts>");
    file.array("Int64", "connectivity", new double[] {0});
    file.array("Int64", "offsets", new double[] {1});
    file.head.append("</Verts><Polys>");
    file.array(
        "Int64", "connectivity", new double[] {0, 1, 5, 4, 1, 2, 6, 5, 2, 3, 7, 6, 3, 0, 4, 7});
    file.array("Int32", "offsets", new double[] {4, 8, 12, 16});
    file.head.append("</Polys></Piece>\n<!-- <AppendedData -->");
    file.head.append("<Piece NumberOfPoints=\"8\" NumberOfStrips=\"2\">\n<Points>");
    file.array(
        "Float64",
        "Points",
        new double[] {0, 0, 0, 0, 1, 0, 1, 0, 0, 1, 1, 0, 0, 0, 1, 1, 0, 1, 0, 1, 1, 1, 1, 1});
    file.head.append("</Points><Strips>");
    file.array("UInt16", "connectivity", new double[] {0, 1, 2, 3, 4, 5, 6, 7});
    file.array("UInt8", "offsets", new double[] {4, 8});
    file.head.append("</Strips><Polys>");
    file.array("Int64", "connectivity", new double[0]);
    file.array("Int32", "offsets", new double[0]);
    file.head.append("</Polys></Piece>\n<Piece NumberOfPoints=\"0\"></Piece>\n</PolyData>\n");
    return file.end();
  }

  /** Some cells of an unstructured grid. */
  static byte[] grid(Style style, int... types) {
    VtkXmlFiles file = new VtkXmlFiles(style);
    file.begin("UnstructuredGrid");
    file.head.append("<Piece NumberOfPoints=\"4\" NumberOfCells=\"" + types.length + "\"><Points>");
    file.array("Float32", "Points", new double[] {0, 0, 0, 1, 0, 0, 1, 1, 0, 0, 1, 0});
    file.head.append("</Points><Cells>");
    double[] corners = new double[4 * types.length];
    double[] ends = new double[types.length];
    for (int k = 0; k < corners.length; k++) {
      corners[k] = k % 4;
    }
    for (int k = 0; k < ends.length; k++) {
      ends[k] = 4 * (k + 1);
    }
    file.array("Int64", "connectivity", corners);
    file.array("Int64", "offsets", ends);
    file.array("UInt8", "types", Arrays.stream(types).asDoubleStream().toArray());
    file.head.append("</Cells></Piece></UnstructuredGrid>");
    return file.end();
  }

  private void begin(String type) {
    String order = style.order() == ByteOrder.BIG_ENDIAN ? "BigEndian" : "LittleEndian";
    head.append("<?xml version=\"1.0\"?>\n<VTKFile type=\"" + type + "\" version=\"1.0\"");
    head.append(" byte_order=\"" + order + "\"");
    head.append(style.longHeaders() ? " header_type=\"UInt64\"" : "");
    head.append(style.zlib() ? " compressor=\"vtkZLibDataCompressor\"" : "");
    head.append(">\n<" + type + ">\n");
  }

  private byte[] end() {
    ByteArrayOutputStream file = new ByteArrayOutputStream();
    boolean raw = style.form() == Form.APPENDED_RAW;
    if (raw || style.form() == Form.APPENDED_BASE64) {
      head.append("<AppendedData encoding=\"" + (raw ? "raw" : "base64") + "\">\n   _");
      file.writeBytes(head.toString().getBytes(StandardCharsets.UTF_8));
      file.writeBytes(appended.toByteArray());
      file.writeBytes("\n</AppendedData>\n</VTKFile>\n".getBytes(StandardCharsets.UTF_8));
    } else {
      file.writeBytes(head.append("</VTKFile>\n").toString().getBytes(StandardCharsets.UTF_8));
    }
    return file.toByteArray();
  }

  private void array(String type, String name, double[] values) {
    head.append("<DataArray type=\"" + type + "\" Name=\"" + name + "\"");
    switch (style.form()) {
      case ASCII -> {
        head.append(" format=\"ascii\">\n");
        for (double value : values) {
          head.append(type.startsWith("Float") ? " " + value : " " + (long) value);
        }
        head.append("\n<InformationKey name=\"range\"><Value>7</Value></InformationKey>");
      }
      case INLINE -> head.append(" format=\"binary\">\n  " + base64(type, values) + "\n");
      case APPENDED_BASE64 -> {
        head.append(" format=\"appended\" offset=\"" + appended.size() + "\">");
        appended.writeBytes(base64(type, values).getBytes(StandardCharsets.US_ASCII));
      }
      case APPENDED_RAW -> {
        head.append(" format=\"appended\" offset=\"" + appended.size() + "\">");
        byte[] data = bytes(type, values);
        appended.writeBytes(header(data));
        appended.writeBytes(style.zlib() ? packed(data) : data);
      }
    }
    head.append("</DataArray>\n");
  }

  /** Unpacked, header and data are encoded as one; packed, each for itself. */
  private String base64(String type, double[] values) {
    Base64.Encoder encoder = Base64.getEncoder();
    byte[] data = bytes(type, values);
    byte[] header = header(data);
    if (style.zlib()) {
      return encoder.encodeToString(header) + encoder.encodeToString(packed(data));
    }
    byte[] both = Arrays.copyOf(header, header.length + data.length);
    System.arraycopy(data, 0, both, header.length, data.length);
    return encoder.encodeToString(both);
  }

  private byte[] header(byte[] data) {
    List<Long> sizes = new ArrayList<>();
    if (style.zlib()) {
      int blocks = (data.length + BLOCK - 1) / BLOCK;
      sizes.add((long) blocks);
      if (blocks > 0) {
        sizes.add((long) BLOCK);
        sizes.add((long) (data.length % BLOCK));
      }
      for (int k = 0; k < blocks; k++) {
        sizes.add((long) block(data, k).length);
      }
    } else {
      sizes.add((long) data.length);
    }
    ByteWriter header = new ByteWriter(style.order());
    for (long size : sizes) {
      if (style.longHeaders()) {
        header.longs(size);
      } else {
        header.ints((int) size);
      }
    }
    return header.toBytes();
  }

  private static byte[] packed(byte[] data) {
    ByteArrayOutputStream all = new ByteArrayOutputStream();
    for (int k = 0; k * BLOCK < data.length; k++) {
      all.writeBytes(block(data, k));
    }
    return all.toByteArray();
  }

  private static byte[] block(byte[] data, int k) {
    Deflater deflater = new Deflater();
    deflater.setInput(data, k * BLOCK, Math.min(BLOCK, data.length - k * BLOCK));
    deflater.finish();
    byte[] packed = new byte[4 * BLOCK];
    int size = deflater.deflate(packed);
    deflater.end();
    return Arrays.copyOf(packed, size);
  }

  private byte[] bytes(String type, double[] values) {
    ByteWriter bytes = new ByteWriter(style.order());
    for (double value : values) {
      switch (type) {
        case "Float32" -> bytes.floats(value);
        case "Float64" -> bytes.doubles(value);
        case "Int64" -> bytes.longs((long) value);
        case "Int32" -> bytes.ints((int) value);
        case "UInt16" -> bytes.shorts((int) value);
        default -> bytes.bytes((byte) value);
      }
    }
    return bytes.toBytes();
  }
}
