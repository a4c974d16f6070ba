package org.hullsum.casefile;

import org.hullsum.expression.Expression;
import org.hullsum.expression.Expression.Operator;
import org.hullsum.expression.Function;
import org.hullsum.expression.VectorExpression;

/**
 * A law of the velocity over a round cross-section of radius R: the speed at distance d from the
 * centre as a share of the centreline's, and the share of the mean over the area. Both are exact.
 *
 * <ul>
 *   <li>power law: (1 − d/R)^(1/n); mean 2n²/((n+1)(2n+1)) (J. Nikuradse, VDI-Forschungsheft 356,
 *       1932; H. Schlichting, Boundary-Layer Theory, chapter XX; from memory)
 *   <li>laminar: 1 − d²/R²; mean 1/2 (Hagen–Poiseuille)
 *   <li>uniform: 1; mean 1
 *   <li>log law of a rough wall with equivalent sand roughness E: ln(1 + 30 y/E) / ln(1 + 30 R/E)
 *       with y = R − d, which vanishes at the wall and tends to Nikuradse's rough-pipe law u/u* =
 *       (1/κ) ln(30 y/E) away from it (J. Nikuradse, VDI-Forschungsheft 361, 1933; from memory).
 *       With a = 30 R/E and L = ln(1 + a) the mean is 2 [((1+a)L − a)/a − (L/2 − 1/4 + 1/(2a) −
 *       L/(2a²))] / L
 * </ul>
 *
 * <p>The root of the power law is taken of the square of 1 − d/R, so that a rounding of d beyond R
 * at the rim gives no root of a negative number.
 *
 * @param share of the centreline speed, in {@code x y z}
 * @param meanShare of the centreline speed, a formula of parameters
 * @param text a phrase for the report
 */
record ProfileLaw(Expression share, Expression meanShare, String text) {
  /** ln(30 y/E): the constant of the rough-pipe law. */
  private static final double ROUGH = 30;

  private static final Expression ONE = Expression.number(1);
  private static final Expression TWO = Expression.number(2);

  private static Expression squaredDistance(SurfaceEntry.Disk disk) {
    VectorExpression offset = VectorExpression.position().minus(disk.centre());
    return offset.x().power(2).plus(offset.y().power(2)).plus(offset.z().power(2));
  }

  private static Expression distance(SurfaceEntry.Disk disk) {
    return Expression.call(Function.SQRT, squaredDistance(disk));
  }

  static ProfileLaw power(SurfaceEntry.Disk disk, Expression n, String printed) {
    Expression fromWall = ONE.minus(distance(disk).over(disk.radius()));
    Expression exponent = ONE.over(TWO.times(n));
    Expression share = new Expression.Binary(Operator.POWER, fromWall.power(2), exponent);
    Expression mean = TWO.times(n.power(2)).over(n.plus(ONE).times(TWO.times(n).plus(ONE)));
    return new ProfileLaw(share, mean, "power law, n = " + printed);
  }

  static ProfileLaw laminar(SurfaceEntry.Disk disk) {
    Expression share = ONE.minus(squaredDistance(disk).over(disk.radius().power(2)));
    return new ProfileLaw(share, Expression.number(0.5), "laminar");
  }

  static ProfileLaw uniform() {
    return new ProfileLaw(ONE, ONE, "uniform");
  }

  static ProfileLaw logarithmic(SurfaceEntry.Disk disk, Expression roughness, String printed) {
    Expression fromWall = disk.radius().minus(distance(disk));
    Expression scale = Expression.number(ROUGH).over(roughness);
    Expression a = scale.times(disk.radius());
    Expression whole = Expression.call(Function.LN, ONE.plus(a));
    Expression share = Expression.call(Function.LN, ONE.plus(scale.times(fromWall))).over(whole);
    Expression flat = ONE.plus(a).times(whole).minus(a).over(a);
    Expression tilted =
        whole
            .over(TWO)
            .minus(Expression.number(0.25))
            .plus(ONE.over(TWO.times(a)))
            .minus(whole.over(TWO.times(a.power(2))));
    Expression mean = TWO.times(flat.minus(tilted)).over(whole);
    return new ProfileLaw(share, mean, "log law, roughness " + printed);
  }
}
