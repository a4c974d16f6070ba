package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteOrder;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What the header of a PLY file declares.
 *
 * @param order the order of bytes; empty where the numbers are text
 */
record PlyHeader(Optional<ByteOrder> order, List<Element> elements) {
  /** No sound file has more; a damaged one is not to be followed further. */
  private static final int MOST_LINES = 10_000;

  /** A kind of things, of which there are {@code count}. */
  record Element(String name, long count, List<Property> properties) {
    /** Bytes of one of them in binary, empty where that differs from one to the next. */
    Optional<Integer> size() {
      int size = 0;
      for (Property property : properties) {
        if (property.countType().isPresent()) {
          return Optional.empty();
        }
        size += property.type().size();
      }
      return Optional.of(size);
    }
  }

  /** A number, or a list of numbers with a type for the count before it. */
  record Property(String name, ScalarType type, Optional<ScalarType> countType) {}

  /** Reads the header, up to the end of its last line. */
  static PlyHeader read(TextCursor text) throws IOException, MeshFault {
    text.skipBlanks();
    if (!text.word("the word 'ply'").equals("ply")) {
      throw text.fault("a PLY file begins with the word 'ply'");
    }
    endLine(text);
    Optional<ByteOrder> order = Optional.empty();
    boolean hasFormat = false;
    List<Element> elements = new ArrayList<>();
    for (int line = 2; line < MOST_LINES; line++) {
      if (!text.skipSpace()) {
        throw text.fault("the file ends inside its header");
      }
      String word = text.word("a line of the header");
      switch (word) {
        case "comment", "obj_info" -> text.skipComment();
        case "format" -> {
          order = readFormat(text);
          hasFormat = true;
          endLine(text);
        }
        case "element" -> {
          elements.add(readElement(text, elements));
          endLine(text);
        }
        case "property" -> {
          if (elements.isEmpty()) {
            throw text.fault("a property stands before the first element");
          }
          elements.get(elements.size() - 1).properties().add(readProperty(text));
          endLine(text);
        }
        case "end_header" -> {
          if (!hasFormat) {
            throw text.fault("the header has no line 'format'");
          }
          return new PlyHeader(order, elements);
        }
        default -> throw text.fault("'" + word + "' is not a line of a PLY header");
      }
    }
    throw text.fault("a header of more than " + MOST_LINES + " lines");
  }

  /** Passes the end of a line of the header, on which nothing more may stand. */
  static void endLine(TextCursor text) throws IOException, MeshFault {
    if (text.skipBlanks()) {
      throw text.faultNext("the end of the line");
    }
    text.endLine();
  }

  private static String word(TextCursor text, String wanted) throws IOException, MeshFault {
    text.skipBlanks();
    return text.word(wanted);
  }

  private static Optional<ByteOrder> readFormat(TextCursor text) throws IOException, MeshFault {
    String format = word(text, "'ascii', 'binary_little_endian' or 'binary_big_endian'");
    Optional<ByteOrder> order =
        switch (format) {
          case "ascii" -> Optional.empty();
          case "binary_little_endian" -> Optional.of(ByteOrder.LITTLE_ENDIAN);
          case "binary_big_endian" -> Optional.of(ByteOrder.BIG_ENDIAN);
          default -> throw text.fault("'" + format + "' is not a format of PLY files");
        };
    String version = word(text, "the version 1.0");
    if (!version.equals("1.0")) {
      throw text.fault("version '" + version + "' is not known; it must be 1.0");
    }
    return order;
  }

  private static Element readElement(TextCursor text, List<Element> before)
      throws IOException, MeshFault {
    String name = word(text, "the name of the element");
    if (before.stream().anyMatch(element -> element.name().equals(name))) {
      throw text.fault("element '" + name + "' is declared twice");
    }
    text.skipBlanks();
    long count = text.whole("how many there are");
    if (count < 0) {
      throw text.fault("a count of " + count);
    }
    return new Element(name, count, new ArrayList<>());
  }

  private static Property readProperty(TextCursor text) throws IOException, MeshFault {
    String type = word(text, "a type");
    Optional<ScalarType> countType = Optional.empty();
    if (type.equals("list")) {
      countType = Optional.of(type(text, word(text, "the type of the list's count")));
      type = word(text, "the type of the list's numbers");
    }
    ScalarType itemType = type(text, type);
    return new Property(word(text, "the name of the property"), itemType, countType);
  }

  private static ScalarType type(TextCursor text, String name) throws MeshFault {
    return switch (name) {
      case "char", "int8" -> ScalarType.INT8;
      case "uchar", "uint8" -> ScalarType.UINT8;
      case "short", "int16" -> ScalarType.INT16;
      case "ushort", "uint16" -> ScalarType.UINT16;
      case "int", "int32" -> ScalarType.INT32;
      case "uint", "uint32" -> ScalarType.UINT32;
      case "float", "float32" -> ScalarType.FLOAT32;
      case "double", "float64" -> ScalarType.FLOAT64;
      default -> throw text.fault("'" + name + "' is not a type of PLY files");
    };
  }
}
