package org.hullsum.audit;

import org.hullsum.model.Case;
import org.hullsum.numeric.Vector3;
import org.hullsum.units.Dimension;
import org.hullsum.units.WorkingUnits;

/**
 * The factors from working units to those of the result: rates in the case's rate unit, lengths and
 * times in SI, or plain numbers.
 *
 * @param rate of a rate
 * @param length of a length
 * @param time of a time
 * @param rateUnit code of the rate unit
 * @param lengthUnit {@code m} or {@code 1}
 */
record Scales(double rate, double length, double time, String rateUnit, String lengthUnit) {
  static Scales of(Case audited) {
    WorkingUnits working = audited.working();
    return new Scales(
        audited.quantity().reportedPerWorking(working),
        working.scale(Dimension.LENGTH),
        working.scale(Dimension.TIME),
        audited.quantity().rateUnit().code(),
        working.none() ? "1" : "m");
  }

  double area(double value) {
    return length * length * value;
  }

  double volume(double value) {
    return length * length * length * value;
  }

  Vector3 point(Vector3 point) {
    return point.times(length);
  }

  Vector3 vectorArea(Vector3 vector) {
    Vector3 scaled = vector.times(length * length);
    // A negative zero would be printed.
    return scaled.plus(Vector3.ZERO);
  }

  /** The unit of areas in sentences. */
  String areaUnit() {
    return lengthUnit.equals("1") ? "1" : lengthUnit + "2";
  }

  /** A point in a sentence, in SI. */
  String place(Vector3 point) {
    return Figures.point(point(point)) + (lengthUnit.equals("1") ? "" : " " + lengthUnit);
  }
}
