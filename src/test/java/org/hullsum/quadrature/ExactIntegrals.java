package org.hullsum.quadrature;

import static java.lang.Math.PI;
import static java.lang.Math.abs;
import static java.lang.Math.acos;
import static java.lang.Math.asin;
import static java.lang.Math.atan;
import static java.lang.Math.cos;
import static java.lang.Math.exp;
import static java.lang.Math.log;
import static java.lang.Math.sin;
import static java.lang.Math.sqrt;

import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleBinaryOperator;
import org.hullsum.quadrature.BatteryCase.Kind;

/**
 * Integrals over the unit square with answers in closed form, derived by hand unless a source is
 * named beside them. Genz's six families: A. Genz, in <i>Tools, Methods and Languages for
 * Scientific and Engineering Computation</i> (1984); their values by closed form and by quadrature.
 */
final class ExactIntegrals {
  /** I_0(1), Abramowitz and Stegun, table 9.8 (from memory, agrees with the series). */
  private static final double BESSEL_I0_OF_1 = 1.2660658777520083;

  /** erf(sqrt(1000)/2) is 1 to all digits. */
  private static final double NARROW = PI / 1000;

  private ExactIntegrals() {}

  static List<BatteryCase> cases() {
    List<BatteryCase> cases = new ArrayList<>();
    smooth(cases);
    peaked(cases);
    singular(cases);
    kinked(cases);
    jumping(cases);
    return cases;
  }

  private static BatteryCase of(
      String name, Kind kind, double exact, DoubleBinaryOperator integrand) {
    return BatteryCase.of(name, kind, integrand, exact);
  }

  private static void smooth(List<BatteryCase> cases) {
    cases.add(of("exp(u+v)", Kind.SMOOTH, Math.pow(Math.E - 1, 2), (u, v) -> exp(u + v)));
    cases.add(of("u^7 v^5", Kind.SMOOTH, 1 / 48.0, (u, v) -> Math.pow(u, 7) * Math.pow(v, 5)));
    cases.add(
        of(
            "Genz oscillatory",
            Kind.SMOOTH,
            -0.1799671909306067,
            (u, v) -> cos(0.6 * PI + 2 * u + 3 * v)));
    cases.add(
        of("Genz corner peak", Kind.SMOOTH, 7 / 144.0, (u, v) -> Math.pow(1 + 2 * u + 3 * v, -3)));
    cases.add(
        of(
            "Genz Gaussian",
            Kind.SMOOTH,
            0.36542042981745054,
            (u, v) -> exp(-4 * Math.pow(u - 0.3, 2) - 9 * Math.pow(v - 0.7, 2))));
    cases.add(
        of(
                "exp(cos + sin), periodic",
                Kind.SMOOTH,
                BESSEL_I0_OF_1 * BESSEL_I0_OF_1,
                (u, v) -> exp(cos(2 * PI * u) + sin(2 * PI * v)))
            .periodic(true, true));
    cases.add(
        of(
            "cos 40u cos 30v",
            Kind.OSCILLATING,
            sin(40) / 40 * sin(30) / 30,
            (u, v) -> cos(40 * u) * cos(30 * v)));
    cases.add(
        of(
            "sin 50(u+v)",
            Kind.OSCILLATING,
            (2 * sin(50) - sin(100)) / 2500,
            (u, v) -> sin(50 * (u + v))));
  }

