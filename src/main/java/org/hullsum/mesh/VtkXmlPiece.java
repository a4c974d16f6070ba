package org.hullsum.mesh;

import java.io.IOException;
import java.util.Optional;

/** The points and cells of one piece of a VTK file in XML, array by array. */
final class VtkXmlPiece {
  /** What an array is for. */
  enum Role {
    POINTS,
    POLYGON_CORNERS,
    POLYGON_ENDS,
    STRIP_CORNERS,
    STRIP_ENDS,
    CELL_CORNERS,
    CELL_ENDS,
    CELL_TYPES;

    /** The role of an array by the element around it and its name, if it is one of ours. */
    static Optional<Role> of(String around, String name) {
      if (around.equals("Points")) {
        return Optional.of(POINTS);
      }
      return switch (around + "/" + name) {
        case "Polys/connectivity" -> Optional.of(POLYGON_CORNERS);
        case "Polys/offsets" -> Optional.of(POLYGON_ENDS);
        case "Strips/connectivity" -> Optional.of(STRIP_CORNERS);
        case "Strips/offsets" -> Optional.of(STRIP_ENDS);
        case "Cells/connectivity" -> Optional.of(CELL_CORNERS);
        case "Cells/offsets" -> Optional.of(CELL_ENDS);
        case "Cells/types" -> Optional.of(CELL_TYPES);
        default -> Optional.empty();
      };
    }
  }

  /**
   * How many of each the piece declares to have.
   *
   * @param cells of an unstructured grid
   */
  record Counts(long points, long polygons, long strips, long cells) {}

  private final Counts counts;
  private final FaultPlace place;
  private final DoubleList points = new DoubleList();
  private final CellList polygons = new CellList();
  private final CellList strips = new CellList();
  private final CellList cells = new CellList();
  private final IntList types = new IntList();

  /**
   * Makes a piece without arrays.
   *
   * @param place where the piece begins
   */
  VtkXmlPiece(Counts counts, FaultPlace place) {
    this.counts = counts;
    this.place = place;
  }

  /** Takes an array, which ends where the numbers do. */
  void take(Role role, ScalarType type, ScalarSource numbers) throws IOException, MeshFault {
    if (role != Role.POINTS && !type.isWhole()) {
      throw numbers.fault("whole numbers are wanted, not those of the type " + type);
    }
    switch (role) {
      case POINTS -> takePoints(type, numbers);
      case POLYGON_CORNERS -> takeCorners(polygons, type, numbers);
      case POLYGON_ENDS -> takeEnds(polygons, counts.polygons(), type, numbers);
      case STRIP_CORNERS -> takeCorners(strips, type, numbers);
      case STRIP_ENDS -> takeEnds(strips, counts.strips(), type, numbers);
      case CELL_CORNERS -> takeCorners(cells, type, numbers);
      case CELL_ENDS -> takeEnds(cells, counts.cells(), type, numbers);
      case CELL_TYPES -> takeTypes(type, numbers);
    }
  }

  private void takePoints(ScalarType type, ScalarSource numbers) throws IOException, MeshFault {
    while (numbers.hasMore()) {
      if (points.size() / 3 >= counts.points()) {
        throw numbers.fault("more points than the " + counts.points() + " that the piece declares");
      }
      double number = numbers.real(type);
      if (!Double.isFinite(number)) {
        throw numbers.fault("a coordinate must be finite, not " + number);
      }
      points.add(number, numbers);
    }
  }

  private void takeCorners(CellList list, ScalarType type, ScalarSource numbers)
      throws IOException, MeshFault {
    while (numbers.hasMore()) {
      long corner = numbers.whole(type);
      if (corner < 0 || corner >= counts.points()) {
        throw numbers.fault(
            "point " + corner + " is not among the " + counts.points() + " points of the piece");
      }
      list.corner(corner, numbers);
    }
  }

  private static void takeEnds(CellList list, long count, ScalarType type, ScalarSource numbers)
      throws IOException, MeshFault {
    while (numbers.hasMore()) {
      if (list.cells() >= count) {
        throw numbers.fault("more offsets than the " + count + " cells that the piece declares");
      }
      list.end(numbers.whole(type), numbers);
    }
  }

  private void takeTypes(ScalarType type, ScalarSource numbers) throws IOException, MeshFault {
    while (numbers.hasMore()) {
      if (types.size() >= counts.cells()) {
        throw numbers.fault(
            "more types than the " + counts.cells() + " cells that the piece declares");
      }
      types.add((int) Math.max(-1, Math.min(Integer.MAX_VALUE, numbers.whole(type))), numbers);
    }
  }

  /** Tells the piece's points and faces. */
  void tell(FaceAccumulator faces) throws MeshFault {
    if (points.size() % 3 != 0) {
      throw place.fault("the coordinates of the last point are not complete");
    }
    require("points", points.size() / 3, counts.points());
    require("polygons", polygons.cells(), counts.polygons());
    require("strips", strips.cells(), counts.strips());
    require("cells", cells.cells(), counts.cells());
    require("types of cells", types.size(), counts.cells());
    faces.forgetPoints();
    for (int k = 0; k < points.size(); k += 3) {
      faces.point(points.get(k), points.get(k + 1), points.get(k + 2), place);
    }
    tell(polygons, VtkCell.POLYGON, faces);
    tell(strips, VtkCell.STRIP, faces);
    cells.requireAllCorners(place);
    for (int k = 0; k < cells.cells(); k++) {
      tell(cells, k, VtkCell.of(types.get(k)), faces);
    }
  }

  private void require(String what, long found, long declared) throws MeshFault {
    if (found != declared) {
      throw place.fault("the piece declares " + declared + " " + what + " and has " + found);
    }
  }

  private void tell(CellList list, VtkCell kind, FaceAccumulator faces) throws MeshFault {
    list.requireAllCorners(place);
    for (int k = 0; k < list.cells(); k++) {
      tell(list, k, kind, faces);
    }
  }

  private void tell(CellList list, int cell, VtkCell kind, FaceAccumulator faces) throws MeshFault {
    FaultPlace at = message -> place.fault("cell " + cell + " of the piece: " + message);
    list.begin(cell, faces, at);
    kind.tell(faces, at);
  }
}
