package org.hullsum.field;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.function.Function;
import org.hullsum.expression.Expression;
import org.hullsum.expression.Printer;
import org.hullsum.expression.Substitution;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Fields against differences of their values, against one another, and against known results. */
class VectorFieldsTest {
  private static final long SEED = 20260105;

  /** Of the differences by which derivatives are checked. */
  private static final double DIFFERENCE_ERROR = 2e-8;

  private static final double ROUNDING = 1e-13;

  private static final AxisFrame TILTED =
      AxisFrame.of(Fields.vector("a - 4", "-3", "b"), new Vector3(1, 2, -0.5)).orElseThrow();

  private static final List<Coordinates> SYSTEMS =
      List.of(
          CoordinateSystems.cartesian(),
          CoordinateSystems.cylindrical(AxisFrame.STANDARD),
          CoordinateSystems.spherical(AxisFrame.STANDARD),
          CoordinateSystems.cylindrical(TILTED),
          CoordinateSystems.spherical(TILTED));

  private static final Coordinates CYLINDRICAL = SYSTEMS.get(1);
  private static final Coordinates SPHERICAL = SYSTEMS.get(2);

  /** The native names of a system in the place of p, q and w. */
  private static String in(Coordinates system, String text) {
    List<String> names = List.copyOf(system.definitions().keySet());
    return text.replaceAll("\\bp\\b", names.get(0))
        .replaceAll("\\bq\\b", names.get(1))
        .replaceAll("\\bw\\b", names.get(2));
  }

  private static VectorField components(Coordinates system, String p, String q, String w) {
    return VectorFields.ofComponents(
        "f", system, Fields.vector(in(system, p), in(system, q), in(system, w)));
  }

  /** A field, told by how it was made. */
  private record Made(String how, Coordinates system, Function<Coordinates, VectorField> make) {
    VectorField field() {
      return make.apply(system);
    }

    @Override
    public String toString() {
      return how + " in " + system.kind();
    }
  }

  static List<Made> fields() {
    return SYSTEMS.stream()
        .flatMap(
            s ->
                List.of(
                    new Made("polynomial", s, c -> components(c, "p^2*w", "a*p*q", "w^2 - b*q")),
                    new Made("smooth", s, c -> components(c, "sin(p*q)", "exp(-w)*q", "p*cos(w)")),
                    new Made("in time", s, c -> components(c, "t*p", "w*t^2", "k*p*q*t")),
                    new Made(
                        "conduction",
                        s,
                        c ->
                            VectorFields.gradient(
                                "f",
                                c,
                                Fields.parse(in(c, "a*p^2*cos(q) + w^3")),
                                Fields.parse("-k"))),
                    new Made(
                        "conduction by a varying conductivity",
                        s,
                        c ->
                            VectorFields.gradient(
                                "f",
                                c,
                                Fields.parse(in(c, "p*w + b*q^2")),
                                Fields.parse(in(c, "-k*(1 + a*p)")))),
                    new Made(
                        "carried",
                        s,
                        c ->
                            VectorFields.carried(
                                "f",
                                components(c, "p", "w", "q"),
                                c,
                                Fields.parse(in(c, "1 + a*q*w")))),
                    new Made(
                        "carried with a Cartesian content",
                        s,
                        c ->
                            VectorFields.carried(
                                "f",
                                components(c, "p", "w", "q"),
                                SYSTEMS.get(0),
                                Fields.parse("1 + x*y - b*z"))),
                    new Made(
                        "sum with a Cartesian one",
                        s,
                        c ->
                            VectorFields.sum(
                                "f",
                                List.of(
                                    components(c, "p*q", "w", "p^2"),
                                    components(SYSTEMS.get(0), "x*y", "z^2", "x")))))
                    .stream())
        .toList();
  }

  @ParameterizedTest
  @MethodSource("fields")
  void divergenceIsThatOfTheCartesianComponents(Made made) {
    VectorField field = made.field();
    for (Vector3 at : Fields.points(SEED, 12)) {
      double expected = Fields.numericDivergence(field, at);
      assertEquals(
          expected,
          Fields.value(field.divergence(), at),
          DIFFERENCE_ERROR * (1 + Math.abs(expected)),
          () -> made + " at " + at);
    }
  }

