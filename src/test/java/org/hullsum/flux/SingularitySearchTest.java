package org.hullsum.flux;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Random;
import org.hullsum.expression.Expression;
import org.hullsum.expression.ExpressionParser;
import org.hullsum.expression.VectorExpression;
import org.hullsum.field.Coordinates;
import org.hullsum.field.VectorField;
import org.hullsum.flux.Assemblies.Assembly;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.TextFault;
import org.hullsum.units.WorkingUnits;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class SingularitySearchTest {
  private static final OptionalDouble TIMELESS = OptionalDouble.empty();
  private static final Assembly BALL = Assemblies.ball(Vector3.ZERO, 1);

  private static SingularityOutcome inside(Assembly assembly, VectorField field) {
    return new SingularitySearch(Map.of())
        .inRegion(VolumeIntegratorTest.boundary(assembly), field, TIMELESS);
  }

  private static SingularityOutcome inside(Assembly assembly, String density) {
    return new SingularitySearch(Map.of())
        .inRegion(VolumeIntegratorTest.boundary(assembly), TestFields.parse(density), TIMELESS);
  }

  private static VectorField field(String p, String q, String r) {
    return TestFields.parse(List.of(p, q, r));
  }

  /** A field by its components along the local unit vectors of cylindrical coordinates. */
  private static VectorField cylindrical(String radial, String around, String along) {
    Map<String, Expression> definitions = new LinkedHashMap<>();
    definitions.put("r", TestFields.parse("sqrt(x^2+y^2)"));
    definitions.put("theta", TestFields.parse("atan2(y, x)"));
    definitions.put("z", TestFields.Z);
    VectorExpression outward =
        new VectorExpression(
            TestFields.parse("x/sqrt(x^2+y^2)"),
            TestFields.parse("y/sqrt(x^2+y^2)"),
            Expression.number(0));
    VectorExpression tangential =
        new VectorExpression(outward.y().negated(), outward.x(), Expression.number(0));
    Coordinates coordinates =
        new Coordinates(
            Coordinates.Kind.CYLINDRICAL,
            definitions,
            List.of(outward, tangential, VectorExpression.of(Vector3.Z)));
    VectorExpression components =
        new VectorExpression(nativeFormula(radial), nativeFormula(around), nativeFormula(along));
    VectorExpression cartesian =
        outward
            .times(components.x())
            .plus(tangential.times(components.y()))
            .plus(VectorExpression.of(Vector3.Z).times(components.z()))
            .replace(definitions);
    Expression divergence =
        TestFields.field(cartesian.x(), cartesian.y(), cartesian.z()).divergence();
    return new VectorField("field", cartesian, divergence, coordinates, components, divergence);
  }

  private static Expression nativeFormula(String text) {
    try {
      return ExpressionParser.parse(text, List.of("r", "theta", "z", "t"), WorkingUnits.SI).root();
    } catch (TextFault fault) {
      throw new IllegalStateException(fault);
    }
  }

  private static Vector3 place(SingularityOutcome outcome) {
    return outcome.accept(
        new SingularityOutcome.Visitor<>() {
          @Override
          public Vector3 provedAbsent() {
            throw new AssertionError("proved absent");
          }

          @Override
          public Vector3 foundAt(SingularityOutcome.FoundAt found) {
            return found.place();
          }

          @Override
          public Vector3 notExcluded(SingularityOutcome.NotExcluded notExcluded) {
            throw new AssertionError("" + notExcluded);
          }
        });
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3})
  void polynomialsAreProvedRegularWithoutWork(long seed) {
    Random random = new Random(seed);
    for (Assembly assembly : Assemblies.random(random)) {
      assertTrue(inside(assembly, TestFields.random(random)).isProvedAbsent());
    }
  }

  /** Its divergence simplifies to zero, and sampling misses the point. */
  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5})
  void sourceInsideABallIsFoundAtItsPlace(long seed) {
    Random random = new Random(seed);
    Vector3 at =
        new Vector3(
            random.nextDouble() - 0.5, random.nextDouble() - 0.5, random.nextDouble() - 0.5);
    SingularityOutcome outcome = inside(BALL, TestFields.source(at));
    assertEquals(0, place(outcome).minus(at).norm(), 1e-8);
  }

  @Test
  void sourceOutsideIsProvedAbsent() {
    VectorField source = TestFields.source(new Vector3(0, 0, 1.2));
    assertTrue(inside(BALL, source).isProvedAbsent());
    assertTrue(
        inside(Assemblies.box(new Vector3(-1, -1, -1), new Vector3(1, 1, 1)), source)
            .isProvedAbsent());
  }

  /** In the corner of the bounding box, and in the hole of the torus, but not in the region. */
  @Test
  void sourceInTheBoundingBoxButOutsideTheRegionIsProvedAbsent() {
    assertTrue(inside(BALL, TestFields.source(new Vector3(0.8, 0.8, 0.8))).isProvedAbsent());
    assertTrue(inside(Assemblies.torus(1, 0.3), TestFields.source(Vector3.ZERO)).isProvedAbsent());
  }

  @Test
  void vortexInTheHoleOfAHollowCanIsProvedAbsent() {
    VectorField vortex = field("-y/(x^2+y^2)", "x/(x^2+y^2)", "0");
    assertTrue(inside(Assemblies.hollowCan(0.3, 1, 2), vortex).isProvedAbsent());
    assertTrue(inside(Assemblies.can(1, 0, 2), vortex).isFound());
  }

  @Test
  void cylindricalFieldWithBoundedComponentsIsRegularOnTheAxis() {
    Assembly can = Assemblies.can(1, 0, 2);
    assertTrue(inside(can, cylindrical("r*(1-r)", "r^2", "cos(theta)")).isProvedAbsent());
    assertTrue(inside(can, cylindrical("1/r", "0", "0")).isFound());
  }

  @Test
  void planeOnWhichADenominatorVanishesIsFound() {
    Vector3 place = place(inside(BALL, field("1/(x-0.25)", "0", "0")));
    assertEquals(0.25, place.x(), 1e-8);
  }

  @Test
  void logarithmAndRootOfNegativeValuesAreFound() {
    assertTrue(inside(BALL, "ln(z+0.5)").isFound());
    assertTrue(inside(BALL, "sqrt(z+0.5)").isFound());
    assertTrue(inside(BALL, "(z+0.5)^1.5").isFound());
    assertTrue(inside(BALL, "asin(2*x)").isFound());
    assertTrue(inside(BALL, "tan(2*x)").isFound());
  }

  @Test
  void logarithmAndRootOfPositiveValuesAreProvedRegular() {
    assertTrue(inside(BALL, "ln(z+1.5)").isProvedAbsent());
    assertTrue(inside(BALL, "sqrt(z+1.5)*asin(x/2)*tan(x)").isProvedAbsent());
    assertTrue(inside(BALL, "1/(1+x^2+y^2)").isProvedAbsent());
  }

  @Test
  void rootThatVanishesOnTheBoundaryIsRegular() {
    Assembly box = Assemblies.box(Vector3.ZERO, new Vector3(1, 1, 1));
    assertFalse(inside(box, "sqrt(z)").isFound());
  }

  @Test
  void removableQuotientIsProvedRegularOrElseNotExcluded() {
    assertTrue(inside(BALL, "sin(x)/x").isProvedAbsent());
    SingularityOutcome outcome = inside(BALL, "(x^2 - y^2)/(x - y)");
    assertFalse(outcome.isFound());
    assertFalse(outcome.isProvedAbsent());
  }

  @Test
  void conditionThatKeepsAwayFromTheZeroCounts() {
    assertTrue(inside(BALL, "if(x > 0.1, 1/x, 10)").isProvedAbsent());
    assertTrue(inside(BALL, "if(x > -0.1, 1/x, 10)").isFound());
  }

  @Test
  void singularityOnAPatchIsFoundOnThePatch() {
    SingularitySearch search = new SingularitySearch(Map.of());
    PulledBackSurface disk = PulledBackSurface.of(Assemblies.disk(Vector3.ZERO, Vector3.Z, 1));
    VectorField onIt = TestFields.source(new Vector3(0.3, 0.2, 0));
    VectorField above = TestFields.source(new Vector3(0.3, 0.2, 0.01));
    assertEquals(0.3, place(search.onSurface(disk, onIt, TIMELESS)).x(), 1e-7);
    assertTrue(search.onSurface(disk, above, TIMELESS).isProvedAbsent());
  }

  @Test
  void singularityOnAPartThatIsTrimmedAwayDoesNotCount() {
    PulledBackSurface trimmed =
        PulledBackSurface.of(
            Assemblies.trimmed(
                Assemblies.disk(Vector3.ZERO, Vector3.Z, 1),
                List.of(),
                List.of(
                    new org.hullsum.geometry.Body.Sphere(
                        Assemblies.point(0.3, 0.2, 0), Assemblies.number(0.1)))));
    VectorField source = TestFields.source(new Vector3(0.3, 0.2, 0));
    assertTrue(
        new SingularitySearch(Map.of()).onSurface(trimmed, source, TIMELESS).isProvedAbsent());
  }
}
