package org.hullsum.mesh;

import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.nio.channels.ReadableByteChannel;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import javax.xml.stream.Location;
import javax.xml.stream.XMLInputFactory;
import javax.xml.stream.XMLStreamConstants;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamReader;

/**
 * Reads VTK files in XML whose type is PolyData (polygons and strips) or UnstructuredGrid with
 * surface cells, in any number of pieces: arrays as text, as base64, or appended as base64 or raw,
 * of both byte orders, packed with zlib or not. The format has no parts and no unit. Pieces are
 * told in the order of the file, without welding what they share.
 */
final class VtkXmlReader {
  private final XMLStreamReader xml;
  private final VtkXmlFile file;
  private final List<VtkXmlPiece> pieces = new ArrayList<>();
  private final List<Appended> appended = new ArrayList<>();
  private boolean appendedBase64;

  /** An array that stands in the appended data. */
  private record Appended(long offset, VtkXmlFile.Array array) {}

  private VtkXmlReader(XMLStreamReader xml, VtkXmlFile file) {
    this.xml = xml;
    this.file = file;
  }

  /** Reads a file, as {@link MeshReader} says. */
  static void read(ReadableByteChannel channel, TriangleSink sink) throws IOException, MeshFault {
    ByteCursor bytes = new ByteCursor(channel);
    skipMark(bytes);
    XmlHeadStream head = new XmlHeadStream(bytes);
    VtkXmlReader reader;
    try {
      XMLStreamReader xml = parser().createXMLStreamReader(letters(head));
      reader = new VtkXmlReader(xml, readRoot(xml));
      reader.readHead();
    } catch (XMLStreamException broken) {
      throw VtkXmlFile.fault(broken);
    } catch (CarriedFault carried) {
      throw carried.fault();
    }
    if (!reader.appended.isEmpty()) {
      if (!head.atAppendedData()) {
        throw bytes.fault("the file ends without the appended data that its arrays refer to");
      }
      reader.readAppended(bytes);
    }
    reader.tell(sink, bytes);
  }

  /** Passes the mark of UTF-8 that some programs write first. */
  private static void skipMark(ByteCursor bytes) throws IOException, MeshFault {
    if (bytes.available(3) == 3 && bytes.peek() == 0xef && bytes.peekSecond() == 0xbb) {
      bytes.advance(3);
    }
  }

  /**
   * Each byte as a letter: what is read of a file is ASCII, and the platform's parser reports bytes
   * that it cannot decode on the standard error stream.
   */
  private static Reader letters(InputStream head) {
    return new InputStreamReader(head, StandardCharsets.ISO_8859_1);
  }

  /** The platform's parser, which must follow nothing that leads out of the file. */
  private static XMLInputFactory parser() {
    XMLInputFactory factory = XMLInputFactory.newDefaultFactory();
    factory.setProperty(XMLInputFactory.SUPPORT_DTD, false);
    factory.setProperty(XMLInputFactory.IS_SUPPORTING_EXTERNAL_ENTITIES, false);
    factory.setProperty(XMLInputFactory.IS_NAMESPACE_AWARE, false);
    return factory;
  }

  private static VtkXmlFile readRoot(XMLStreamReader xml) throws XMLStreamException, MeshFault {
    while (!xml.isStartElement() && xml.hasNext()) {
      if (xml.next() == XMLStreamConstants.DTD) {
        throw VtkXmlFile.fault(xml, "a document type is declared, which a VTK file has not");
      }
    }
    if (!xml.getLocalName().equals("VTKFile")) {
      throw VtkXmlFile.fault(
          xml, "'VTKFile' is wanted as first element, not '" + xml.getLocalName() + "'");
    }
    String type = VtkXmlFile.attribute(xml, "type", "");
    if (!type.equals("PolyData") && !type.equals("UnstructuredGrid")) {
      throw VtkXmlFile.fault(
          xml,
          "a VTK file of the type '"
              + type
              + "': only PolyData and UnstructuredGrid hold surfaces"
              + " that are read");
    }
    return VtkXmlFile.of(xml);
  }

  private void readHead() throws XMLStreamException, IOException, MeshFault {
    String around = "";
    while (xml.hasNext()) {
      int event = xml.next();
      if (event != XMLStreamConstants.START_ELEMENT) {
        continue;
      }
      String name = xml.getLocalName();
      switch (name) {
        case "Piece" -> pieces.add(piece());
        case "AppendedData" -> readEncoding();
        case "DataArray", "Array" -> {
          String arrayName = VtkXmlFile.attribute(xml, "Name", "");
          Optional<VtkXmlPiece.Role> role =
              pieces.isEmpty() ? Optional.empty() : VtkXmlPiece.Role.of(around, arrayName);
          if (role.isPresent()) {
            VtkXmlPiece piece = pieces.get(pieces.size() - 1);
            ScalarType type = VtkXmlFile.type(xml);
            readArray(new VtkXmlFile.Array(piece, role.get(), type, arrayName));
          } else {
            new XmlText(xml).skip();
          }
        }
        default -> around = name;
      }
    }
  }

