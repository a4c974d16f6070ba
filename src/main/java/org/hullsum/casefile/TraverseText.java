package org.hullsum.casefile;

import java.math.BigDecimal;
import java.math.MathContext;
import org.hullsum.quadrature.TraverseRule;
import org.hullsum.units.Dimension;
import org.hullsum.units.WorkingUnits;

/** Places in a duct's section, in words: a length, and the share of the radius or side it is. */
final class TraverseText {
  static final String REMEDY_FOR_MISSING =
      "; a rule's weights hold for its whole set only: read the speed there, or state `rule:"
          + " interpolated`, which takes what there is and bounds what is lost";

  private static final int DIGITS = 4;

  private final DuctSection section;
  private final WorkingUnits working;

  TraverseText(DuctSection section, WorkingUnits working) {
    this.section = section;
    this.working = working;
  }

  static String degrees(double angle) {
    return number(Math.toDegrees(angle)) + " deg";
  }

  static String number(double value) {
    BigDecimal rounded = new BigDecimal(value).round(new MathContext(DIGITS));
    return rounded.signum() == 0 ? "0" : rounded.stripTrailingZeros().toPlainString();
  }

  /** A length in working units. */
  String length(double length) {
    return working.none() ? number(length) : number(working.toSi(length, Dimension.LENGTH)) + " m";
  }

  String onRadius(double share) {
    return length(share * section.first())
        + " from the centre ("
        + number(share)
        + " of the radius)";
  }

  String onSides(double across, double up) {
    return length(across * section.first())
        + " along the first edge and "
        + length(up * section.second())
        + " along the second";
  }

  /** A reading beside its place; shares of the radius or the first edge. */
  String off(TraverseRule rule, String way, double found, double expected, double allowed) {
    return off(rule, way, section.first(), new double[] {found, expected, allowed});
  }

  /** The same along the second edge. */
  String offUp(TraverseRule rule, double found, double expected, double allowed) {
    return off(
        rule, "along the second edge", section.second(), new double[] {found, expected, allowed});
  }

  private String off(TraverseRule rule, String way, double scale, double[] shares) {
    return "this reading stands "
        + length(shares[0] * scale)
        + " "
        + way
        + ", where `"
        + rule.word()
        + "` has "
        + length(shares[1] * scale)
        + ": it is off by "
        + length(Math.abs(shares[0] - shares[1]) * scale)
        + ", and "
        + length(shares[2] * scale)
        + " is allowed; read it there, or state `rule: interpolated`, which takes readings"
        + " wherever they stand";
  }
}
