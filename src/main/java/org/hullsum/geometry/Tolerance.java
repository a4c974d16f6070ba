package org.hullsum.geometry;

/** How far apart two figures may be that are meant to be the same, each relative to their size. */
final class Tolerance {
  /** For figures that differ by rounding alone: angles of a full turn, radii of a pole. */
  static final double ROUNDING = 1e-12;

  /** For positions stated by hand or computed through several functions. */
  static final double POSITION = 1e-9;

  private Tolerance() {}
}