  private VtkXmlPiece piece() throws MeshFault {
    Location location = xml.getLocation();
    VtkXmlPiece.Counts counts =
        new VtkXmlPiece.Counts(
            VtkXmlFile.count(xml, "NumberOfPoints"),
            VtkXmlFile.count(xml, "NumberOfPolys"),
            VtkXmlFile.count(xml, "NumberOfStrips"),
            VtkXmlFile.count(xml, "NumberOfCells"));
    int line = location.getLineNumber();
    int column = location.getColumnNumber();
    return new VtkXmlPiece(
        counts, message -> MeshFault.atLine(Math.max(1, line), Math.max(1, column), message));
  }

  private void readEncoding() throws MeshFault {
    String encoding = VtkXmlFile.attribute(xml, "encoding", "base64");
    if (!encoding.equals("raw") && !encoding.equals("base64")) {
      throw VtkXmlFile.fault(xml, "the encoding '" + encoding + "' is not known");
    }
    appendedBase64 = encoding.equals("base64");
  }

  private void readArray(VtkXmlFile.Array array) throws IOException, MeshFault {
    String format = VtkXmlFile.attribute(xml, "format", "ascii");
    Location location = xml.getLocation();
    int line = Math.max(1, location.getLineNumber());
    int column = Math.max(1, location.getColumnNumber());
    XmlText text = new XmlText(xml);
    ByteCursor.Places places =
        (offset, message) ->
            MeshFault.atLine(
                line,
                column,
                "byte " + offset + " of the array '" + array.name() + "': " + message);
    switch (format) {
      case "ascii" -> {
        ByteCursor letters = new ByteCursor(text, ByteCursor.ARRAY_BUFFER, places);
        TextCursor numbers = new TextCursor(letters, false, line, column);
        array.piece().take(array.role(), array.type(), new TextScalars(numbers));
      }
      case "binary" -> {
        ByteCursor letters = new ByteCursor(text, ByteCursor.ARRAY_BUFFER, places);
        file.take(array, new Base64Channel(letters), places);
      }
      case "appended" -> appended.add(new Appended(VtkXmlFile.count(xml, "offset"), array));
      default -> throw VtkXmlFile.fault(xml, "the format '" + format + "' is not known");
    }
    text.skip();
  }

  /** Reads the appended arrays in the order in which they stand. */
  private void readAppended(ByteCursor bytes) throws IOException, MeshFault {
    int next = bytes.peek();
    while (next == ' ' || next == '\n' || next == '\r' || next == '\t') {
      bytes.advance(1);
      next = bytes.peek();
    }
    if (next != '_') {
      throw bytes.fault("appended data begin with '_'");
    }
    bytes.advance(1);
    long start = bytes.offset();
    appended.sort(Comparator.comparingLong(Appended::offset));
    for (int k = 0; k < appended.size(); k++) {
      long offset = appended.get(k).offset();
      long end = k + 1 < appended.size() ? appended.get(k + 1).offset() : Long.MAX_VALUE;
      if (end == offset) {
        throw bytes.fault("two arrays have the same offset " + offset);
      }
      bytes.skip(start + offset - bytes.offset(), "what stands before an appended array");
      readAppended(bytes, end - offset, appended.get(k).array());
    }
  }

  private void readAppended(ByteCursor bytes, long length, VtkXmlFile.Array array)
      throws IOException, MeshFault {
    long start = bytes.offset();
    CursorChannel stretch = new CursorChannel(bytes, length, true);
    if (appendedBase64) {
      ByteCursor letters =
          new ByteCursor(
              stretch,
              ByteCursor.ARRAY_BUFFER,
              (offset, message) -> MeshFault.atByte(start + offset, message));
      file.take(array, new Base64Channel(letters), unpacked(start, array));
    } else if (file.zlib()) {
      file.take(array, stretch, unpacked(start, array));
    } else {
      file.take(array, stretch, (offset, message) -> MeshFault.atByte(start + offset, message));
    }
  }

  /** Tells where the array begins, and how far into it the fault is. */
  private static ByteCursor.Places unpacked(long start, VtkXmlFile.Array array) {
    return (offset, message) ->
        MeshFault.atByte(
            start, "byte " + offset + " of the array '" + array.name() + "': " + message);
  }

  private void tell(TriangleSink sink, FaultPlace end) throws MeshFault {
    FaceAccumulator faces = new FaceAccumulator(sink);
    for (VtkXmlPiece piece : pieces) {
      piece.tell(faces);
    }
    if (faces.triangles() == 0) {
      throw end.fault("the file holds no surface: no polygons, strips or surface cells");
    }
  }
}