  @ParameterizedTest
  @MethodSource("systems")
  void gradientIsThatOfTheValue(Coordinates system) {
    Expression value = Fields.parse(in(system, "sin(p)*q + a*w^2*p"));
    VectorField gradient = VectorFields.gradient("f", system, value, Expression.number(1));
    Expression inSpace = Substitution.replace(value, system.definitions());
    for (Vector3 at : Fields.points(SEED + 1, 12)) {
      Vector3 found = Fields.value(gradient.cartesian(), at);
      for (Vector3 direction : List.of(Vector3.X, Vector3.Y, Vector3.Z)) {
        double expected = Fields.slope(inSpace, at, direction);
        assertEquals(expected, found.dot(direction), DIFFERENCE_ERROR * (1 + Math.abs(expected)));
      }
    }
  }

  static List<Coordinates> systems() {
    return SYSTEMS;
  }

  @ParameterizedTest
  @MethodSource("systems")
  void unitVectorsAreOrthonormalAndRightHandedEverywhere(Coordinates system) {
    List<Vector3> points = List.of(new Vector3(0.3, -0.4, 2), Vector3.ZERO, new Vector3(0, 0, -3));
    for (Vector3 at : points) {
      List<Vector3> e = system.unitVectors().stream().map(v -> Fields.value(v, at)).toList();
      for (int i = 0; i < 3; i++) {
        for (int j = 0; j < 3; j++) {
          assertEquals(i == j ? 1 : 0, e.get(i).dot(e.get(j)), ROUNDING, "at " + at);
        }
      }
      assertEquals(1, e.get(0).cross(e.get(1)).dot(e.get(2)), ROUNDING, "at " + at);
    }
  }

  /** The same field in cylindrical, spherical and Cartesian coordinates. */
  private record Same(String name, VectorField one, VectorField other) {
    @Override
    public String toString() {
      return name;
    }
  }

  static List<Same> twice() {
    Coordinates cartesian = SYSTEMS.get(0);
    return List.of(
        new Same(
            "rigid rotation",
            components(CYLINDRICAL, "0", "a*r", "0"),
            components(cartesian, "-a*y", "a*x", "0")),
        new Same(
            "radial spread",
            components(CYLINDRICAL, "a*r", "0", "b*z"),
            components(cartesian, "a*x", "a*y", "b*z")),
        new Same(
            "line source",
            components(CYLINDRICAL, "a/r", "0", "0"),
            components(cartesian, "a*x/(x^2 + y^2)", "a*y/(x^2 + y^2)", "0")),
        new Same(
            "point source",
            components(SPHERICAL, "a/r^2", "0", "0"),
            components(
                cartesian,
                "a*x/(x^2 + y^2 + z^2)^1.5",
                "a*y/(x^2 + y^2 + z^2)^1.5",
                "a*z/(x^2 + y^2 + z^2)^1.5")),
        new Same(
            "uniform stream",
            components(SPHERICAL, "a*cos(polar)", "-a*sin(polar)", "0"),
            components(cartesian, "0", "0", "a")),
        new Same(
            "rotation about the polar axis",
            components(SPHERICAL, "0", "0", "a*r*sin(polar)"),
            components(cartesian, "-a*y", "a*x", "0")));
  }

  @ParameterizedTest
  @MethodSource("twice")
  void sameFieldInOtherCoordinatesHasTheSameValuesAndDivergence(Same same) {
    for (Vector3 point : Fields.points(SEED + 2, 20)) {
      Vector3 at = point.minus(new Vector3(1, 1, 1)).times(2);
      Vector3 difference =
          Fields.value(same.one().cartesian(), at)
              .minus(Fields.value(same.other().cartesian(), at));
      double size = Fields.value(same.other().cartesian(), at).norm();
      assertTrue(difference.norm() <= ROUNDING * (1 + size), () -> "off by " + difference);
      double expected = Fields.value(same.other().divergence(), at);
      assertEquals(
          expected,
          Fields.value(same.one().divergence(), at),
          ROUNDING * (1 + Math.abs(expected) + size / at.norm()));
    }
  }

  @ParameterizedTest
  @CsvSource({
    "0, a*r, 0, 0",
    "a*r, 0, -2*a*z, 0",
    "a/r, 0, 0, 0",
    "a*r^2, 0, 0, 3*a*r",
    "sin(r)/r, 0, 0, cos(r)/r",
    "0, 0, b*z, b",
    "r*cos(theta), r*sin(theta), 0, 3*cos(theta)"
  })
  void cylindricalDivergenceIsPrintedWithoutDenominatorsThatCancel(
      String radial, String around, String along, String printed) {
    VectorField field = components(CYLINDRICAL, radial, around, along);

    assertEquals(printed, Printer.print(field.printedDivergence()));
  }

