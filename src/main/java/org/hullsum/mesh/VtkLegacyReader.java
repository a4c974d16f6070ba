package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteOrder;
import java.nio.channels.ReadableByteChannel;
import java.util.Locale;

/**
 * Reads legacy VTK files of the versions 1 to 5, as text and in binary (big endian), where their
 * data set is POLYDATA (polygons and triangle strips) or UNSTRUCTURED_GRID with surface cells. The
 * points must stand before the cells. Reading ends where the values at points and cells begin,
 * since nothing of the surface stands behind them. The format has no parts and no unit.
 */
final class VtkLegacyReader {
  private static final String MAGIC = "# vtk DataFile Version ";
  private static final int LAST_VERSION = 5;

  /** From this version on, cells are two arrays: offsets and corners. */
  private static final int OFFSETS_VERSION = 5;

  private final VtkLegacyArrays file;
  private final FaceAccumulator faces;
  private final boolean hasOffsets;

  /** The cells of an unstructured grid, and the type of each. */
  private final CellList cells = new CellList();

  private final IntList types = new IntList();
  private boolean hasPoints;

  private VtkLegacyReader(VtkLegacyArrays file, int version, TriangleSink sink) {
    this.file = file;
    this.hasOffsets = version >= OFFSETS_VERSION;
    this.faces = new FaceAccumulator(sink);
  }

  /** Reads a file, as {@link MeshReader} says. */
  static void read(ReadableByteChannel channel, TriangleSink sink) throws IOException, MeshFault {
    ByteCursor bytes = new ByteCursor(channel);
    bytes.order(ByteOrder.BIG_ENDIAN);
    TextCursor text = new TextCursor(bytes, false);
    int version = readVersion(text);
    text.skipComment();
    text.skipSpace();
    String form = text.word("'ASCII' or 'BINARY'").toUpperCase(Locale.ROOT);
    if (!form.equals("ASCII") && !form.equals("BINARY")) {
      throw text.fault("'ASCII' or 'BINARY' is wanted, not '" + form + "'");
    }
    VtkLegacyArrays file = new VtkLegacyArrays(bytes, text, form.equals("BINARY"));
    new VtkLegacyReader(file, version, sink).read();
  }

  private static int readVersion(TextCursor text) throws IOException, MeshFault {
    String line = text.restOfLine();
    String[] version =
        line.regionMatches(true, 0, MAGIC, 0, MAGIC.length())
            ? line.substring(MAGIC.length()).split("\\.", 2)
            : new String[0];
    if (version.length != 2 || !version[0].matches("[1-9]")) {
      throw MeshFault.atLine(1, 1, "a legacy VTK file begins with '" + MAGIC + "x.y'");
    }
    int major = Integer.parseInt(version[0]);
    if (major > LAST_VERSION) {
      throw MeshFault.atLine(1, MAGIC.length() + 1, "version " + major + " is not known");
    }
    return major;
  }

  private void read() throws IOException, MeshFault {
    boolean isGrid = readDataset();
    boolean reading = true;
    while (reading && file.hasMore()) {
      String keyword = file.keyword();
      switch (keyword) {
        case "FIELD" -> file.skipField();
        case "METADATA" -> file.skipMetadata();
        case "POINTS" -> readPoints();
        case "POINT_DATA", "CELL_DATA" -> reading = false;
        default -> {
          boolean known = isGrid ? readGrid(keyword) : readPolygons(keyword);
          if (!known) {
            throw file.fault("'" + keyword + "' does not belong into such a data set");
          }
        }
      }
    }
    if (isGrid) {
      tellGrid();
    }
    if (faces.triangles() == 0) {
      throw file.fault("the file holds no surface: no polygons, strips or surface cells");
    }
  }

  /** Whether the data set is an unstructured grid. */
  private boolean readDataset() throws IOException, MeshFault {
    String keyword = file.keyword();
    while (keyword.equals("FIELD") || keyword.equals("METADATA")) {
      if (keyword.equals("FIELD")) {
        file.skipField();
      } else {
        file.skipMetadata();
      }
      keyword = file.keyword();
    }
    if (!keyword.equals("DATASET")) {
      throw file.fault("'DATASET' is wanted, not '" + keyword + "'");
    }
    String kind = file.keyword();
    return switch (kind) {
      case "POLYDATA" -> false;
      case "UNSTRUCTURED_GRID" -> true;
      default ->
          throw file.fault(
              "a data set of the kind '"
                  + kind
                  + "': only POLYDATA and UNSTRUCTURED_GRID hold"
                  + " surfaces that are read");
    };
  }

  private boolean readPolygons(String keyword) throws IOException, MeshFault {
    switch (keyword) {
      case "VERTICES", "LINES" -> skipCells();
      case "POLYGONS" -> readCells(VtkCell.POLYGON);
      case "TRIANGLE_STRIPS" -> readCells(VtkCell.STRIP);
      default -> {
        return false;
      }
    }
    return true;
  }

