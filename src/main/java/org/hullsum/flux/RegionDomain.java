package org.hullsum.flux;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.geometry.Bounds;
import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;

/**
 * The region that a boundary encloses, with its boundary. A box is outside where no enclosure of a
 * patch reaches it and its middle is outside by parity. Not thread-safe.
 */
final class RegionDomain implements HazardDomain {
  /** A cell of a chart whose enclosure is no larger than this part of the box is not halved. */
  private static final double FINE = 0.5;

  private static final int MOST_CELLS = 2000;

  /** Distances of the points of an approach, relative to the size of the region. */
  private static final double[] DISTANCES = {0x1p-8, 0x1p-12, 0x1p-16, 0x1p-20, 0x1p-24};

  private final List<BoundaryPatch> boundary;
  private final Map<String, Double> values;
  private final Box3 box;

  /** Made when first needed: most formulas are proved regular over the whole box at once. */
  private Optional<BoundaryLines> lines = Optional.empty();

  private final List<Bounds> charts = new ArrayList<>();

  RegionDomain(List<BoundaryPatch> boundary, Map<String, Double> values) {
    this.boundary = List.copyOf(boundary);
    this.values = values;
    this.box = EnclosedRegion.of(boundary).box();
  }

  private BoundaryLines lines() {
    if (lines.isEmpty()) {
      lines = Optional.of(new BoundaryLines(boundary, values));
    }
    return lines.get();
  }

  private List<Bounds> charts() {
    if (charts.isEmpty()) {
      for (BoundaryPatch patch : boundary) {
        patch
            .surface()
            .surface()
            .ifPresent(s -> s.charts().forEach(chart -> charts.add(Bounds.of(chart, values))));
      }
    }
    return charts;
  }

  @Override
  public Interval[] root() {
    return new Interval[] {box.x(), box.y(), box.z()};
  }

  @Override
  public Interval[] space(Interval[] part) {
    return part;
  }

  @Override
  public Standing standing(Interval[] part) {
    Box3 here = new Box3(part[0], part[1], part[2]);
    for (BoundaryPatch patch : boundary) {
      if (patch.surface().tree().filter(tree -> tree.touches(here)).isPresent()) {
        return Standing.PARTLY;
      }
    }
    for (Bounds chart : charts()) {
      if (mayTouch(chart, here)) {
        return Standing.PARTLY;
      }
    }
    return lines()
        .inside(here.centre())
        .map(inside -> inside ? Standing.INSIDE : Standing.OUTSIDE)
        .orElse(Standing.PARTLY);
  }

  private static boolean mayTouch(Bounds chart, Box3 here) {
    List<Interval[]> cells = new ArrayList<>();
    cells.add(new Interval[] {Interval.UNIT, Interval.UNIT});
    double fine = FINE * here.diagonal();
    for (int looked = 0; !cells.isEmpty(); looked++) {
      Interval[] cell = cells.remove(cells.size() - 1);
      Box3 enclosure = chart.over(cell[0], cell[1]);
      if (!enclosure.intersects(here)) {
        continue;
      }
      if (!(enclosure.diagonal() > fine) || looked >= MOST_CELLS) {
        return true;
      }
      boolean alongU = cell[0].width() >= cell[1].width();
      Interval side = alongU ? cell[0] : cell[1];
      for (Interval half :
          List.of(
              new Interval(side.low(), side.middle()), new Interval(side.middle(), side.high()))) {
        cells.add(alongU ? new Interval[] {half, cell[1]} : new Interval[] {cell[0], half});
      }
    }
    return false;
  }

  @Override
  public Vector3 place(Interval[] part) {
    return new Box3(part[0], part[1], part[2]).centre();
  }

  @Override
  public List<List<Vector3>> approaches(Interval[] part, Standing standing) {
    Vector3 place = place(part);
    double size = box.diagonal();
    List<List<Vector3>> approaches = new ArrayList<>();
    for (int code = 0; code < 27; code++) {
      // Steps −1, 0, 1 along each axis, a little off the planes and diagonals of symmetry.
      int alongX = code % 3 - 1;
      int alongY = code / 3 % 3 - 1;
      int alongZ = code / 9 - 1;
      Vector3 step = new Vector3(alongX + 0.03, alongY - 0.02, alongZ - 0.01).unit();
      Vector3 far = place.plus(step.times(DISTANCES[0] * size));
      if (standing == Standing.INSIDE || lines().inside(far).equals(Optional.of(true))) {
        List<Vector3> approach = new ArrayList<>();
        for (double distance : DISTANCES) {
          approach.add(place.plus(step.times(distance * size)));
        }
        approaches.add(approach);
      }
    }
    return approaches;
  }
}
