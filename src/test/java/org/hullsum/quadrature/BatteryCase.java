package org.hullsum.quadrature;

import java.util.List;
import java.util.function.DoubleBinaryOperator;

/**
 * An integral over the unit square with a known answer.
 *
 * @param kind what makes it easy or hard
 * @param exact the answer, to all digits of a double
 */
@SuppressWarnings("ArrayRecordComponent") // handed on to the integrator as it is
record BatteryCase(
    String name,
    Kind kind,
    DoubleBinaryOperator integrand,
    List<DoubleBinaryOperator> switches,
    boolean periodicU,
    boolean periodicV,
    double exact) {
  /** What an integral asks of the integrator. */
  enum Kind {
    SMOOTH,
    OSCILLATING,
    PEAKED,
    NEARLY_SINGULAR,
    SINGULAR,
    KINKED,
    JUMPING
  }

  static BatteryCase of(String name, Kind kind, DoubleBinaryOperator integrand, double exact) {
    return new BatteryCase(name, kind, integrand, List.of(), false, false, exact);
  }

  BatteryCase switching(DoubleBinaryOperator... functions) {
    return new BatteryCase(name, kind, integrand, List.of(functions), periodicU, periodicV, exact);
  }

  BatteryCase periodic(boolean inU, boolean inV) {
    return new BatteryCase(name, kind, integrand, switches, inU, inV, exact);
  }

  SquareProblem problem(Accuracy accuracy) {
    return new SquareProblem(
        Functions.integrand(integrand),
        Functions.switches(switches.toArray(new DoubleBinaryOperator[0])),
        periodicU,
        periodicV,
        accuracy,
        1);
  }
}
