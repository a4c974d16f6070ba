package org.hullsum.flux;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import org.hullsum.expression.Derivative;
import org.hullsum.expression.Expression;
import org.hullsum.expression.ExpressionParser;
import org.hullsum.expression.Function;
import org.hullsum.expression.Simplifier;
import org.hullsum.expression.VectorExpression;
import org.hullsum.field.Coordinates;
import org.hullsum.field.VectorField;
import org.hullsum.model.Input;
import org.hullsum.model.Inputs;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Place;
import org.hullsum.problem.TextFault;
import org.hullsum.units.WorkingUnits;

/** Fields and inputs for the tests. */
public final class TestFields {
  static final Expression X = Expression.symbol("x");
  static final Expression Y = Expression.symbol("y");
  static final Expression Z = Expression.symbol("z");

  private TestFields() {}

  /** A field by its Cartesian components. */
  public static VectorField field(Expression p, Expression q, Expression r) {
    VectorExpression components = new VectorExpression(p, q, r);
    Expression divergence =
        Simplifier.simplify(
            Derivative.of(p, "x").plus(Derivative.of(q, "y")).plus(Derivative.of(r, "z")));
    Map<String, Expression> definitions = new LinkedHashMap<>();
    definitions.put("x", X);
    definitions.put("y", Y);
    definitions.put("z", Z);
    Coordinates cartesian =
        new Coordinates(
            Coordinates.Kind.CARTESIAN,
            definitions,
            List.of(
                VectorExpression.of(Vector3.X),
                VectorExpression.of(Vector3.Y),
                VectorExpression.of(Vector3.Z)));
    return new VectorField("field", components, divergence, cartesian, components, divergence);
  }

  /** A formula in x, y, z and t. */
  public static Expression parse(String text) {
    try {
      return ExpressionParser.parse(text, List.of("x", "y", "z", "t"), WorkingUnits.SI).root();
    } catch (TextFault fault) {
      throw new IllegalStateException(fault);
    }
  }

  /** A field by the text of its three components. */
  public static VectorField parse(List<String> components) {
    return field(parse(components.get(0)), parse(components.get(1)), parse(components.get(2)));
  }

  /** r/3 about a point: its divergence is 1. */
  public static VectorField third(Vector3 about) {
    VectorExpression r =
        VectorExpression.position()
            .minus(VectorExpression.of(about))
            .times(Expression.number(1.0 / 3));
    return field(r.x(), r.y(), r.z());
  }

  /** A point source of strength 4π. */
  static VectorField source(Vector3 at) {
    VectorExpression r = VectorExpression.position().minus(VectorExpression.of(at));
    Expression cube = r.dot(r).power(1.5);
    return field(r.x().over(cube), r.y().over(cube), r.z().over(cube));
  }

  /** A random polynomial of the given degree, or a trigonometric function of one. */
  static Expression randomScalar(Random random) {
    Expression polynomial = Expression.number(random.nextGaussian());
    for (int term = 0; term < 4; term++) {
      Expression product = Expression.number(random.nextGaussian());
      int degree = random.nextInt(4);
      for (int k = 0; k < degree; k++) {
        product = product.times(List.of(X, Y, Z).get(random.nextInt(3)));
      }
      polynomial = polynomial.plus(product);
    }
    return switch (random.nextInt(3)) {
      case 0 -> polynomial;
      case 1 -> Expression.call(Function.SIN, Expression.number(0.3).times(polynomial));
      default -> Expression.call(Function.COS, X.plus(Y.times(Z)));
    };
  }

  static VectorField random(Random random) {
    return field(randomScalar(random), randomScalar(random), randomScalar(random));
  }

  /** The curl of a random field. */
  static VectorField randomCurl(Random random) {
    Expression a = randomScalar(random);
    Expression b = randomScalar(random);
    Expression c = randomScalar(random);
    return field(
        Derivative.of(c, "y").minus(Derivative.of(b, "z")),
        Derivative.of(a, "z").minus(Derivative.of(c, "x")),
        Derivative.of(b, "x").minus(Derivative.of(a, "y")));
  }

  static VectorField sum(VectorField f, double factor, VectorField g) {
    VectorExpression total = f.cartesian().plus(g.cartesian().times(Expression.number(factor)));
    return field(total.x(), total.y(), total.z());
  }

  /** No inputs at all. */
  static InputSensitivity noInputs() {
    return InputSensitivity.of(new Inputs(Map.of(), List.of()));
  }

  static Input figure(String name, double value, double uncertainty) {
    return new Input(
        name,
        value,
        uncertainty,
        Double.POSITIVE_INFINITY,
        Optional.empty(),
        false,
        new Place("case.yaml", 1, 1));
  }

  static Input derived(String name, double value, Expression definition) {
    return new Input(
        name,
        value,
        0,
        Double.POSITIVE_INFINITY,
        Optional.of(definition),
        false,
        new Place("case.yaml", 1, 1));
  }

  static InputSensitivity inputs(Input... all) {
    Map<String, Input> byName = new LinkedHashMap<>();
    for (Input input : all) {
      byName.put(input.name(), input);
    }
    return InputSensitivity.of(new Inputs(byName, List.of()));
  }
}
