package org.hullsum.mesh;

/** Cells that have to wait until their types or their ends are known. */
final class CellList {
  /** The corners of all cells in turn. */
  final IntList corners = new IntList();

  /** For each cell, the index after its last corner. */
  final IntList ends = new IntList();

  int cells() {
    return ends.size();
  }

  /** The next corner of the cell that is being read. */
  void corner(long point, FaultPlace place) throws MeshFault {
    corners.add(index(point, "point", place), place);
  }

  /** Ends the cell that is being read. */
  void end(FaultPlace place) throws MeshFault {
    ends.add(corners.size(), place);
  }

  /** The index after the last corner of the next cell, where all of these come in one array. */
  void end(long end, FaultPlace place) throws MeshFault {
    int last = ends.size() == 0 ? 0 : ends.get(ends.size() - 1);
    if (end < last) {
      throw place.fault("offset " + end + " is before the offset " + last + " of the cell before");
    }
    ends.add(index(end, "offset", place), place);
  }

  private static int index(long value, String what, FaultPlace place) throws MeshFault {
    if (value < 0 || value > Integer.MAX_VALUE) {
      throw place.fault(what + " " + value + " is not between 0 and " + Integer.MAX_VALUE);
    }
    return (int) value;
  }

  /** Refuses offsets that do not end where the corners do. */
  void requireAllCorners(FaultPlace place) throws MeshFault {
    int last = ends.size() == 0 ? 0 : ends.get(ends.size() - 1);
    if (last != corners.size()) {
      throw place.fault(
          "the last offset is " + last + " and there are " + corners.size() + " corners");
    }
  }

  /** Gives a cell's corners to the faces. */
  void begin(int cell, FaceAccumulator faces, FaultPlace place) throws MeshFault {
    faces.begin();
    for (int k = cell == 0 ? 0 : ends.get(cell - 1); k < ends.get(cell); k++) {
      faces.corner(corners.get(k), place);
    }
  }
}
