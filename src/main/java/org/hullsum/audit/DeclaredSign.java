package org.hullsum.audit;

import org.hullsum.flux.PatchGeometry;
import org.hullsum.model.Facing;
import org.hullsum.numeric.Vector3;

/**
 * The declared facing as a sign against the construction normal: +1, −1, or 0 where the figure that
 * should tell is zero within its error. A patch that is to face outward is taken as drawn until it
 * is known where outward is.
 */
final class DeclaredSign implements Facing.Visitor<Integer> {
  /** Rounding of the integrals relative to the area. */
  private static final double ROUNDING = 1e-12;

  private final PatchGeometry geometry;

  private DeclaredSign(PatchGeometry geometry) {
    this.geometry = geometry;
  }

  static int of(Facing facing, PatchGeometry geometry) {
    return facing.accept(new DeclaredSign(geometry));
  }

  @Override
  public Integer asDrawn() {
    return 1;
  }

  @Override
  public Integer reversed() {
    return -1;
  }

  @Override
  public Integer along(Facing.Along facing) {
    Vector3 direction = facing.direction().unit();
    double error = vectorError() * taxicab(direction);
    return sign(geometry.vectorArea().dot(direction), error);
  }

  /** ∬ (r − P)·n dS = trace of the moments about q, and (q − P)·∬ n dS. */
  @Override
  public Integer awayFrom(Facing.AwayFrom facing) {
    Vector3 offset = geometry.reference().minus(facing.point());
    double trace =
        geometry.moments().get(0) + geometry.moments().get(4) + geometry.moments().get(8);
    double error = 3 * geometry.momentsError() + vectorError() * taxicab(offset);
    return sign(trace + offset.dot(geometry.vectorArea()), error);
  }

  @Override
  public Integer outward() {
    return 1;
  }

  private double vectorError() {
    return geometry.vectorAreaError() + ROUNDING * geometry.area();
  }

  private static double taxicab(Vector3 v) {
    return Math.abs(v.x()) + Math.abs(v.y()) + Math.abs(v.z());
  }

  private static int sign(double value, double error) {
    return Math.abs(value) > error ? (int) Math.signum(value) : 0;
  }
}
