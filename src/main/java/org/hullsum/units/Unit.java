package org.hullsum.units;

import java.util.Objects;

/**
 * A unit of measurement: a value v in this unit is {@code v · scale + offset} in coherent SI units.
 *
 * @param code how it was written, such as {@code m3/h}
 * @param dimension what it measures
 * @param scale size in the coherent SI unit, positive
 * @param offset zero but for temperatures in degC and degF that stand alone
 */
public record Unit(String code, Dimension dimension, double scale, double offset) {
  public static final Unit ONE = new Unit("1", Dimension.NONE, 1, 0);

  /** Two sizes that came about by different multiplications differ by a few roundings only. */
  private static final double SAME_SIZE = 1e-14;

  public Unit {
    Objects.requireNonNull(code, "code");
    Objects.requireNonNull(dimension, "dimension");
    if (!(scale > 0) || Double.isInfinite(scale)) {
      throw new IllegalArgumentException("unit " + code + " has scale " + scale);
    }
  }

  /** A value in this unit, in coherent SI units. */
  public double toSi(double value) {
    return value * scale + offset;
  }

  /** A value in coherent SI units, in this unit. */
  public double fromSi(double value) {
    return (value - offset) / scale;
  }

  /**
   * Whether this is a share, as {@code %} and {@code ppm} are: after ± it may be a part of the
   * value.
   */
  public boolean isRatio() {
    return switch (code) {
      case "%", "‰", "ppm", "ppb", "[ppth]", "[ppm]", "[ppb]", "[pptr]" -> true;
      default -> false;
    };
  }

  /** This unit for differences: the same without its offset. */
  public Unit difference() {
    return offset == 0 ? this : new Unit(code, dimension, scale, 0);
  }

  /**
   * Whether a number means the same in both units: same dimension, size and zero, whatever their
   * codes are.
   */
  public boolean sameScale(Unit other) {
    return dimension.equals(other.dimension)
        && Math.abs(scale - other.scale) <= SAME_SIZE * scale
        && Math.abs(offset - other.offset) <= SAME_SIZE * Math.abs(offset);
  }
}
