package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.List;
import org.hullsum.numeric.Vector3;

/** Pairs the kept stretches of sides that are glued: where both are kept there is no boundary. */
final class GluedSides {
  private final double joint;
  private final List<BoundaryPiece> pieces = new ArrayList<>();

  GluedSides(double joint) {
    this.joint = joint;
  }

  /** Adds a stretch, unless it is drawn to a point. */
  void add(BoundaryPiece piece) {
    if (piece.points().stream().anyMatch(p -> p.minus(piece.start()).norm() > joint)) {
      pieces.add(piece);
    }
  }

  /** Those without a partner that runs the other way. */
  List<BoundaryPiece> unmatched() {
    List<BoundaryPiece> left = new ArrayList<>();
    for (BoundaryPiece piece : pieces) {
      if (pieces.stream().noneMatch(other -> isPartner(piece, other))) {
        left.add(piece);
      }
    }
    return left;
  }

  private boolean isPartner(BoundaryPiece piece, BoundaryPiece other) {
    return isNear(piece.start(), other.end())
        && isNear(piece.end(), other.start())
        && isNear(
            piece.points().get(piece.points().size() / 2),
            other.points().get((other.points().size() - 1) / 2));
  }

  private boolean isNear(Vector3 a, Vector3 b) {
    return a.minus(b).norm() <= joint;
  }
}
