package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteOrder;
import java.nio.channels.ReadableByteChannel;
import java.util.Locale;
import javax.xml.stream.Location;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamReader;

/**
 * How the arrays of one VTK file in XML are written in binary.
 *
 * @param headerType the type of the sizes before an array
 * @param zlib whether arrays are packed
 * @param limit counts what is unpacked
 */
record VtkXmlFile(ByteOrder order, ScalarType headerType, boolean zlib, ExpansionLimit limit) {

  /** An array that an element describes. */
  record Array(VtkXmlPiece piece, VtkXmlPiece.Role role, ScalarType type, String name) {}

  /** Reads what the first element says. */
  static VtkXmlFile of(XMLStreamReader xml) throws MeshFault {
    String order = attribute(xml, "byte_order", "LittleEndian");
    String header = attribute(xml, "header_type", "UInt32");
    String compressor = attribute(xml, "compressor", "");
    if (!order.equals("LittleEndian") && !order.equals("BigEndian")) {
      throw fault(xml, "the byte order '" + order + "' is not known");
    }
    if (!header.equals("UInt32") && !header.equals("UInt64")) {
      throw fault(xml, "the type of headers '" + header + "' is not known");
    }
    if (!compressor.isEmpty() && !compressor.equals("vtkZLibDataCompressor")) {
      throw fault(
          xml, "arrays packed by '" + compressor + "' are not read: pack with zlib or not at all");
    }
    return new VtkXmlFile(
        order.equals("BigEndian") ? ByteOrder.BIG_ENDIAN : ByteOrder.LITTLE_ENDIAN,
        header.equals("UInt32") ? ScalarType.UINT32 : ScalarType.UINT64,
        !compressor.isEmpty(),
        new ExpansionLimit());
  }

  /** Takes an array in binary from bytes that begin with its header. */
  void take(Array array, ReadableByteChannel bytes, ByteCursor.Places places)
      throws IOException, MeshFault {
    ByteCursor source = cursor(bytes, places);
    if (zlib) {
      try (ZlibBlocks blocks = new ZlibBlocks(source, headerType, limit)) {
        take(array, cursor(blocks, places));
      }
      return;
    }
    long size = source.whole(headerType);
    if (size < 0) {
      throw source.fault("an array of more than 2^63 bytes");
    }
    ByteCursor.Places behindHeader =
        (offset, message) -> places.fault(offset + headerType.size(), message);
    take(array, cursor(new CursorChannel(source, size, false), behindHeader));
  }

  private void take(Array array, ByteCursor numbers) throws IOException, MeshFault {
    array.piece().take(array.role(), array.type(), new BinaryScalars(numbers));
  }

  private ByteCursor cursor(ReadableByteChannel bytes, ByteCursor.Places places) {
    ByteCursor cursor = new ByteCursor(bytes, ByteCursor.ARRAY_BUFFER, places);
    cursor.order(order);
    return cursor;
  }

  static ScalarType type(XMLStreamReader xml) throws MeshFault {
    String name = attribute(xml, "type", "");
    return switch (name) {
      case "Int8" -> ScalarType.INT8;
      case "UInt8" -> ScalarType.UINT8;
      case "Int16" -> ScalarType.INT16;
      case "UInt16" -> ScalarType.UINT16;
      case "Int32" -> ScalarType.INT32;
      case "UInt32" -> ScalarType.UINT32;
      case "Int64" -> ScalarType.INT64;
      case "UInt64" -> ScalarType.UINT64;
      case "Float32" -> ScalarType.FLOAT32;
      case "Float64" -> ScalarType.FLOAT64;
      default -> throw fault(xml, "'" + name + "' is not a type of numbers");
    };
  }

  static String attribute(XMLStreamReader xml, String name, String absent) {
    String value = xml.getAttributeValue(null, name);
    return value == null ? absent : value.strip();
  }

  /** A count among the attributes, 0 where it is absent. */
  static long count(XMLStreamReader xml, String name) throws MeshFault {
    String value = attribute(xml, name, "0");
    if (!value.matches("[0-9]{1,18}")) {
      throw fault(xml, name + " is '" + value + "' and must be a count");
    }
    return Long.parseLong(value);
  }

  /** A fault where the parser stands. */
  static MeshFault fault(XMLStreamReader xml, String message) {
    return fault(xml.getLocation(), message);
  }

  static MeshFault fault(Location at, String message) {
    return MeshFault.atLine(
        Math.max(1, at.getLineNumber()), Math.max(1, at.getColumnNumber()), message);
  }

  /** What the parser, or the stream that it reads, finds wrong. */
  static MeshFault fault(XMLStreamException broken) {
    if (broken.getNestedException() instanceof CarriedFault carried) {
      return carried.fault();
    }
    String message = String.valueOf(broken.getMessage());
    String told = message.substring(message.indexOf('\n') + 1);
    Location at = broken.getLocation();
    String full = String.format(Locale.ROOT, "the XML is not sound: %s", told);
    return at == null ? MeshFault.atLine(1, 1, full) : fault(at, full);
  }
}
