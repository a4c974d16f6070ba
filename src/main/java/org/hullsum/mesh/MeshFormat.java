package org.hullsum.mesh;

import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** A format in which triangle meshes are exchanged. */
public enum MeshFormat {
  STL("STL"),
  PLY("PLY"),
  OBJ("OBJ"),
  VTK_LEGACY("legacy VTK"),
  VTK_XML("VTK in XML");

  /** Bytes that suffice to know a format. */
  static final int HEAD = 4096;

  private static final List<String> OBJ_STATEMENTS =
      List.of("v", "vn", "vt", "f", "g", "o", "s", "mtllib", "usemtl");

  private static final int STL_HEADER = 80;
  private static final int STL_TRIANGLE = 50;

  private final String title;

  MeshFormat(String title) {
    this.title = title;
  }

  /** The name as a message says it. */
  public String title() {
    return title;
  }

  /** Whether files of the format say in which unit their coordinates are; none of these does. */
  public boolean carriesUnit() {
    return false;
  }

  /**
   * Knows a format by what a file begins with, else by the ending of its name, else by what its
   * first line or its size makes likely.
   *
   * @param head the first bytes, {@link #HEAD} of them or all
   * @param size of the whole file, negative where it is not known
   */
  static Optional<MeshFormat> of(byte[] head, long size, String fileName) {
    String text = new String(head, StandardCharsets.ISO_8859_1);
    String begin = text.startsWith("\u00ef\u00bb\u00bf") ? text.substring(3) : text;
    if (begin.matches("(?s)ply\\s.*")) {
      return Optional.of(PLY);
    }
    if (begin.regionMatches(true, 0, "# vtk DataFile", 0, 14)) {
      return Optional.of(VTK_LEGACY);
    }
    if (begin.stripLeading().startsWith("<")) {
      return Optional.of(VTK_XML);
    }
    if (begin.stripLeading().matches("(?is)solid\\b.*")) {
      return Optional.of(STL);
    }
    return byExtension(fileName).or(() -> byLikelihood(head, size, text));
  }

  private static Optional<MeshFormat> byExtension(String fileName) {
    String name = fileName.toLowerCase(Locale.ROOT).replaceFirst("\\.gz$", "");
    return switch (name.substring(name.lastIndexOf('.') + 1)) {
      case "stl" -> Optional.of(STL);
      case "ply" -> Optional.of(PLY);
      case "obj" -> Optional.of(OBJ);
      case "vtk" -> Optional.of(VTK_LEGACY);
      case "vtp", "vtu" -> Optional.of(VTK_XML);
      default -> Optional.empty();
    };
  }

  private static Optional<MeshFormat> byLikelihood(byte[] head, long size, String text) {
    Optional<String> statement =
        text.lines()
            .map(String::strip)
            .filter(line -> !line.isEmpty() && !line.startsWith("#"))
            .findFirst();
    if (statement.isPresent() && OBJ_STATEMENTS.contains(statement.get().split("\\s", 2)[0])) {
      return Optional.of(OBJ);
    }
    if (head.length >= STL_HEADER + Integer.BYTES) {
      long triangles = 0;
      for (int k = Integer.BYTES - 1; k >= 0; k--) {
        triangles = triangles << Byte.SIZE | (head[STL_HEADER + k] & 0xff);
      }
      if (size == STL_HEADER + Integer.BYTES + STL_TRIANGLE * triangles) {
        return Optional.of(STL);
      }
    }
    return Optional.empty();
  }
}
