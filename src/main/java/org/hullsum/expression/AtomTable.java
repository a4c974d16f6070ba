package org.hullsum.expression;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Atom.Kind;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Operator;

/**
 * The atoms of one simplification, numbered in the order of their first appearance: equal parts are
 * one atom, however their sums are ordered.
 */
final class AtomTable {
  private final List<Atom> atoms = new ArrayList<>();
  private final Map<Object, Atom> known = new HashMap<>();
  private final Map<Integer, Branches> conditionals = new HashMap<>();
  private final Assembly assembly = new Assembly(this);

  /** The parts of a conditional. */
  record Branches(Polynomial condition, Polynomial then, Polynomial otherwise) {}

  /** What tells atoms apart. */
  private static List<Object> key(Object head, List<?> parts) {
    List<Object> key = new ArrayList<>(parts.size() + 1);
    key.add(head);
    key.addAll(parts);
    return key;
  }

  Atom get(int number) {
    return atoms.get(number);
  }

  Assembly assembly() {
    return assembly;
  }

  private Atom intern(
      Object key, Kind kind, Expression expression, Polynomial inner, boolean notNegative) {
    Atom atom = known.get(key);
    if (atom == null) {
      atom = new Atom(atoms.size(), kind, expression, inner, notNegative);
      atoms.add(atom);
      known.put(key, atom);
    }
    return atom;
  }

  /** A symbol, a named constant, or what is not looked into. */
  Atom whole(Expression e) {
    boolean positive = e instanceof Constant c && c.value() >= 0;
    return intern(e, Kind.PLAIN, e, Polynomial.ZERO, positive);
  }

  /** A positive number under a broken power. */
  Atom number(Coefficient value) {
    return intern(value, Kind.NUMBER, assembly.number(value), Polynomial.of(value), true);
  }

  /** The atom of a sum, if there is one already. */
  Optional<Atom> knownSum(Polynomial sum) {
    return Optional.ofNullable(known.get(sum));
  }

  Atom sum(Polynomial sum) {
    return knownSum(sum)
        .orElseGet(() -> intern(sum, Kind.SUM, assembly.expression(sum), sum, notNegative(sum)));
  }

  /** A power whose exponent is not a number. */
  Atom power(Polynomial base, Polynomial exponent) {
    return intern(
        key(Operator.POWER, List.of(base, exponent)),
        Kind.PLAIN,
        new Binary(Operator.POWER, assembly.expression(base), assembly.expression(exponent)),
        Polynomial.ZERO,
        notNegative(base));
  }

  /** A function that is no sum, product or power of its arguments. */
  Atom call(Function function, List<Polynomial> arguments) {
    List<Expression> written = arguments.stream().map(assembly::expression).toList();
    return intern(
        key(function, List.copyOf(arguments)),
        kind(function),
        new Expression.Call(function, written),
        arguments.get(0),
        notNegative(function));
  }

  /** The length of a vector in the plane, with its square. */
  Atom hypotenuse(Polynomial a, Polynomial b, Polynomial square) {
    return intern(
        key(Function.HYPOT, List.of(a, b)),
        Kind.HYPOTENUSE,
        Expression.call(Function.HYPOT, assembly.expression(a), assembly.expression(b)),
        square,
        true);
  }

  /** A comparison or a logical connective of simplified parts. */
  Atom structure(Object head, List<Object> parts, Expression written) {
    return intern(key(head, parts), Kind.PLAIN, written, Polynomial.ZERO, false);
  }

  /** A conditional whose condition is not decided. */
  Atom conditional(Branches branches) {
    Atom atom =
        structure(
            Conditional.class,
            List.of(branches.condition(), branches.then(), branches.otherwise()),
            new Conditional(
                assembly.expression(branches.condition()),
                assembly.expression(branches.then()),
                assembly.expression(branches.otherwise())));
    conditionals.put(atom.number(), branches);
    return atom;
  }

  /** The parts of an atom that is a conditional. */
  Optional<Branches> branches(int atom) {
    return Optional.ofNullable(conditionals.get(atom));
  }

  private static Kind kind(Function function) {
    return switch (function) {
      case ABS -> Kind.ABSOLUTE;
      case CBRT -> Kind.CUBE_ROOT;
      case EXP -> Kind.EXPONENTIAL;
      case SIN -> Kind.SINE;
      case COS -> Kind.COSINE;
      case SINH -> Kind.HYPERBOLIC_SINE;
      case COSH -> Kind.HYPERBOLIC_COSINE;
      default -> Kind.PLAIN;
    };
  }

  private static boolean notNegative(Function function) {
    return switch (function) {
      case ABS, EXP, COSH, ERFC, ACOS -> true;
      default -> false;
    };
  }

  /** Whether a sum surely has no negative value where it is defined. */
  boolean notNegative(Polynomial sum) {
    for (Map.Entry<Monomial, Coefficient> term : sum.terms().entrySet()) {
      if (term.getValue().isNegative()) {
        return false;
      }
      Monomial m = term.getKey();
      for (int i = 0; i < m.size(); i++) {
        if (!factorNotNegative(m.atom(i), m.exponent(i))) {
          return false;
        }
      }
    }
    return true;
  }

  /** Whether a power of an atom has no negative value. */
  boolean factorNotNegative(int atom, Coefficient exponent) {
    return !exponent.isWhole() || exponent.isEven() || get(atom).notNegative();
  }
}
