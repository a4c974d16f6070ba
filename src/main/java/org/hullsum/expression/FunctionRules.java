package org.hullsum.expression;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hullsum.expression.Atom.Kind;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Polynomial.Term;

/** What is known of functions of special arguments. */
final class FunctionRules {
  private static final Coefficient THREE = Coefficient.of(3);

  private final AtomTable atoms;
  private final Products products;
  private final ShortestForm shortest;

  FunctionRules(AtomTable atoms, Products products, ShortestForm shortest) {
    this.atoms = atoms;
    this.products = products;
    this.shortest = shortest;
  }

  Polynomial call(Function function, List<Polynomial> arguments) {
    Optional<Polynomial> folded = folded(function, arguments);
    if (folded.isPresent()) {
      return folded.get();
    }
    Polynomial u = arguments.get(0);
    return switch (function) {
      case SQRT -> products.power(shortest.underRoot(u), Coefficient.HALF);
      case SIN, TAN -> atQuarterTurns(function, u).orElseGet(() -> odd(function, u));
      case COS -> atQuarterTurns(function, u).orElseGet(() -> even(function, u));
      case COSH -> even(function, u);
      case ASIN, ATAN, SINH, TANH, ERF -> odd(function, u);
      case CBRT -> cubeRoot(u);
      case ABS -> absolute(u);
      case SIGN -> sign(u);
      case EXP -> inverse(u, Function.LN).orElseGet(() -> atom(function, arguments));
      case LN -> logarithm(u);
      case MIN, MAX -> extreme(function, arguments);
      case HYPOT -> hypotenuse(u, arguments.get(1));
      case ACOS, ATAN2, LOG10, ERFC -> atom(function, arguments);
    };
  }

  private Polynomial atom(Function function, List<Polynomial> arguments) {
    return Products.of(atoms.call(function, arguments));
  }

  /** The value where all arguments are plain numbers and it is a whole number. */
  private Optional<Polynomial> folded(Function function, List<Polynomial> arguments) {
    List<Expression> numbers = new ArrayList<>();
    for (Polynomial argument : arguments) {
      Optional<Coefficient> number = argument.constant();
      if (number.isEmpty()) {
        return Optional.empty();
      }
      numbers.add(Expression.number(number.get().value()));
    }
    return Algebra.plain(Algebra.call(function, numbers))
        .map(value -> Polynomial.of(Coefficient.of(value)));
  }

  private Polynomial odd(Function function, Polynomial u) {
    return u.allNegative()
        ? atom(function, List.of(u.negated())).negated()
        : atom(function, List.of(u));
  }

  private Polynomial even(Function function, Polynomial u) {
    return atom(function, List.of(u.allNegative() ? u.negated() : u));
  }

  /** Sine, cosine and tangent of whole multiples of π/2. */
  private Optional<Polynomial> atQuarterTurns(Function function, Polynomial u) {
    if (u.size() != 1 || u.single().monomial().size() != 1) {
      return Optional.empty();
    }
    Monomial m = u.single().monomial();
    Coefficient quarters = u.single().coefficient().times(Coefficient.of(2));
    if (!m.exponent(0).isOne() || !isNamed(m.atom(0), "pi") || !quarters.isWhole()) {
      return Optional.empty();
    }
    int quarter = (int) Math.floorMod(quarters.numerator(), 4L);
    int[] sines = {0, 1, 0, -1};
    int sine = sines[quarter];
    int cosine = sines[(quarter + 1) % 4];
    return switch (function) {
      case SIN -> Optional.of(Polynomial.of(Coefficient.of(sine)));
      case COS -> Optional.of(Polynomial.of(Coefficient.of(cosine)));
      default -> cosine == 0 ? Optional.empty() : Optional.of(Polynomial.ZERO);
    };
  }

  private boolean isNamed(int atom, String name) {
    return atoms.get(atom).expression() instanceof Constant c && c.text().equals(Optional.of(name));
  }

