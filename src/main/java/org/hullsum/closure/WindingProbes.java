package org.hullsum.closure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import org.hullsum.mesh.TriangleTree;
import org.hullsum.numeric.Vector3;

/**
 * Points on both sides of the patches of one volume, with the winding number of every patch at
 * each.
 *
 * <p>They stand off points of a patch that are clear of the others, along its normal, near and
 * farther; never so far that another patch, or another sheet of the same, could lie between. So
 * each is known to be on the patch's inner or on its outer side, once it is known which is which.
 */
final class WindingProbes {
  /** Points of a patch among which the clearest are taken. */
  private static final int CANDIDATES = 24;

  /** Points of each patch. */
  private static final int POINTS = 3;

  /** The same where there are many patches. */
  private static final int FEW_POINTS = 1;

  /** Patches that are many. */
  private static final int MANY = 40;

  /** Distances from the patch, relative to what is clear. */
  private static final double[] STEPS = {0.25, 0.6};

  /** What is clear is at most this share of √area. */
  private static final double LARGEST = 0.5;

  /** Deviations of a patch's own triangles that every distance from it must exceed. */
  private static final double FAR = 4;

  /** Deviations for which triangles are refined: the borders' add up. */
  private static final double WANTED = 16;

  /** Errors beyond which a point is of no use. */
  private static final double USABLE = 0.05;

  /** Smallest clearance for which triangles are refined, relative to √area. */
  private static final double NARROWEST = 1e-3;

  private final List<PatchWinding> patches;

  /** One point. */
  static final class Probe {
    private final int patch;
    private final int side;
    private final double[] numbers;
    private final double error;

    /**
     * Takes over the array.
     *
     * @param patch beside which it is
     * @param side +1 on that to which the construction normal points, else −1
     * @param numbers of each patch there, by its construction normal
     * @param error a bound on the error of their sum, whatever the signs
     */
    private Probe(int patch, int side, double[] numbers, double error) {
      this.patch = patch;
      this.side = side;
      this.numbers = numbers;
      this.error = error;
    }

    int patch() {
      return patch;
    }

    int side() {
      return side;
    }

    double number(int of) {
      return numbers[of];
    }

    double error() {
      return error;
    }

    /**
     * What the facings make of the winding number less what it should be there, 1 within and 0
     * outside.
     */
    double residual(int[] signs) {
      double sum = 0;
      for (int j = 0; j < numbers.length; j++) {
        sum += signs[j] * numbers[j];
      }
      return sum - (isInside(signs) ? 1 : 0);
    }

    /** Whether the facings have it within the volume. */
    boolean isInside(int[] signs) {
      return signs[patch] * side < 0;
    }
  }

  /**
   * A point of a patch and how far around it nothing else is.
   *
   * @param nearest the patch that is nearest, itself where no other is near
   */
  private record Stand(SamplePoint point, double clear, int nearest) {
    /** The nearest distance at which something is looked at from it. */
    double least() {
      return STEPS[0] * clear;
    }
  }

  private WindingProbes(List<PatchWinding> patches) {
    this.patches = List.copyOf(patches);
  }

  /** The points that are good for anything, in the order of the patches. */
  static List<Probe> around(List<PatchWinding> patches) {
    return new WindingProbes(new WindingProbes(patches).refined()).all();
  }

  /** The patches with triangles close enough for the narrowest places. */
  private List<PatchWinding> refined() {
    double[] needed = new double[patches.size()];
    Arrays.fill(needed, Double.POSITIVE_INFINITY);
    for (int k = 0; k < needed.length; k++) {
      for (Stand stand : stands(k)) {
        for (int j : new int[] {k, stand.nearest()}) {
          needed[j] = Math.min(needed[j], stand.least() / WANTED);
        }
      }
    }
    List<PatchWinding> refined = new ArrayList<>();
    for (int k = 0; k < needed.length; k++) {
      PatchWinding patch = patches.get(k);
      double factor = needed[k] / patch.deviation();
      refined.add(factor < 1 ? patch.refined(0.5 * factor) : patch);
    }
    return refined;
  }

  private List<Probe> all() {
    List<Probe> probes = new ArrayList<>();
    for (int k = 0; k < patches.size(); k++) {
      for (Stand stand : stands(k)) {
        if (stand.least() >= FAR * patches.get(k).deviation()) {
          add(k, stand, probes);
        }
      }
    }
    return probes;
  }

  private List<Stand> stands(int patch) {
    PatchWinding own = patches.get(patch);
    double largest = LARGEST * Math.sqrt(own.area());
    List<Stand> stands = new ArrayList<>();
    for (SamplePoint point : PatchProbe.of(own.tree()).points(CANDIDATES)) {
      double clear = Math.min(largest, sheet(own, point));
      int nearest = patch;
      for (int j = 0; j < patches.size(); j++) {
        double distance = j == patch ? clear : patches.get(j).tree().distance(point.position());
        nearest = distance < clear ? j : nearest;
        clear = Math.min(clear, distance);
      }
      if (clear > NARROWEST * largest) {
        stands.add(new Stand(point, clear, nearest));
      }
    }
    stands.sort(Comparator.comparingDouble(Stand::clear).reversed());
    return spread(stands, patches.size() > MANY ? FEW_POINTS : POINTS);
  }

  /** The clearest, and others as far from those taken as they are clear. */
  private static List<Stand> spread(List<Stand> sorted, int count) {
    List<Stand> taken = new ArrayList<>();
    List<Stand> open = new ArrayList<>(sorted);
    while (taken.size() < count && !open.isEmpty()) {
      Stand best = open.get(0);
      for (Stand stand : open) {
        best = merit(stand, taken) > merit(best, taken) ? stand : best;
      }
      open.remove(best);
      taken.add(best);
    }
    return taken;
  }

  private static double merit(Stand stand, List<Stand> taken) {
    double nearest = stand.clear();
    for (Stand other : taken) {
      double apart = other.point().position().minus(stand.point().position()).norm();
      nearest = Math.min(nearest, apart);
    }
    return nearest;
  }

  /** Half the way to the next sheet of the same patch along the normal. */
  private static double sheet(PatchWinding own, SamplePoint point) {
    TriangleTree.LineHits hits = own.tree().along(point.position(), point.normal(), 0);
    double nearest = Double.POSITIVE_INFINITY;
    double here = FAR * own.deviation() + PatchProbe.of(own.tree()).near();
    for (double t : hits.places()) {
      nearest = Math.abs(t) > here ? Math.min(nearest, 0.5 * Math.abs(t)) : nearest;
    }
    return nearest;
  }

  private void add(int patch, Stand stand, List<Probe> probes) {
    for (double step : STEPS) {
      for (int side : new int[] {1, -1}) {
        double height = side * step * stand.clear();
        Vector3 at = stand.point().position().plus(stand.point().normal().times(height));
        Probe probe = probe(patch, side, at);
        if (probe.error() <= USABLE) {
          probes.add(probe);
        }
      }
    }
  }

  private Probe probe(int patch, int side, Vector3 at) {
    double[] numbers = new double[patches.size()];
    double error = 0;
    for (int j = 0; j < numbers.length; j++) {
      PatchWinding.Value value = patches.get(j).at(at);
      numbers[j] = value.number();
      error += value.error();
    }
    return new Probe(patch, side, numbers, error);
  }
}
