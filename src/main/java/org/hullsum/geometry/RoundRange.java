package org.hullsum.geometry;

import java.util.Optional;
import org.hullsum.geometry.Chart.Side;

/**
 * The range of a sphere's or ellipsoid's angles, u along the polar angle, v along the azimuth.
 *
 * @param polar range of the angle from the axis
 * @param azimuth range of the angle about it
 * @param northPole whether the range begins at the pole
 * @param southPole whether it ends at the other
 */
record RoundRange(Span polar, Figures.Turn azimuth, boolean northPole, boolean southPole) {
  static RoundRange of(Optional<Span> polar, Optional<Span> azimuth, Figures figures)
      throws SurfaceFault {
    Span range = polar.orElseGet(Span::poleToPole);
    double from = figures.value("polar", range.from());
    double to = figures.value("polar", range.to());
    double slack = Math.PI * Tolerance.ROUNDING;
    if (!(from < to && from >= -slack && to <= Math.PI + slack)) {
      throw new SurfaceFault(
          "polar",
          "polar goes from "
              + from
              + " rad to "
              + to
              + " rad; it must increase and stay within 0 deg and 180 deg");
    }
    return new RoundRange(
        range,
        figures.turn("azimuth", azimuth.orElseGet(Span::fullTurn)),
        from <= slack,
        to >= Math.PI - slack);
  }

  ChartSides sides() {
    return new ChartSides()
        .turn(azimuth.full(), Side.V_START, Side.V_END)
        .add(Side.U_START, !northPole)
        .add(Side.U_END, !southPole);
  }
}
