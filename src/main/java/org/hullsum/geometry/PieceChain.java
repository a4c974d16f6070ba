package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.numeric.Vector3;

/** Joins pieces of boundary, end to start, into curves as long as can be. */
final class PieceChain {
  private final double joint;
  private final List<BoundaryPiece> pieces;
  private final boolean[] used;

  /** Pieces by the cube of space, of twice the joint's size, in which they start. */
  private final Map<Cube, List<Integer>> starts = new HashMap<>();

  private record Cube(long i, long j, long k) {}

  PieceChain(List<BoundaryPiece> pieces, double joint) {
    this.joint = joint;
    this.pieces =
        pieces.stream()
            .filter(
                piece ->
                    piece.points().stream().anyMatch(p -> p.minus(piece.start()).norm() > joint))
            .toList();
    this.used = new boolean[this.pieces.size()];
    for (int i = 0; i < this.pieces.size(); i++) {
      starts.computeIfAbsent(cube(this.pieces.get(i).start()), c -> new ArrayList<>()).add(i);
    }
  }

  private Cube cube(Vector3 p) {
    double size = 2 * joint;
    return new Cube(
        (long) Math.floor(p.x() / size),
        (long) Math.floor(p.y() / size),
        (long) Math.floor(p.z() / size));
  }

  List<BoundaryCurve> curves() {
    boolean[] follows = new boolean[pieces.size()];
    for (BoundaryPiece piece : pieces) {
      following(piece.end(), false).ifPresent(next -> follows[next] = true);
    }
    List<BoundaryCurve> curves = new ArrayList<>();
    for (boolean beginnings : new boolean[] {true, false}) {
      for (int i = 0; i < pieces.size(); i++) {
        if (!used[i] && (!beginnings || !follows[i])) {
          curves.add(curve(i));
        }
      }
    }
    return curves;
  }

  private BoundaryCurve curve(int first) {
    List<Vector3> points = new ArrayList<>(pieces.get(first).points());
    used[first] = true;
    Optional<Integer> next = following(last(points), true);
    while (next.isPresent()) {
      used[next.get()] = true;
      List<Vector3> more = pieces.get(next.get()).points();
      points.addAll(more.subList(1, more.size()));
      next = following(last(points), true);
    }
    boolean closed = points.size() > 2 && last(points).minus(points.get(0)).norm() <= joint;
    if (closed) {
      points.remove(points.size() - 1);
    }
    return new BoundaryCurve(points, closed, pieces.get(first).chart());
  }

  private static Vector3 last(List<Vector3> points) {
    return points.get(points.size() - 1);
  }

  /** The nearest piece that starts where another ends, of all or of those not used yet. */
  private Optional<Integer> following(Vector3 end, boolean unusedOnly) {
    Cube at = cube(end);
    Optional<Integer> best = Optional.empty();
    double nearest = joint;
    for (int di = -1; di <= 1; di++) {
      for (int dj = -1; dj <= 1; dj++) {
        for (int dk = -1; dk <= 1; dk++) {
          Cube cube = new Cube(at.i() + di, at.j() + dj, at.k() + dk);
          for (int i : starts.getOrDefault(cube, List.of())) {
            double distance = pieces.get(i).start().minus(end).norm();
            if (!(unusedOnly && used[i]) && distance <= nearest) {
              nearest = distance;
              best = Optional.of(i);
            }
          }
        }
      }
    }
    return best;
  }
}