  private Polynomial cubeRoot(Polynomial u) {
    if (u.size() == 1) {
      Monomial m = u.single().monomial();
      Coefficient exponent = m.size() == 1 ? m.exponent(0) : Coefficient.ONE;
      if (u.single().coefficient().isOne() && exponent.isWhole() && exponent.numerator() % 3 == 0) {
        return products.power(Products.of(atoms.get(m.atom(0))), exponent.times(THREE.inverse()));
      }
    }
    return odd(Function.CBRT, u);
  }

  /** Factors that are not negative, and the number, are taken out. */
  private Polynomial absolute(Polynomial u) {
    if (atoms.notNegative(u)) {
      return u;
    }
    Term term = products.asTerm(u);
    Monomial outside = Monomial.ONE;
    Monomial inside = Monomial.ONE;
    for (int i = 0; i < term.monomial().size(); i++) {
      Monomial factor = Monomial.of(term.monomial().atom(i), term.monomial().exponent(i));
      if (atoms.factorNotNegative(term.monomial().atom(i), term.monomial().exponent(i))) {
        outside = outside.times(factor);
      } else {
        inside = inside.times(factor);
      }
    }
    Polynomial taken = Polynomial.of(new Term(term.coefficient().absolute(), outside));
    if (inside.isOne()) {
      return taken;
    }
    if (inside.size() == 1) {
      Polynomial base = baseOf(inside.atom(0));
      Polynomial magnitude = atom(Function.ABS, List.of(base));
      return products.product(taken, products.power(magnitude, inside.exponent(0)));
    }
    return products.product(
        taken, atom(Function.ABS, List.of(Polynomial.of(new Term(Coefficient.ONE, inside)))));
  }

  /** An atom as a polynomial: of a sum, the sum. */
  private Polynomial baseOf(int number) {
    Atom atom = atoms.get(number);
    return atom.kind() == Kind.SUM ? atom.inner() : Products.of(atom);
  }

  private Polynomial sign(Polynomial u) {
    Coefficient content = u.content();
    Polynomial primitive = u.times(new Term(content.inverse(), Monomial.ONE));
    return odd(Function.SIGN, primitive);
  }

  /** exp(ln u), ln(exp u): u. */
  private Optional<Polynomial> inverse(Polynomial u, Function function) {
    if (u.size() == 1
        && u.single().coefficient().isOne()
        && u.single().monomial().size() == 1
        && u.single().monomial().exponent(0).isOne()) {
      Atom atom = atoms.get(u.single().monomial().atom(0));
      if (atom.expression() instanceof Expression.Call call && call.function() == function) {
        return Optional.of(atom.inner());
      }
    }
    return Optional.empty();
  }

  private Polynomial logarithm(Polynomial u) {
    if (u.size() == 1
        && u.single().coefficient().isOne()
        && u.single().monomial().size() == 1
        && isNamed(u.single().monomial().atom(0), "e")) {
      return Polynomial.of(u.single().monomial().exponent(0));
    }
    return inverse(u, Function.EXP).orElseGet(() -> atom(Function.LN, List.of(u)));
  }

  /** Equal arguments once, and of plain numbers the one that counts. */
  private Polynomial extreme(Function function, List<Polynomial> arguments) {
    List<Polynomial> kept = new ArrayList<>();
    Optional<Coefficient> number = Optional.empty();
    for (Polynomial argument : arguments) {
      Optional<Coefficient> constant = argument.constant();
      if (constant.isPresent()) {
        boolean counts =
            number.isEmpty()
                || constant.get().value() > number.get().value() == (function == Function.MAX);
        number = counts ? constant : number;
      } else if (!kept.contains(argument)) {
        kept.add(argument);
      }
    }
    number.map(Polynomial::of).ifPresent(kept::add);
    return kept.size() == 1 ? kept.get(0) : atom(function, kept);
  }

  private Polynomial hypotenuse(Polynomial a, Polynomial b) {
    if (a.isZero() || b.isZero()) {
      return absolute(a.isZero() ? b : a);
    }
    Polynomial square = products.product(a, a).plus(products.product(b, b));
    return Products.of(atoms.hypotenuse(a, b, square));
  }
}