  private boolean readGrid(String keyword) throws IOException, MeshFault {
    switch (keyword) {
      case "CELLS" -> {
        if (cells.cells() > 0) {
          throw file.fault("'CELLS' stands twice");
        }
        readCells();
      }
      case "CELL_TYPES" -> readTypes();
      default -> {
        return false;
      }
    }
    return true;
  }

  private void readPoints() throws IOException, MeshFault {
    if (hasPoints) {
      throw file.fault("'POINTS' stands twice");
    }
    hasPoints = true;
    long count = file.count("the number of points");
    ScalarType type = file.type();
    ScalarSource numbers = file.numbers();
    for (long k = 0; k < count; k++) {
      double x = numbers.real(type);
      double y = numbers.real(type);
      faces.point(x, y, numbers.real(type), numbers);
    }
  }

  private void readTypes() throws IOException, MeshFault {
    long count = file.count("the number of cells");
    ScalarSource numbers = file.numbers();
    for (long k = 0; k < count; k++) {
      long type = numbers.whole(ScalarType.INT32);
      types.add((int) Math.max(-1, Math.min(Integer.MAX_VALUE, type)), numbers);
    }
  }

  private void tellGrid() throws MeshFault {
    if (types.size() != cells.cells()) {
      throw file.fault(cells.cells() + " cells and " + types.size() + " types of cells");
    }
    for (int k = 0; k < cells.cells(); k++) {
      int cell = k;
      FaultPlace place =
          message -> file.fault("cell " + cell + " of type " + types.get(cell) + ": " + message);
      VtkCell kind = VtkCell.of(types.get(k));
      cells.begin(k, faces, place);
      kind.tell(faces, place);
    }
  }

  private void skipCells() throws IOException, MeshFault {
    long first = file.count("the number of cells");
    long size = file.count("the size of the cells");
    if (hasOffsets) {
      array("OFFSETS", first);
      array("CONNECTIVITY", size);
    } else {
      file.numbers().skip(ScalarType.INT32, size);
    }
  }

  private void array(String name, long count) throws IOException, MeshFault {
    file.expect(name);
    ScalarType type = file.type();
    file.numbers().skip(type, count);
  }

  /** Reads the cells of an unstructured grid, which wait for their types. */
  private void readCells() throws IOException, MeshFault {
    long first = file.count("the number of cells");
    long size = file.count("the size of the cells");
    if (hasOffsets) {
      readOffsets(cells, first);
      ScalarType type = readConnectivityType();
      ScalarSource numbers = file.numbers();
      for (long k = 0; k < size; k++) {
        cells.corner(numbers.whole(type), numbers);
      }
      cells.requireAllCorners(numbers);
      return;
    }
    ScalarSource numbers = file.numbers();
    long left = size;
    for (long k = 0; k < first; k++) {
      long corners = corners(numbers, left);
      left -= corners + 1;
      for (long c = 0; c < corners; c++) {
        cells.corner(numbers.whole(ScalarType.INT32), numbers);
      }
      cells.end(numbers);
    }
    requireAll(left, numbers);
  }

  /** Reads and tells cells of one kind. */
  private void readCells(VtkCell kind) throws IOException, MeshFault {
    long first = file.count("the number of cells");
    long size = file.count("the size of the cells");
    if (hasOffsets) {
      CellList list = new CellList();
      readOffsets(list, first);
      ScalarType type = readConnectivityType();
      ScalarSource numbers = file.numbers();
      int at = 0;
      for (int k = 0; k < list.cells(); k++) {
        faces.begin();
        for (; at < list.ends.get(k); at++) {
          faces.corner(numbers.whole(type), numbers);
        }
        kind.tell(faces, numbers);
      }
      requireAll(size - at, numbers);
      return;
    }
    ScalarSource numbers = file.numbers();
    long left = size;
    for (long k = 0; k < first; k++) {
      long corners = corners(numbers, left);
      left -= corners + 1;
      faces.begin();
      for (long c = 0; c < corners; c++) {
        faces.corner(numbers.whole(ScalarType.INT32), numbers);
      }
      kind.tell(faces, numbers);
    }
    requireAll(left, numbers);
  }

  private static long corners(ScalarSource numbers, long left) throws IOException, MeshFault {
    long corners = numbers.whole(ScalarType.INT32);
    if (corners < 0 || corners >= left) {
      throw numbers.fault("a cell of " + corners + " corners where " + left + " numbers are left");
    }
    return corners;
  }

  private static void requireAll(long left, FaultPlace place) throws MeshFault {
    if (left != 0) {
      throw place.fault(left + " more numbers are declared than the cells have");
    }
  }

  /** Reads the offsets, which begin with 0, so that there is one more of them than cells. */
  private void readOffsets(CellList list, long count) throws IOException, MeshFault {
    file.expect("OFFSETS");
    ScalarType type = file.type();
    ScalarSource numbers = file.numbers();
    for (long k = 0; k < count; k++) {
      long offset = numbers.whole(type);
      if (k > 0) {
        list.end(offset, numbers);
      } else if (offset != 0) {
        throw numbers.fault("the first offset is " + offset + " and must be 0");
      }
    }
  }

  private ScalarType readConnectivityType() throws IOException, MeshFault {
    file.expect("CONNECTIVITY");
    return file.type();
  }
}
