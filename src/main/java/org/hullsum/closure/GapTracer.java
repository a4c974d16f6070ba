package org.hullsum.closure;

import java.util.ArrayList;
import java.util.BitSet;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.hullsum.numeric.Vector3;

/** Joins the stretches that meet no other to the rims of gaps. */
final class GapTracer {
  /** How near two ends must lie to be joined, in tolerances of the match. */
  private static final double JOINT = 40;

  /** To what part of its length the place of a rim is known. */
  private static final double NOISE = 1e-8;

  private final List<Rim> rims;
  private final int[] patchOf;
  private final int[] signs;
  private final double joint;

  /** A stretch as it is run through. */
  private record Step(Stretch stretch, boolean forward) {}

  /** A step that may follow, with the number of its stretch. */
  private record Choice(Step step, int number) {}

  /**
   * @param patchOf the patch of each rim
   * @param signs of the patches' construction normals, 0 where unknown
   * @param tolerance of the match, a length
   */
  GapTracer(List<Rim> rims, int[] patchOf, int[] signs, double tolerance) {
    this.rims = rims;
    this.patchOf = patchOf;
    this.signs = signs;
    this.joint = JOINT * tolerance;
  }

  List<Gap> gaps(List<Stretch> free) {
    Ends left = new Ends(free);
    List<Gap> gaps = new ArrayList<>();
    for (int k = 0; k < free.size(); k++) {
      if (left.take(k)) {
        gaps.add(trace(free.get(k), left));
      }
    }
    return gaps;
  }

  /** A cube as wide as two ends that are joined may lie apart. */
  private record Cell(long x, long y, long z) {}

  /** The stretches that are left, found by where they end. */
  private final class Ends {
    private final List<Stretch> all;
    private final BitSet taken = new BitSet();
    private final Map<Cell, List<Integer>> cells = new HashMap<>();

    Ends(List<Stretch> all) {
      this.all = all;
      for (int k = 0; k < all.size(); k++) {
        Step step = new Step(all.get(k), true);
        for (boolean last : new boolean[] {false, true}) {
          cells.computeIfAbsent(cell(end(step, last)), c -> new ArrayList<>()).add(k);
        }
      }
    }

    private Cell cell(Vector3 p) {
      return new Cell(
          (long) Math.floor(p.x() / joint),
          (long) Math.floor(p.y() / joint),
          (long) Math.floor(p.z() / joint));
    }

    /** Takes one out; false where that was done before. */
    boolean take(int k) {
      boolean left = !taken.get(k);
      taken.set(k);
      return left;
    }

    /** Those that may end near a point, in their order. */
    Set<Integer> near(Vector3 p) {
      Set<Integer> found = new TreeSet<>();
      Cell middle = cell(p);
      for (int n = 0; n < 27; n++) {
        Cell cell =
            new Cell(middle.x() + n % 3 - 1, middle.y() + n / 3 % 3 - 1, middle.z() + n / 9 - 1);
        cells.getOrDefault(cell, List.of()).stream().filter(k -> !taken.get(k)).forEach(found::add);
      }
      return found;
    }
  }

  private Vector3 end(Step step, boolean last) {
    Rim rim = rims.get(step.stretch().rim());
    return rim.at(step.forward() == last ? step.stretch().to() : step.stretch().from());
  }

  /** Against the sense in which the surface has its own rim, so that the gap lies on the left. */
  private boolean forward(Stretch stretch) {
    return signs[patchOf[stretch.rim()]] < 0;
  }

  private boolean isKnown(Stretch stretch) {
    return signs[patchOf[stretch.rim()]] != 0;
  }

  private Gap trace(Stretch first, Ends left) {
    List<Step> steps = new ArrayList<>();
    steps.add(new Step(first, forward(first)));
    Vector3 start = end(steps.get(0), false);
    boolean whole = false;
    // Each round uses up one stretch.
    for (int round = left.all.size(); round >= 0 && !whole; round--) {
      Step last = steps.get(steps.size() - 1);
      whole = end(last, true).minus(start).norm() <= joint;
      if (!whole) {
        List<Choice> next = following(last, left);
        if (next.isEmpty()) {
          break;
        }
        steps.add(next.get(0).step());
        left.take(next.get(0).number());
      }
    }
    return gap(steps, whole);
  }