  private static void peaked(List<BatteryCase> cases) {
    cases.add(
        of(
            "Genz product peak",
            Kind.PEAKED,
            16.631958117930747,
            (u, v) -> 1 / ((0.25 + Math.pow(u - 0.3, 2)) * (1 / 9.0 + Math.pow(v - 0.7, 2)))));
    cases.add(
        of(
            "ridge 1e-4",
            Kind.PEAKED,
            100 * (atan(70) + atan(30)),
            (u, v) -> 1 / (1e-4 + Math.pow(u - 0.3, 2))));
    cases.add(
        of(
            "two ridges 1e-2",
            Kind.PEAKED,
            Math.pow(20 * atan(5), 2),
            (u, v) -> 1 / ((0.01 + Math.pow(u - 0.5, 2)) * (0.01 + Math.pow(v - 0.5, 2)))));
    cases.add(
        of(
            "narrow Gaussian",
            Kind.PEAKED,
            NARROW,
            (u, v) -> exp(-1000 * (Math.pow(u - 0.5, 2) + Math.pow(v - 0.5, 2)))));
    cases.add(
        of(
                "1/(1.01 + cos), periodic",
                Kind.NEARLY_SINGULAR,
                1 / sqrt(1.01 * 1.01 - 1),
                (u, v) -> 1 / (1.01 + cos(2 * PI * u)))
            .periodic(true, false));
    double height = 0.05;
    double half = 0.5 / height;
    cases.add(
        of(
            "solid angle from 1/20 above",
            Kind.NEARLY_SINGULAR,
            4 * asin(half * half / (1 + half * half)),
            (u, v) ->
                height
                    * Math.pow(
                        Math.pow(u - 0.5, 2) + Math.pow(v - 0.5, 2) + height * height, -1.5)));
  }

  private static void singular(List<BatteryCase> cases) {
    cases.add(of("1/(1-uv)", Kind.SINGULAR, PI * PI / 6, (u, v) -> 1 / (1 - u * v)));
    cases.add(
        of("1/sqrt(u^2+v^2)", Kind.SINGULAR, 2 * log(1 + sqrt(2)), (u, v) -> 1 / Math.hypot(u, v)));
    cases.add(of("sqrt(uv)", Kind.SINGULAR, 4 / 9.0, (u, v) -> sqrt(u * v)));
    cases.add(of("1/sqrt(u)", Kind.SINGULAR, 2, (u, v) -> 1 / sqrt(u)));
    cases.add(of("ln v", Kind.SINGULAR, -1, (u, v) -> log(v)));
    cases.add(
        of(
                "sqrt|u-0.3|",
                Kind.SINGULAR,
                2 / 3.0 * (Math.pow(0.3, 1.5) + Math.pow(0.7, 1.5)),
                (u, v) -> sqrt(abs(u - 0.3)))
            .switching((u, v) -> u - 0.3));
  }

  private static void kinked(List<BatteryCase> cases) {
    cases.add(
        of(
                "Genz C0",
                Kind.KINKED,
                0.295320420662479,
                (u, v) -> exp(-2 * abs(u - 0.3) - 3 * abs(v - 0.7)))
            .switching((u, v) -> u - 0.3, (u, v) -> v - 0.7));
    cases.add(
        of("|u^2+v^2-1/4|", Kind.KINKED, 5 / 12.0 + PI / 64, (u, v) -> abs(u * u + v * v - 0.25))
            .switching((u, v) -> u * u + v * v - 0.25));
    cases.add(of("max(u,v)", Kind.KINKED, 2 / 3.0, Math::max).switching((u, v) -> u - v));
    cases.add(of("|u-v|", Kind.KINKED, 1 / 3.0, (u, v) -> abs(u - v)).switching((u, v) -> u - v));
    cases.add(
        of("|u-0.3||v-0.6|", Kind.KINKED, 0.29 * 0.26, (u, v) -> abs(u - 0.3) * abs(v - 0.6))
            .switching((u, v) -> u - 0.3, (u, v) -> v - 0.6));
    cases.add(
        of(
                "|sin 2 pi u||cos pi v|",
                Kind.KINKED,
                4 / (PI * PI),
                (u, v) -> abs(sin(2 * PI * u)) * abs(cos(PI * v)))
            .switching((u, v) -> sin(2 * PI * u), (u, v) -> cos(PI * v)));
    cases.add(
        of("|sin 6 pi u|", Kind.KINKED, 2 / PI, (u, v) -> abs(sin(6 * PI * u)))
            .switching((u, v) -> sin(6 * PI * u)));
    DoubleBinaryOperator wave = (u, v) -> v - 0.5 - 0.3 * sin(2 * PI * u);
    cases.add(
        of("kink along a wave", Kind.KINKED, 0.295, (u, v) -> abs(wave.applyAsDouble(u, v)))
            .switching(wave));
    cases.add(
        of("wave, periodic", Kind.KINKED, 0.295, (u, v) -> abs(wave.applyAsDouble(u, v)))
            .switching(wave)
            .periodic(true, false));
    cases.add(
        of(
                "three lines through a point",
                Kind.KINKED,
                5 / 6.0,
                (u, v) -> abs(u - 0.5) + abs(v - 0.5) + abs(u - v))
            .switching((u, v) -> u - 0.5, (u, v) -> v - 0.5, (u, v) -> u - v));
  }

