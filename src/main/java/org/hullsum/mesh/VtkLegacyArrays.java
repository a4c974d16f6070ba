package org.hullsum.mesh;

import java.io.IOException;
import java.util.Locale;

/** Words, numbers and arrays of a legacy VTK file, whose words are text even where it is binary. */
final class VtkLegacyArrays implements FaultPlace {
  private final ByteCursor bytes;
  private final TextCursor text;
  private final ScalarSource numbers;
  private final boolean binary;

  VtkLegacyArrays(ByteCursor bytes, TextCursor text, boolean binary) {
    this.bytes = bytes;
    this.text = text;
    this.binary = binary;
    this.numbers = binary ? new BinaryScalars(bytes) : new TextScalars(text);
  }

  /** In a binary file, lines mean nothing. */
  @Override
  public MeshFault fault(String message) {
    return binary ? bytes.fault(message) : text.fault(message);
  }

  private MeshFault inFile(MeshFault fault) {
    return binary ? bytes.fault(fault.getMessage()) : fault;
  }

  boolean hasMore() throws IOException, MeshFault {
    return text.skipSpace();
  }

  /** The next word, in capitals: the words of the format may be written in either. */
  String keyword() throws IOException, MeshFault {
    return word().toUpperCase(Locale.ROOT);
  }

  String word() throws IOException, MeshFault {
    text.skipSpace();
    try {
      return text.word("a word of the format");
    } catch (MeshFault fault) {
      throw inFile(fault);
    }
  }

  void expect(String keyword) throws IOException, MeshFault {
    String word = keyword();
    if (!word.equals(keyword)) {
      throw fault("'" + keyword + "' is wanted, not '" + word + "'");
    }
  }

  /** The next number on the line, which counts something. */
  long count(String what) throws IOException, MeshFault {
    try {
      text.skipBlanks();
      long count = text.whole(what);
      if (count < 0) {
        throw text.fault(what + " is " + count);
      }
      return count;
    } catch (MeshFault fault) {
      throw inFile(fault);
    }
  }

  /** The numbers that follow the end of the line. */
  ScalarSource numbers() throws IOException, MeshFault {
    if (text.skipBlanks()) {
      throw inFile(text.faultNext("the end of the line"));
    }
    text.endLine();
    return numbers;
  }

  ScalarType type() throws IOException, MeshFault {
    return type(word().toLowerCase(Locale.ROOT));
  }

  private ScalarType type(String name) throws MeshFault {
    return switch (name) {
      case "char", "signed_char", "vtktypeint8" -> ScalarType.INT8;
      case "unsigned_char", "vtktypeuint8" -> ScalarType.UINT8;
      case "short", "vtktypeint16" -> ScalarType.INT16;
      case "unsigned_short", "vtktypeuint16" -> ScalarType.UINT16;
      // Numbers of points are written with 32 bits, whatever the program that wrote them used.
      case "int", "vtktypeint32", "vtkidtype" -> ScalarType.INT32;
      case "unsigned_int", "vtktypeuint32" -> ScalarType.UINT32;
      case "long", "vtktypeint64" -> ScalarType.INT64;
      case "unsigned_long", "vtktypeuint64" -> ScalarType.UINT64;
      case "float" -> ScalarType.FLOAT32;
      case "double" -> ScalarType.FLOAT64;
      default -> throw fault("'" + name + "' is not a type of numbers");
    };
  }

  /** Passes a field: its name and number of arrays, then arrays that each say their size. */
  void skipField() throws IOException, MeshFault {
    word();
    long arrays = count("the number of arrays of the field");
    for (long k = 0; k < arrays; k++) {
      String name = keyword();
      if (name.equals("METADATA")) {
        skipMetadata();
        name = keyword();
      }
      if (!name.equals("NULL_ARRAY")) {
        skipArray();
      }
    }
  }

  private void skipArray() throws IOException, MeshFault {
    long components = count("the number of components");
    long tuples = count("the number of tuples");
    if (components != 0 && tuples > Long.MAX_VALUE / components) {
      throw fault("an array larger than any file");
    }
    long count = components * tuples;
    String type = word().toLowerCase(Locale.ROOT);
    switch (type) {
      case "bit" -> {
        long size = count / Byte.SIZE + (count % Byte.SIZE == 0 ? 0 : 1);
        numbers().skip(ScalarType.INT8, binary ? size : count);
      }
      case "string" -> {
        numbers();
        for (long k = 0; k < count; k++) {
          skipString();
        }
      }
      default -> {
        ScalarType known = type(type);
        numbers().skip(known, count);
      }
    }
  }

  /**
   * Passes a string: in text, a line; in binary, its length in 1, 2, 4 or 8 bytes, of which the
   * first two bits say which (3, 2, 1, 0), and its bytes.
   */
  private void skipString() throws IOException, MeshFault {
    if (bytes.peek() == ByteCursor.END) {
      throw fault("the file ends inside an array of strings");
    }
    if (!binary) {
      text.skipComment();
      return;
    }
    int lead = bytes.peek() >> 6;
    ScalarType type =
        switch (lead) {
          case 3 -> ScalarType.UINT8;
          case 2 -> ScalarType.UINT16;
          case 1 -> ScalarType.UINT32;
          default -> ScalarType.INT64;
        };
    int bits = Byte.SIZE * type.size() - 2;
    bytes.skip(bytes.whole(type) & ((1L << bits) - 1), "a string");
  }

  /** Passes lines up to an empty one, which end what is said about the array before. */
  void skipMetadata() throws IOException, MeshFault {
    text.skipLine();
    while (text.skipBlanks()) {
      text.skipLine();
    }
  }
}
