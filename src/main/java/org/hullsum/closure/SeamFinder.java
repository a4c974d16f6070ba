package org.hullsum.closure;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.hullsum.numeric.Vector3;

/**
 * Matches the rims of the patches of one volume stretch by stretch.
 *
 * <p>Every rim is cut where a rim ends or has a corner, its own and those of others that come near
 * it, and where the rims that run along it change. What is left are stretches that either run along
 * the same others all the way or along none. A stretch without another is part of a gap's rim; two
 * that coincide are a seam; more are a crowded one. Two rims coincide within {@link #TOLERANCE} of
 * the size of the smaller patch; the distances accepted are told, so that they can enter the error.
 *
 * <p>Cost: about n log n in the number of points.
 */
public final class SeamFinder {
  /** How far apart rims may run and still be one seam, relative to the smaller patch. */
  public static final double TOLERANCE = 1e-6;

  /** Where within a stretch it is compared with others, as parts of its length. */
  private static final double[] PROBES = {0.5, 0.07, 0.28, 0.77, 0.93};

  /** Rounds in which stretches are cut where their company changes. */
  private static final int MOST_ROUNDS = 12;

  /** Halvings with which such a place is found. */
  private static final int BISECTIONS = 40;

  private final List<Rim> rims = new ArrayList<>();
  private final int[] patchOf;
  private final double[] sizes;
  private final double[] sags;
  private final double largestSize;
  private final double largest;
  private final RimTree tree;

  /**
   * Prepares the rims of one volume.
   *
   * @param patches that leave or enter it, each once, without those that do both
   */
  public SeamFinder(List<PatchRims> patches) {
    this.patchOf = new int[patches.stream().mapToInt(p -> p.rims().size()).sum()];
    this.sizes = patches.stream().mapToDouble(PatchRims::size).toArray();
    double sizeOfAll = 0;
    for (int p = 0; p < patches.size(); p++) {
      for (Rim rim : patches.get(p).rims()) {
        patchOf[rims.size()] = p;
        rims.add(rim);
        sizeOfAll = Math.max(sizeOfAll, sizes[p]);
      }
    }
    this.sags = rims.stream().mapToDouble(Rim::sag).toArray();
    double largestSag = 0;
    for (double sag : sags) {
      largestSag = Math.max(largestSag, sag);
    }
    this.largestSize = sizeOfAll;
    this.largest = TOLERANCE * sizeOfAll + 2 * largestSag;
    this.tree = new RimTree(rims);
  }

  /**
   * The seams and gaps.
   *
   * @param signs of each patch's construction normal, +1 outward, −1 inward, 0 not known: they turn
   *     the rims of gaps, nothing else
   */
  public Seams find(int[] signs) {
    List<Stretch> stretches = stretches();
    List<Stretch> free = new ArrayList<>();
    List<Seam> seams = new ArrayList<>();
    double slack = 0;
    double slackArea = 0;
    for (Stretch stretch : stretches) {
      Rim rim = rims.get(stretch.rim());
      List<RimTree.Hit> company = company(rim, stretch.rim(), stretch.middle());
      if (company.isEmpty()) {
        free.add(stretch);
      } else if (isFirst(stretch, company)) {
        Seam seam = seam(stretch, company);
        seams.add(seam);
        slack = Math.max(slack, seam.slack());
        slackArea += seam.slack() * seam.length();
      }
    }
    return new Seams(
        seams,
        new GapTracer(rims, patchOf, signs, TOLERANCE * largestSize).gaps(free),
        slack,
        slackArea);
  }

  /** How near two rims must run: tied to the smaller patch. */
  private double tolerance(int one, int other) {
    return joint(one, other) + sags[one] + sags[other];
  }

  /** How near two cuts are one. */
  private double joint(int one, int other) {
    return TOLERANCE * Math.min(sizes[patchOf[one]], sizes[patchOf[other]]);
  }

  /** Where other rims, or other stretches of the same, pass a place of a rim. */
  private List<RimTree.Hit> company(Rim rim, int index, double s) {
    Vector3 p = rim.at(s);
    List<RimTree.Hit> company = new ArrayList<>();
    for (RimTree.Hit hit : tree.near(p, largest)) {
      double tolerance = tolerance(index, hit.rim());
      boolean self =
          hit.rim() == index
              && RimTree.apart(rim, hit.parameter(), rim.reduced(s)) <= 8 * joint(index, hit.rim());
      if (!self && hit.distance() <= tolerance) {
        company.add(hit);
      }
    }
    return company;
  }

