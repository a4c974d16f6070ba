package org.hullsum.flux;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import org.hullsum.expression.Hazard;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;

/**
 * Covers a domain with boxes over which no hazard is possible, halving those over which one is;
 * what is left in the end is looked at from all sides.
 *
 * <p>Boxes inside the domain come first, the smallest of them first, so that a singularity that is
 * there is soon reached. Work-bounded.
 */
final class HazardSearch {
  /** Boxes evaluated at most. */
  private static final int MOST_BOXES = 4000;

  /** So many boxes are taken broadly, to come upon one inside; then it goes into the depth. */
  private static final int BROAD = 300;

  /** Places left over at most before the search gives up. */
  private static final int MOST_DOUBTS = 6;

  /** Width, relative to the domain, below which a box is a place. */
  private static final double PLACE = 0x1p-30;

  /** A size that grows by this factor at every step nearer grows without bound. */
  private static final double GROWTH_PER_STEP = 1.1;

  /** And by this over all steps. */
  private static final double GROWTH = 2;

  private static final double[] GENERAL = {0.4137, 0.5719, 0.6283};

  private final HazardDomain domain;
  private final HazardCheck check;

  HazardSearch(HazardDomain domain, HazardCheck check) {
    this.domain = domain;
    this.check = check;
  }

  private static final class Open {
    private final Interval[] box;
    private final HazardDomain.Standing standing;

    /** Of the widest side, relative to that of the domain. */
    private final double width;

    Open(Interval[] box, HazardDomain.Standing standing, double width) {
      this.box = box;
      this.standing = standing;
      this.width = width;
    }
  }

  /** What is still to be looked at: boxes inside first, deepest first. */
  private static final class Agenda {
    private final Deque<Open> inside = new ArrayDeque<>();
    private final Deque<Open> partly = new ArrayDeque<>();

    void add(Open open) {
      (open.standing == HazardDomain.Standing.INSIDE ? inside : partly).addLast(open);
    }

    boolean isEmpty() {
      return inside.isEmpty() && partly.isEmpty();
    }

    Open next(boolean broad) {
      if (!inside.isEmpty()) {
        return inside.removeLast();
      }
      return broad ? partly.removeFirst() : partly.removeLast();
    }
  }

  SingularityOutcome run() {
    Interval[] root = domain.root();
    Agenda open = new Agenda();
    open.add(new Open(root, HazardDomain.Standing.PARTLY, 1));
    Optional<SingularityOutcome> doubt = Optional.empty();
    int doubts = 0;
    for (int evaluated = 0; !open.isEmpty(); evaluated++) {
      Open next = open.next(evaluated < BROAD);
      Optional<Hazard> hazard = check.possible(domain.space(next.box));
      if (hazard.isEmpty()) {
        continue;
      }
      HazardDomain.Standing standing =
          next.standing == HazardDomain.Standing.PARTLY && next.width < 1
              ? domain.standing(next.box)
              : next.standing;
      if (standing == HazardDomain.Standing.OUTSIDE) {
        continue;
      }
      if (standing == HazardDomain.Standing.INSIDE) {
        Vector3 point = domain.place(generalPart(next.box));
        if (!Double.isFinite(check.size(point))) {
          return new SingularityOutcome.FoundAt(point, hazard.get().toString());
        }
      }
      boolean isPlace = next.width <= PLACE;
      if (isPlace || evaluated >= MOST_BOXES) {
        SingularityOutcome outcome = judge(next.box, standing, hazard.get(), isPlace);
        if (outcome.isFound()) {
          return outcome;
        }
        doubt = doubt.or(() -> Optional.of(outcome));
        doubts++;
        if (evaluated >= MOST_BOXES || doubts >= MOST_DOUBTS) {
          break;
        }
        continue;
      }
      halve(next.box, root, standing, open);
    }
    return doubt.orElseGet(SingularityOutcome.ProvedAbsent::new);
  }

  /** A part of a box whose middle is in general position: undefined there is undefined around. */
  private static Interval[] generalPart(Interval[] box) {
    Interval[] part = new Interval[box.length];
    for (int axis = 0; axis < box.length; axis++) {
      part[axis] = Interval.point(box[axis].low() + GENERAL[axis] * box[axis].width());
    }
    return part;
  }

  private static void halve(
      Interval[] box, Interval[] root, HazardDomain.Standing standing, Agenda open) {
    int widest = 0;
    double size = largest(root);
    for (int axis = 1; axis < box.length; axis++) {
      widest = box[axis].width() > box[widest].width() ? axis : widest;
    }
    Interval side = box[widest];
    for (Interval half :
        List.of(
            new Interval(side.low(), side.middle()), new Interval(side.middle(), side.high()))) {
      Interval[] part = box.clone();
      part[widest] = half;
      open.add(new Open(part, standing, largest(part) / size));
    }
  }

  private static double largest(Interval[] box) {
    double largest = 0;
    for (Interval side : box) {
      largest = Math.max(largest, side.width());
    }
    return largest;
  }

  private SingularityOutcome judge(
      Interval[] box, HazardDomain.Standing standing, Hazard hazard, boolean isPlace) {
    Vector3 place = domain.place(box);
    String part = hazard.toString();
    if (isPlace) {
      for (List<Vector3> approach : domain.approaches(box, standing)) {
        if (growsWithoutBound(approach)) {
          return new SingularityOutcome.FoundAt(rounded(place), part);
        }
      }
    }
    return new SingularityOutcome.NotExcluded(isPlace ? rounded(place) : place, part);
  }

  /** The place to the digits to which it is known: those of the smallest boxes. */
  private Vector3 rounded(Vector3 place) {
    double known = PLACE * largest(domain.space(domain.root()));
    if (!(known > 0) || Double.isInfinite(known)) {
      return place;
    }
    double perUnit = Math.pow(10, -Math.ceil(Math.log10(4 * known)));
    return new Vector3(
        rounded(place.x(), perUnit), rounded(place.y(), perUnit), rounded(place.z(), perUnit));
  }

  /** Without a negative zero. */
  private static double rounded(double value, double perUnit) {
    return Math.rint(value * perUnit) / perUnit + 0.0;
  }

  private boolean growsWithoutBound(List<Vector3> approach) {
    double first = Double.NaN;
    double previous = 0;
    boolean grows = true;
    for (Vector3 point : approach) {
      double size = check.size(point);
      if (!Double.isFinite(size)) {
        return true;
      }
      if (Double.isNaN(first)) {
        first = size;
      } else {
        grows &= size >= GROWTH_PER_STEP * previous;
      }
      previous = size;
    }
    return grows && previous > GROWTH * first;
  }
}
