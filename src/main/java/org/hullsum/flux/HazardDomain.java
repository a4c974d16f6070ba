package org.hullsum.flux;

import java.util.List;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;

/** What a {@link HazardSearch} covers with boxes: a region of space, or a chart's square. */
interface HazardDomain {
  /** How a box lies in the domain. */
  enum Standing {
    OUTSIDE,
    INSIDE,
    /** Partly, or not known. */
    PARTLY
  }

  /** The box with which the search begins. */
  Interval[] root();

  /** Ranges of x, y and z over a box. */
  Interval[] space(Interval[] box);

  /** How a box lies that is part of one that lies partly in the domain. */
  Standing standing(Interval[] box);

  /** The place in space in the middle of a box. */
  Vector3 place(Interval[] box);

  /**
   * Rows of points of the domain that come nearer and nearer to the middle of a box, each row from
   * another side.
   */
  List<List<Vector3>> approaches(Interval[] box, Standing standing);
}
