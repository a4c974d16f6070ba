package org.hullsum.flux;

import java.util.List;
import org.hullsum.numeric.Box3;
import org.hullsum.numeric.Interval;
import org.hullsum.numeric.Vector3;

/** A whole box of space. */
record BoxDomain(Box3 box) implements HazardDomain {
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
    return Standing.INSIDE;
  }

  @Override
  public Vector3 place(Interval[] part) {
    return new Box3(part[0], part[1], part[2]).centre();
  }

  /** None: here only what is proved absent matters. */
  @Override
  public List<List<Vector3>> approaches(Interval[] part, Standing standing) {
    return List.of();
  }
}
