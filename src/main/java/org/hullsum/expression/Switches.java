package org.hullsum.expression;

import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Operator;

/**
 * The functions on whose zero sets an expression has a kink or a jump: the arguments of {@code abs}
 * and {@code sign} (also where it is written as the root of a square), the differences of any two
 * arguments of {@code min} and {@code max}, and left less right side of each comparison.
 *
 * <p>Between these curves the expression is as smooth as its smooth functions are. The curves where
 * the result itself is not smooth are among those given; not all need be (the other branch may
 * hold, two branches may join smoothly).
 */
public final class Switches {
  /** Beyond so many they are taken as they are, without looking for repetitions up to the sign. */
  private static final int MOST_SIMPLIFIED = 100;

  private Switches() {}

  /** All of them, simplified, without repetition (up to the sign) and without constants. */
  public static List<Expression> of(Expression e) {
    Set<Expression> switches = new LinkedHashSet<>();
    collectKinks(e, switches);
    if (Symbols.parts(e).stream().anyMatch(Switches::mayHideKink)) {
      collectKinks(Simplifier.simplify(e), switches);
    }
    collectJumps(e, switches);
    return List.copyOf(switches);
  }

  /** A root of a square is a magnitude, which the simplifier brings to light. */
  private static boolean mayHideKink(Expression e) {
    if (e instanceof Binary b && b.operator() == Operator.POWER) {
      return Algebra.plain(b.right()).filter(v -> v == Math.rint(v)).isEmpty();
    }
    return e instanceof Call call
        && (call.function() == Function.SQRT || call.function() == Function.HYPOT);
  }

  /** Those at which the value itself may jump: arguments of {@code sign} and comparisons. */
  public static List<Expression> jumps(Expression e) {
    Set<Expression> switches = new LinkedHashSet<>();
    collectJumps(e, switches);
    return List.copyOf(switches);
  }

  private static void collectKinks(Expression e, Set<Expression> switches) {
    for (Expression part : Symbols.parts(e)) {
      if (part instanceof Call call) {
        List<Expression> arguments = call.arguments();
        switch (call.function()) {
          case ABS -> add(arguments.get(0), switches);
          case MIN, MAX -> {
            for (int i = 0; i < arguments.size(); i++) {
              for (int j = i + 1; j < arguments.size(); j++) {
                add(arguments.get(i).minus(arguments.get(j)), switches);
              }
            }
          }
          default -> {}
        }
      }
    }
  }

  private static void collectJumps(Expression e, Set<Expression> switches) {
    for (Expression part : Symbols.parts(e)) {
      if (part instanceof Call call && call.function() == Function.SIGN) {
        add(call.arguments().get(0), switches);
      } else if (part instanceof Comparison comparison) {
        add(comparison.left().minus(comparison.right()), switches);
      }
    }
  }

  private static void add(Expression function, Set<Expression> switches) {
    if (switches.size() >= MOST_SIMPLIFIED) {
      switches.add(function);
      return;
    }
    Expression simple = Simplifier.simplify(function);
    if (!Symbols.in(simple).isEmpty()
        && !switches.contains(Simplifier.simplify(simple.negated()))) {
      switches.add(simple);
    }
  }
}
