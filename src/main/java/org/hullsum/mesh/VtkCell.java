package org.hullsum.mesh;

/**
 * What is done with a cell of an unstructured grid, by the number of its type (W. Schroeder, K.
 * Martin, B. Lorensen, The Visualization Toolkit, 4th edition 2006, section 5.2 and the file
 * formats).
 */
enum VtkCell {
  /** Points and lines have no area. */
  NO_AREA {
    @Override
    void tell(FaceAccumulator faces, FaultPlace place) {}
  },
  TRIANGLE {
    @Override
    void tell(FaceAccumulator faces, FaultPlace place) throws MeshFault {
      faces.requireCorners(3, place);
      faces.polygon(place);
    }
  },
  STRIP {
    @Override
    void tell(FaceAccumulator faces, FaultPlace place) throws MeshFault {
      faces.strip(place);
    }
  },
  POLYGON {
    @Override
    void tell(FaceAccumulator faces, FaultPlace place) throws MeshFault {
      faces.polygon(place);
    }
  },
  PIXEL {
    @Override
    void tell(FaceAccumulator faces, FaultPlace place) throws MeshFault {
      faces.pixel(place);
    }
  },
  QUADRILATERAL {
    @Override
    void tell(FaceAccumulator faces, FaultPlace place) throws MeshFault {
      faces.requireCorners(4, place);
      faces.polygon(place);
    }
  },
  VOLUME {
    @Override
    void tell(FaceAccumulator faces, FaultPlace place) throws MeshFault {
      throw place.fault("a volume cell: a surface is wanted, so write the boundary of the volume");
    }
  },
  CURVED {
    @Override
    void tell(FaceAccumulator faces, FaultPlace place) throws MeshFault {
      throw place.fault(
          "a curved surface cell: only triangles and polygons of straight edges are"
              + " read, so divide it into these");
    }
  },
  UNKNOWN {
    @Override
    void tell(FaceAccumulator faces, FaultPlace place) throws MeshFault {
      throw place.fault("a cell of a type that is not known");
    }
  };

  /** Tells the face whose corners have been given. */
  abstract void tell(FaceAccumulator faces, FaultPlace place) throws MeshFault;

  /** The kind of a cell by the number of its type. */
  static VtkCell of(int type) {
    return switch (type) {
      case 0, 1, 2, 3, 4, 21, 35, 68, 75 -> NO_AREA;
      case 5 -> TRIANGLE;
      case 6 -> STRIP;
      case 7 -> POLYGON;
      case 8 -> PIXEL;
      case 9 -> QUADRILATERAL;
      case 10,
          11,
          12,
          13,
          14,
          15,
          16,
          24,
          25,
          26,
          27,
          29,
          31,
          32,
          33,
          37,
          41,
          42,
          71,
          72,
          73,
          74,
          78,
          79,
          80,
          81 ->
          VOLUME;
      case 22, 23, 28, 30, 34, 36, 69, 70, 76, 77 -> CURVED;
      default -> UNKNOWN;
    };
  }
}