  private static DoubleBinaryOperator disc(double u0, double v0, double radius) {
    return (u, v) -> radius * radius - Math.pow(u - u0, 2) - Math.pow(v - v0, 2);
  }

  private static BatteryCase inside(String name, double exact, DoubleBinaryOperator... within) {
    return of(
            name,
            Kind.JUMPING,
            exact,
            (u, v) -> {
              for (DoubleBinaryOperator one : within) {
                if (one.applyAsDouble(u, v) < 0) {
                  return 0;
                }
              }
              return 1;
            })
        .switching(within);
  }

  private static void jumping(List<BatteryCase> cases) {
    cases.add(
        of(
                "Genz discontinuous",
                Kind.JUMPING,
                0.9819071686524452,
                (u, v) -> u <= 0.3 && v <= 0.7 ? exp(2 * u + 3 * v) : 0)
            .switching((u, v) -> u - 0.3, (u, v) -> v - 0.7));
    cases.add(inside("quarter disc", PI / 16, disc(0, 0, 0.5)));
    cases.add(inside("disc", PI * 0.04, disc(0.5, 0.5, 0.2)));
    cases.add(inside("small disc", PI * 16e-6, disc(0.37, 0.41, 0.004)));
    cases.add(inside("tiny disc", PI * 1e-8, disc(0.7713, 0.2391, 1e-4)));
    cases.add(inside("disc touching four sides", PI / 4, disc(0.5, 0.5, 0.5)));
    DoubleBinaryOperator hole = disc(0.5, 0.5, 0.2);
    cases.add(
        inside("annulus", PI * 0.12, disc(0.5, 0.5, 0.4), (u, v) -> -hole.applyAsDouble(u, v)));
    cases.add(inside("triangle of two lines", 0.25, (u, v) -> 1 - u - v, (u, v) -> v - u));
    double d = 0.3;
    cases.add(
        inside(
            "lens of two discs",
            2 * 0.16 * acos(d / 0.8) - d / 2 * sqrt(0.64 - d * d),
            disc(0.35, 0.5, 0.4),
            disc(0.65, 0.5, 0.4)));
    cases.add(
        of("exp u below a line", Kind.JUMPING, exp(0.7) - 1.7, (u, v) -> u + v < 0.7 ? exp(u) : 0)
            .switching((u, v) -> 0.7 - u - v));
    cases.add(
        of("exp u or -exp v", Kind.JUMPING, 0, (u, v) -> u < v ? exp(u) : -exp(v))
            .switching((u, v) -> u - v));
    cases.add(
        of(
                "sign of a hyperbola",
                Kind.JUMPING,
                0.2 * (1 - log(0.2)) * 2 - 1,
                (u, v) -> u * v < 0.2 ? 1 : -1)
            .switching((u, v) -> u * v - 0.2));
    cases.add(
        of(
                "disc across a periodic side",
                Kind.JUMPING,
                PI * 0.04,
                (u, v) -> 0.04 - Math.pow(fromSide(u), 2) - Math.pow(v - 0.5, 2) < 0 ? 0 : 1)
            .switching((u, v) -> 0.04 - Math.pow(fromSide(u), 2) - Math.pow(v - 0.5, 2)));
  }

  /** Distance from the nearer of u = 0 and u = 1. */
  private static double fromSide(double u) {
    return Math.min(u, 1 - u);
  }
}
