package org.hullsum.closure;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.IntStream;
import org.hullsum.closure.FoundFacing.Reason;
import org.hullsum.closure.FoundFacing.Side;
import org.hullsum.closure.VolumeFacings.Overlap;
import org.hullsum.geometry.Crossing;
import org.hullsum.geometry.Crossings;
import org.hullsum.numeric.Vector3;

/**
 * Finds which way the patches of a volume face, by parity: no facing and no construction normal has
 * a part in it.
 *
 * <p>Through several points of each patch, away from its rim, lines run in several fixed general
 * directions. Each line is cut with every patch of the volume; the crossing at the point itself
 * left out, the numbers of crossings on its two sides differ in parity where the surface is closed,
 * and the even side is outside. A line is dropped where a crossing is doubtful: near a rim or a
 * trim curve, nearly tangent, not proved. All lines of a point must agree, and all points of a
 * patch; else more points and lines are taken, and then the patch is undetermined, with the reason.
 *
 * <p>Cost: lines × patches, for each patch. Not thread-safe.
 */
public final class FacingFinder {
  /** Points and lines through each that are enough where all agree. */
  private static final int FEW_POINTS = 3;

  private static final int FEW_LINES = 2;

  /** Points, and lines through each, where they do not. */
  private static final int MANY_POINTS = 6;

  private static final int MANY_LINES = 8;

  /** Points of a gap's rim that are looked for on other patches. */
  private static final int RIM_POINTS = 5;

  /** Shares of odd lines that are a clear majority. */
  private static final double CLEAR = 0.75;

  /** Smallest cosine with the normal at which a line is run through a point. */
  private static final double STEEP = 0.2;

  /**
   * Fixed directions over the half sphere in general position: no plane, no axis and no simple
   * slope of a usual geometry contains one.
   */
  private static final List<Vector3> DIRECTIONS = directions();

  private final List<PatchProbe> probes;

  /**
   * @param probes of all patches; a patch is an index into them
   */
  public FacingFinder(List<PatchProbe> probes) {
    this.probes = List.copyOf(probes);
  }

  private PatchProbe probe(int patch) {
    return probes.get(patch);
  }

  private static List<Vector3> directions() {
    List<Vector3> all = new ArrayList<>();
    int count = 3 * MANY_LINES;
    double golden = Math.PI * (3 - Math.sqrt(5));
    for (int k = 0; k < count; k++) {
      // A Fibonacci lattice, in an order that spreads any first few of them.
      int place = 7 * k % count;
      double height = (place + 0.43) / count;
      double radius = Math.sqrt(1 - height * height);
      double angle = golden * place + 0.7;
      all.add(new Vector3(radius * Math.cos(angle), height, radius * Math.sin(angle)));
    }
    return all;
  }

  /**
   * The facings of one volume's patches.
   *
   * @param patches those that leave or enter the volume, each once, without those that do both
   */
  public VolumeFacings find(List<Integer> patches) {
    List<FoundFacing> facings = new ArrayList<>();
    Map<List<Integer>, Vector3> overlaps = new LinkedHashMap<>();
    for (int patch : patches) {
      facings.add(find(patch, patches, overlaps));
    }
    List<Overlap> found = new ArrayList<>();
    overlaps.forEach((pair, place) -> found.add(new Overlap(pair.get(0), pair.get(1), place)));
    return new VolumeFacings(facings, found);
  }

  /**
   * Whether a patch lies within the surface that others form: on most lines from a point of it an
   * odd number of crossings lies ahead.
   */
  public boolean encloses(List<Integer> shell, int patch) {
    int inside = 0;
    int kept = 0;
    for (SamplePoint point : probe(patch).points(FEW_POINTS)) {
      for (Vector3 direction : DIRECTIONS.subList(0, MANY_LINES)) {
        OptionalInt ahead = ahead(shell, point, direction);
        kept += ahead.isPresent() ? 1 : 0;
        inside += ahead.isPresent() ? ahead.getAsInt() % 2 : 0;
      }
    }
    return 2 * inside > kept;
  }

  /** Number of crossings ahead of a point; empty where one is doubtful. */
  private OptionalInt ahead(List<Integer> shell, SamplePoint point, Vector3 direction) {
    int ahead = 0;
    for (int other : shell) {
      Crossings found = probe(other).along(point.position(), direction);
      if (!found.reliable()) {
        return OptionalInt.empty();
      }
      for (Crossing crossing : found.crossings()) {
        ahead += crossing.t() > 0 ? 1 : 0;
      }
    }
    return OptionalInt.of(ahead);
  }

  /** The same seams, their gaps told with the patch on whose inside their rims lie. */
  public Seams placed(Seams seams) {
    List<Gap> gaps = new ArrayList<>();
    for (Gap gap : seams.gaps()) {
      gaps.add(gap.lyingOn(carrier(gap)));
    }
    return new Seams(seams.seams(), gaps, seams.slack(), seams.slackArea());
  }

  /** The patch that has every probed point of a rim on its inside. */
  private int carrier(Gap gap) {
    for (int patch = 0; patch < probes.size(); patch++) {
      int tried = patch;
      boolean on =
          !gap.patches().contains(patch)
              && IntStream.range(0, RIM_POINTS)
                  .mapToObj(k -> gap.outline().get(k * gap.outline().size() / RIM_POINTS))
                  .allMatch(p -> isOn(tried, p));
      if (on) {
        return patch;
      }
    }
    return Gap.NONE;
  }

