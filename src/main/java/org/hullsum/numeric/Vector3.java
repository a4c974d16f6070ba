package org.hullsum.numeric;

/**
 * A vector or a point in space.
 *
 * @param x first Cartesian component
 * @param y second
 * @param z third
 */
public record Vector3(double x, double y, double z) {
  public static final Vector3 ZERO = new Vector3(0, 0, 0);
  public static final Vector3 X = new Vector3(1, 0, 0);
  public static final Vector3 Y = new Vector3(0, 1, 0);
  public static final Vector3 Z = new Vector3(0, 0, 1);

  public Vector3 plus(Vector3 other) {
    return new Vector3(x + other.x, y + other.y, z + other.z);
  }

  public Vector3 minus(Vector3 other) {
    return new Vector3(x - other.x, y - other.y, z - other.z);
  }

  public Vector3 times(double factor) {
    return new Vector3(factor * x, factor * y, factor * z);
  }

  public Vector3 negated() {
    return new Vector3(-x, -y, -z);
  }

  public double dot(Vector3 other) {
    return x * other.x + y * other.y + z * other.z;
  }

  /** Right-handed cross product. */
  public Vector3 cross(Vector3 other) {
    return new Vector3(
        y * other.z - z * other.y, z * other.x - x * other.z, x * other.y - y * other.x);
  }

  public double norm() {
    return Math.sqrt(dot(this));
  }

  /**
   * This vector scaled to length one.
   *
   * @throws IllegalArgumentException if its length is zero or not finite
   */
  public Vector3 unit() {
    double largest = Math.max(Math.abs(x), Math.max(Math.abs(y), Math.abs(z)));
    if (!(largest > 0) || Double.isInfinite(largest)) {
      throw new IllegalArgumentException("no direction in a vector of length " + norm());
    }
    Vector3 scaled = new Vector3(x / largest, y / largest, z / largest);
    return scaled.times(1 / scaled.norm());
  }

  /** Component by index 0, 1, 2. */
  public double component(int index) {
    return switch (index) {
      case 0 -> x;
      case 1 -> y;
      case 2 -> z;
      default -> throw new IndexOutOfBoundsException("component " + index + " of 3");
    };
  }

  public boolean isFinite() {
    return Double.isFinite(x) && Double.isFinite(y) && Double.isFinite(z);
  }
}
