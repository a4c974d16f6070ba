package org.hullsum.expression;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Connective;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Operator;
import org.hullsum.expression.Expression.Relation;

/** Seeded random formulas in x, y, z and points to evaluate them at. */
final class RandomExpressions {
  static final List<String> VARIABLES = List.of("x", "y", "z");
  private static final double[] NUMBERS = {0, 1, 2, 3, -1, -2, 0.5, 1.5, 0.1, 4, 7.25};
  private static final double[] EXPONENTS = {2, 3, -1, -2, 0.5, 1.5, -0.5, 1, 0, 4};

  private final Random random;
  private final boolean smooth;

  private RandomExpressions(long seed, boolean smooth) {
    this.random = new Random(seed);
    this.smooth = smooth;
  }

  /** With every node of the language. */
  static RandomExpressions any(long seed) {
    return new RandomExpressions(seed, false);
  }

  /** Without abs, min, max, sign, if and conditions. */
  static RandomExpressions smooth(long seed) {
    return new RandomExpressions(seed, true);
  }

  Expression next(int depth) {
    if (depth == 0 || random.nextInt(8) == 0) {
      return leaf();
    }
    int kind = random.nextInt(smooth ? 16 : 19);
    if (kind < 9) {
      Operator operator = Operator.values()[random.nextInt(4)];
      return new Binary(operator, next(depth - 1), next(depth - 1));
    }
    return switch (kind) {
      case 9 -> next(depth - 1).negated();
      case 10, 11 -> next(depth - 1).power(EXPONENTS[random.nextInt(EXPONENTS.length)]);
      case 12 -> new Binary(Operator.POWER, next(depth - 1), next(depth - 1));
      case 13, 14, 15 -> function(depth);
      case 16, 17 -> new Conditional(condition(depth - 1), next(depth - 1), next(depth - 1));
      default -> condition(depth - 1);
    };
  }

  private Expression function(int depth) {
    Function function;
    do {
      function = Function.values()[random.nextInt(Function.values().length)];
    } while (smooth && !smooth(function));
    List<Expression> arguments = new ArrayList<>();
    int count = function.fewestArguments() + (function.mostArguments() > 2 ? random.nextInt(2) : 0);
    for (int i = 0; i < count; i++) {
      arguments.add(next(depth - 1));
    }
    return new Call(function, arguments);
  }

  private static boolean smooth(Function function) {
    return switch (function) {
      case ABS, MIN, MAX, SIGN -> false;
      default -> true;
    };
  }

  private Expression condition(int depth) {
    if (depth > 1 && random.nextInt(3) == 0) {
      Connective connective = Connective.values()[random.nextInt(3)];
      int count = connective == Connective.NOT ? 1 : 2 + random.nextInt(2);
      List<Expression> conditions = new ArrayList<>();
      for (int i = 0; i < count; i++) {
        conditions.add(condition(depth - 1));
      }
      return new Logical(connective, conditions);
    }
    Relation relation = Relation.values()[random.nextInt(Relation.values().length)];
    int below = Math.max(0, depth - 1);
    return new Comparison(relation, next(below), next(below));
  }

  private Expression leaf() {
    int kind = random.nextInt(10);
    if (kind < 7) {
      return Expression.symbol(VARIABLES.get(random.nextInt(VARIABLES.size())));
    }
    if (kind == 7) {
      // not pi: its sine is zero, but not in rounded arithmetic
      return new Constant(Math.E, Optional.empty(), Optional.of("e"));
    }
    return Expression.number(NUMBERS[random.nextInt(NUMBERS.length)]);
  }

  /**
   * Whether rounded arithmetic and real numbers may part at a point: where something overflows, or
   * an angle is taken of a zero, whose sign is rounding.
   */
  static boolean isWild(Expression e, Map<String, Double> point) {
    for (Expression part : Symbols.parts(e)) {
      double value = NaiveEvaluator.evaluate(part, point);
      boolean angleOfZero =
          part instanceof Call call
              && call.function() == Function.ATAN2
              && NaiveEvaluator.evaluate(call.arguments().get(0), point) == 0;
      if (Double.isInfinite(value) || angleOfZero) {
        return true;
      }
    }
    return false;
  }

  Map<String, Double> point() {
    Map<String, Double> point = new HashMap<>();
    for (String variable : VARIABLES) {
      point.put(variable, 0.2 + 2 * random.nextDouble() * (random.nextInt(4) == 0 ? -1 : 1));
    }
    return point;
  }
}