  private boolean isOn(int patch, Vector3 point) {
    for (Vector3 direction : DIRECTIONS.subList(0, FEW_LINES)) {
      Crossings found = probe(patch).along(point, direction);
      if (PatchProbe.count(found, 2 * probe(patch).near()) > 0) {
        return true;
      }
    }
    return false;
  }

  private FoundFacing find(int patch, List<Integer> patches, Map<List<Integer>, Vector3> overlaps) {
    List<PointTally> few = tallies(patch, patches, FEW_POINTS, FEW_LINES, overlaps);
    Optional<Side> side = unanimous(few, FEW_POINTS, FEW_LINES);
    if (side.isPresent()) {
      return new FoundFacing(patch, side.get(), Optional.empty(), Optional.empty(), lines(few));
    }
    List<PointTally> many = tallies(patch, patches, MANY_POINTS, MANY_LINES, overlaps);
    return side(many)
        .map(s -> new FoundFacing(patch, s, Optional.empty(), Optional.empty(), lines(many)))
        .orElseGet(
            () ->
                new FoundFacing(
                    patch,
                    Side.UNDETERMINED,
                    Optional.of(reason(many)),
                    leaning(many),
                    lines(many)));
  }

  private static int lines(List<PointTally> tallies) {
    return tallies.stream().mapToInt(PointTally::lines).sum();
  }

  /** The side on which all points agree, with the full number of lines through each. */
  private static Optional<Side> unanimous(List<PointTally> tallies, int points, int lines) {
    boolean full = tallies.size() == points && tallies.stream().allMatch(t -> t.lines() >= lines);
    return full ? side(tallies) : Optional.empty();
  }

  private static Optional<Side> side(List<PointTally> tallies) {
    List<PointTally> spoken = tallies.stream().filter(t -> t.lines() > 0).toList();
    if (lines(spoken) < FEW_LINES) {
      return Optional.empty();
    }
    if (spoken.stream().allMatch(PointTally::saysOut)) {
      return Optional.of(Side.OUT);
    }
    return spoken.stream().allMatch(PointTally::saysIn) ? Optional.of(Side.IN) : Optional.empty();
  }

  private static Reason reason(List<PointTally> tallies) {
    if (lines(tallies) < FEW_LINES) {
      return Reason.NO_RELIABLE_LINE;
    }
    return tallies.stream().anyMatch(PointTally::isAtOdds)
        ? Reason.OPEN_OR_COINCIDENT
        : Reason.POINTS_AT_ODDS;
  }

  private static Optional<Side> leaning(List<PointTally> tallies) {
    double lines = lines(tallies);
    double front = tallies.stream().mapToInt(PointTally::frontOdd).sum() / lines;
    double back = tallies.stream().mapToInt(PointTally::backOdd).sum() / lines;
    if (back >= CLEAR && front <= 1 - CLEAR) {
      return Optional.of(Side.OUT);
    }
    return front >= CLEAR && back <= 1 - CLEAR ? Optional.of(Side.IN) : Optional.empty();
  }

  private List<PointTally> tallies(
      int patch,
      List<Integer> patches,
      int points,
      int lines,
      Map<List<Integer>, Vector3> overlaps) {
    List<PointTally> tallies = new ArrayList<>();
    for (SamplePoint point : probe(patch).points(points)) {
      PointTally tally = new PointTally();
      for (Vector3 direction : DIRECTIONS) {
        if (tally.lines() == lines) {
          break;
        }
        if (Math.abs(direction.dot(point.normal())) >= STEEP) {
          run(patch, patches, point, direction, tally, overlaps);
        }
      }
      tallies.add(tally);
    }
    return tallies;
  }

  /** Enters one line into the tally, unless it is doubtful. */
  private void run(
      int patch,
      List<Integer> patches,
      SamplePoint point,
      Vector3 direction,
      PointTally tally,
      Map<List<Integer>, Vector3> overlaps) {
    int ahead = 0;
    int behind = 0;
    List<Integer> coincident = new ArrayList<>();
    for (int other : patches) {
      Crossings found = probe(other).along(point.position(), direction);
      double near = Math.max(probe(patch).near(), probe(other).near());
      int here = PatchProbe.count(found, near);
      if (!found.reliable() || (other == patch && here == 0)) {
        return;
      }
      if (other == patch && here > 1) {
        coincident.add(other);
      }
      if (other != patch && here > 0) {
        coincident.add(other);
      }
      for (Crossing crossing : found.crossings()) {
        if (Math.abs(crossing.t()) > near) {
          ahead += crossing.t() > 0 ? 1 : 0;
          behind += crossing.t() < 0 ? 1 : 0;
        }
      }
    }
    for (int other : coincident) {
      if (other == patch) {
        continue;
      }
      overlaps.putIfAbsent(
          List.of(Math.min(patch, other), Math.max(patch, other)), point.position());
    }
    boolean along = direction.dot(point.normal()) > 0;
    tally.enter(along ? ahead : behind, along ? behind : ahead, coincident.size());
  }
}