  @ParameterizedTest
  @CsvSource({
    "a*r, 0, 0, 3*a",
    "a/r^2, 0, 0, 0",
    "a*cos(polar), -a*sin(polar), 0, 0",
    "0, 0, r*sin(polar), 0"
  })
  void sphericalDivergenceIsPrintedWithoutDenominatorsThatCancel(
      String radial, String polar, String around, String printed) {
    VectorField field = components(SPHERICAL, radial, polar, around);

    assertEquals(printed, Printer.print(field.printedDivergence()));
  }

  /** Fields of worked examples in E. Herman, G. Strang, Calculus Volume 3, OpenStax, 6.8. */
  @ParameterizedTest
  @CsvSource({
    "x - y, x + z, z - y, 2",
    "x^3/3 + y*z, y^3/3 - sin(x*z), z - x - y, x^2 + y^2 + 1",
    "x^2*z^3, 2*x*y*z^3, x*z^4, 8*x*z^3",
    "x^2, x*y, x^3*y^3, 3*x",
    "y - 2*x, x^3 - y, y^2 - z, -4"
  })
  void divergenceOfWorkedExamplesIsPrinted(String p, String q, String r, String printed) {
    VectorField field = VectorFields.ofComponents("f", SYSTEMS.get(0), Fields.vector(p, q, r));

    assertEquals(printed, Printer.print(field.printedDivergence()));
  }

  @ParameterizedTest
  @CsvSource({
    "a*r, b*r, z, 3.6",
    "a*r*(1 - r^2), 0, 0, 2.6",
    "sin(a*r), 0, 0, 2.6",
    "1 - cos(r), r^2, 0, 0",
    "r*exp(-r), 0, b*z, 2.7"
  })
  void divergenceOnTheAxisIsTheLimit(String radial, String around, String along, double limit) {
    VectorField field = components(CYLINDRICAL, radial, around, along);

    assertEquals(limit, Fields.value(field.divergence(), new Vector3(0, 0, 0.3)), ROUNDING);
    assertTrue(Fields.value(field.cartesian(), new Vector3(0, 0, 0.3)).isFinite());
  }

  @ParameterizedTest
  @CsvSource({
    "a*r, 0, 0, 0.5, 3.9",
    "sin(a*r), 0, 0, 0, 3.9",
    "a*cos(polar), -a*sin(polar), 0, 0.5, 0",
    "a*cos(polar), -a*sin(polar), 0, -0.5, 0",
    "r*sin(b*polar)/polar, 0, 0, 0.5, 2.1"
  })
  void divergenceOnThePolarAxisIsTheLimit(
      String radial, String polar, String around, double z, double limit) {
    VectorField field = components(SPHERICAL, radial, polar, around);

    assertEquals(limit, Fields.value(field.divergence(), new Vector3(0, 0, z)), 1e-12);
  }

  @Test
  void sumOfFieldsInTheSameCoordinatesStaysInThem() {
    VectorField sum =
        VectorFields.sum(
            "sum",
            List.of(
                components(CYLINDRICAL, "a*r", "0", "0"),
                components(CYLINDRICAL, "-a*r", "b*r", "0")));

    assertEquals(Coordinates.Kind.CYLINDRICAL, sum.coordinates().kind());
    assertEquals(
        new VectorExpression(Expression.number(0), Fields.parse("b*r"), Expression.number(0)),
        sum.components());
  }

  @Test
  void axisNeedsADirection() {
    VectorExpression origin = VectorExpression.of(Vector3.ZERO);

    assertTrue(AxisFrame.of(origin, Vector3.ZERO).isEmpty());
    assertTrue(AxisFrame.of(origin, new Vector3(Double.NaN, 0, 1)).isEmpty());
  }

  @Test
  void anglesStartAtTheYAxisWhereTheAxisIsAlongX() {
    AxisFrame frame =
        AxisFrame.of(VectorExpression.of(Vector3.ZERO), new Vector3(2, 0, 0)).orElseThrow();

    assertEquals(Vector3.Y, frame.zero());
    assertEquals(Vector3.Z, frame.quarter());
  }
}