  /** Each seam is told by that of its stretches that comes first. */
  private boolean isFirst(Stretch stretch, List<RimTree.Hit> company) {
    double own = rims.get(stretch.rim()).reduced(stretch.middle());
    return company.stream()
        .allMatch(
            hit ->
                stretch.rim() < hit.rim() || (stretch.rim() == hit.rim() && own < hit.parameter()));
  }

  private Seam seam(Stretch stretch, List<RimTree.Hit> company) {
    Rim rim = rims.get(stretch.rim());
    List<Seam.Side> sides = new ArrayList<>();
    sides.add(new Seam.Side(patchOf[stretch.rim()], true));
    Vector3 tangent = rim.tangent(stretch.middle());
    for (RimTree.Hit hit : company) {
      Rim other = rims.get(hit.rim());
      sides.add(new Seam.Side(patchOf[hit.rim()], other.tangent(hit.parameter()).dot(tangent) > 0));
    }
    double slack = 0;
    for (double part : PROBES) {
      // Between the given points a rim is known less well than seams are asked to fit.
      for (RimTree.Hit hit : company(rim, stretch.rim(), rim.snapped(stretch.at(part)))) {
        boolean sameKind = sags[stretch.rim()] > 0 == sags[hit.rim()] > 0;
        double between = sameKind ? 0 : Math.max(sags[stretch.rim()], sags[hit.rim()]);
        slack = Math.max(slack, Math.max(between, hit.distance()));
      }
    }
    return new Seam(sides, stretch.length(), slack);
  }

  private List<Stretch> stretches() {
    List<List<Double>> cuts = cuts();
    List<Stretch> done = new ArrayList<>();
    for (int r = 0; r < rims.size(); r++) {
      List<Stretch> open = Stretch.between(r, rims.get(r), cuts.get(r));
      for (int round = 0; round < MOST_ROUNDS && !open.isEmpty(); round++) {
        List<Stretch> halves = new ArrayList<>();
        for (Stretch stretch : open) {
          double cut = change(stretch);
          if (Double.isNaN(cut)) {
            done.add(stretch);
          } else {
            halves.add(new Stretch(r, stretch.from(), cut));
            halves.add(new Stretch(r, cut, stretch.to()));
          }
        }
        open = halves;
      }
      done.addAll(open);
    }
    done.removeIf(s -> s.length() <= 8 * TOLERANCE * sizes[patchOf[s.rim()]]);
    return done;
  }

  /** For each rim the parameters at which it is cut, ascending. */
  private List<List<Double>> cuts() {
    List<List<Double>> cuts = new ArrayList<>();
    List<List<Double>> own = new ArrayList<>();
    for (Rim rim : rims) {
      own.add(rim.joints());
      cuts.add(new ArrayList<>(own.get(own.size() - 1)));
    }
    for (int r = 0; r < rims.size(); r++) {
      for (double joint : own.get(r)) {
        for (RimTree.Hit hit : company(rims.get(r), r, joint)) {
          Rim other = rims.get(hit.rim());
          double near = 8 * joint(r, hit.rim());
          boolean known =
              cuts.get(hit.rim()).stream()
                  .anyMatch(c -> RimTree.apart(other, c, hit.parameter()) <= near);
          if (!known) {
            cuts.get(hit.rim()).add(hit.parameter());
          }
        }
      }
    }
    cuts.forEach(Collections::sort);
    return cuts;
  }

  /** Where within a stretch its company changes; not a number where it does not. */
  private double change(Stretch stretch) {
    Map<Integer, Long> middle = companions(stretch, stretch.at(PROBES[0]));
    for (int k = 1; k < PROBES.length; k++) {
      double differs = stretch.at(PROBES[k]);
      if (!companions(stretch, differs).equals(middle)) {
        double same = stretch.at(PROBES[0]);
        for (int step = 0; step < BISECTIONS; step++) {
          double half = 0.5 * (same + differs);
          if (companions(stretch, half).equals(middle)) {
            same = half;
          } else {
            differs = half;
          }
        }
        return differs;
      }
    }
    return Double.NaN;
  }

  /** How often each rim passes a place. */
  private Map<Integer, Long> companions(Stretch stretch, double s) {
    Map<Integer, Long> companions = new TreeMap<>();
    for (RimTree.Hit hit : company(rims.get(stretch.rim()), stretch.rim(), s)) {
      companions.merge(hit.rim(), 1L, Long::sum);
    }
    return companions;
  }
}