  /** The stretches that go on from the end of a step, the best first. */
  private List<Choice> following(Step last, Ends left) {
    Vector3 end = end(last, true);
    List<Choice> next = new ArrayList<>();
    for (int k : left.near(end)) {
      Stretch stretch = left.all.get(k);
      for (boolean forward : new boolean[] {true, false}) {
        Step step = new Step(stretch, forward);
        boolean allowed =
            !isKnown(stretch) || !isKnown(last.stretch()) || forward == forward(stretch);
        if (allowed && end(step, false).minus(end).norm() <= joint) {
          next.add(new Choice(step, k));
        }
      }
    }
    int patch = patchOf[last.stretch().rim()];
    next.sort(
        Comparator.comparingDouble((Choice c) -> Math.rint(1e3 * turn(last, c.step())) / 1e3)
            .thenComparing(c -> patchOf[c.step().stretch().rim()] == patch));
    return next;
  }

  /** Where gaps touch at a point, a rim turns back as sharply as it can. */
  private double turn(Step last, Step next) {
    Vector3 arriving = direction(last, true);
    Vector3 leaving = direction(next, false);
    return arriving.dot(leaving) / (arriving.norm() * leaving.norm());
  }

  private Vector3 direction(Step step, boolean last) {
    Rim rim = rims.get(step.stretch().rim());
    double inset = 1e-3;
    boolean atEnd = step.forward() == last;
    Vector3 tangent = rim.tangent(step.stretch().at(atEnd ? 1 - inset : inset));
    return step.forward() ? tangent : tangent.negated();
  }

  private Gap gap(List<Step> steps, boolean whole) {
    TreeSet<Integer> patches = new TreeSet<>();
    List<Vector3> outline = new ArrayList<>();
    Vector3 origin = end(steps.get(0), false);
    Sums sums = new Sums(origin);
    for (Step step : steps) {
      Rim rim = rims.get(step.stretch().rim());
      patches.add(patchOf[step.stretch().rim()]);
      double sign = step.forward() ? 1 : -1;
      rim.walk(
          step.stretch().from(),
          step.stretch().to(),
          (position, dr) -> sums.add(position, dr.times(sign)));
      List<Vector3> points = rim.pointsBetween(step.stretch().from(), step.stretch().to());
      for (int k = 0; k < points.size() - 1; k++) {
        outline.add(points.get(step.forward() ? k : points.size() - 1 - k));
      }
    }
    if (!whole) {
      outline.add(end(steps.get(steps.size() - 1), true));
    }
    return new Gap(
        List.copyOf(patches),
        sums.length,
        withoutNoise(origin.plus(sums.centre.times(1 / sums.length)), sums.length),
        sums.area.times(0.5),
        outline,
        whole,
        Gap.NONE);
  }

  /** Components that are zero as far as a rim is known are told as zero. */
  private static Vector3 withoutNoise(Vector3 centre, double length) {
    double noise = NOISE * length;
    return new Vector3(
        Math.abs(centre.x()) < noise ? 0 : centre.x(),
        Math.abs(centre.y()) < noise ? 0 : centre.y(),
        Math.abs(centre.z()) < noise ? 0 : centre.z());
  }

  /** Integrals along a rim, about its first point. */
  private static final class Sums {
    private final Vector3 origin;
    private double length;
    private Vector3 centre = Vector3.ZERO;
    private Vector3 area = Vector3.ZERO;

    Sums(Vector3 origin) {
      this.origin = origin;
    }

    void add(Vector3 position, Vector3 dr) {
      Vector3 r = position.minus(origin);
      double ds = dr.norm();
      length += ds;
      centre = centre.plus(r.times(ds));
      area = area.plus(r.cross(dr));
    }
  }
}
