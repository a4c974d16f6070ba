package org.hullsum.geometry;

import java.util.EnumSet;
import java.util.Set;
import org.hullsum.geometry.Chart.Side;

/** Which sides of a chart are rim, put together from what is known of each direction. */
final class ChartSides {
  private final Set<Side> rim = EnumSet.noneOf(Side.class);

  /** Adds the two sides of a turn, unless it is a full one. */
  ChartSides turn(boolean full, Side start, Side end) {
    return add(start, !full).add(end, !full);
  }

  ChartSides add(Side side, boolean isRim) {
    if (isRim) {
      rim.add(side);
    }
    return this;
  }

  Set<Side> rim() {
    return Set.copyOf(rim);
  }
}
