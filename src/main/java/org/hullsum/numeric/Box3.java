package org.hullsum.numeric;

import java.util.Objects;

/**
 * A box with sides along the axes.
 *
 * @param x extent along x
 * @param y extent along y
 * @param z extent along z
 */
public record Box3(Interval x, Interval y, Interval z) {
  public Box3 {
    Objects.requireNonNull(x, "x");
    Objects.requireNonNull(y, "y");
    Objects.requireNonNull(z, "z");
  }

  public Box3 hullWith(Box3 other) {
    return new Box3(x.hullWith(other.x), y.hullWith(other.y), z.hullWith(other.z));
  }

  public boolean intersects(Box3 other) {
    return x.intersects(other.x) && y.intersects(other.y) && z.intersects(other.z);
  }

  public boolean contains(Vector3 point) {
    return x.contains(point.x()) && y.contains(point.y()) && z.contains(point.z());
  }

  public Vector3 centre() {
    return new Vector3(x.middle(), y.middle(), z.middle());
  }

  /** Length of the space diagonal. */
  public double diagonal() {
    return new Vector3(x.width(), y.width(), z.width()).norm();
  }

  /** Extent along axis 0, 1 or 2. */
  public Interval along(int axis) {
    return switch (axis) {
      case 0 -> x;
      case 1 -> y;
      case 2 -> z;
      default -> throw new IndexOutOfBoundsException("axis " + axis + " of 3");
    };
  }
}
