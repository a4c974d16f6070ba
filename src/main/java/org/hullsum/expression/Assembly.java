package org.hullsum.expression;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.expression.Expression.Operator;
import org.hullsum.expression.Expression.Symbol;
import org.hullsum.expression.Polynomial.Term;

/** Writes normal forms as expressions again, the way a person would. */
final class Assembly {
  /** Denominators up to this are written as fractions where there is a divisor anyway. */
  private static final long SMALL_DENOMINATOR = 100;

  /** Decimals are written where the denominator divides this. */
  private static final long DECIMALS = 1_000_000;

  /** In the order in which a person writes them in a product. */
  private static final List<String> COORDINATES =
      List.of("r", "s", "u", "v", "x", "y", "z", "theta", "polar", "azimuth", "t");

  private final AtomTable atoms;
  private final Map<Integer, Long> lengths = new HashMap<>();

  Assembly(AtomTable atoms) {
    this.atoms = atoms;
  }

  /** The sum; it begins with its first positive term where there is one. */
  Expression expression(Polynomial p) {
    if (p.isZero()) {
      return Algebra.ZERO;
    }
    List<Term> terms = new ArrayList<>();
    int firstPositive = -1;
    for (Map.Entry<Monomial, Coefficient> entry : p.terms().entrySet()) {
      if (firstPositive < 0 && !entry.getValue().isNegative()) {
        firstPositive = terms.size();
      }
      terms.add(new Term(entry.getValue(), entry.getKey()));
    }
    if (firstPositive > 0) {
      terms.add(0, terms.remove(firstPositive));
    }
    Expression sum = signed(terms.get(0));
    for (Term term : terms.subList(1, terms.size())) {
      Expression written = magnitude(term);
      sum = term.coefficient().isNegative() ? sum.minus(written) : sum.plus(written);
    }
    return sum;
  }

  private Expression signed(Term term) {
    Expression written = magnitude(term);
    if (!term.coefficient().isNegative()) {
      return written;
    }
    return leadingNumber(written)
        .map(number -> withLeadingNumber(written, -number))
        .orElseGet(() -> written.negated());
  }

  /** The plain number with which a product begins. */
  private static Optional<Double> leadingNumber(Expression e) {
    if (e instanceof Binary b
        && (b.operator() == Operator.MULTIPLY || b.operator() == Operator.DIVIDE)) {
      return leadingNumber(b.left());
    }
    return Algebra.plain(e);
  }

  private static Expression withLeadingNumber(Expression e, double number) {
    return e instanceof Binary b
        ? new Binary(b.operator(), withLeadingNumber(b.left(), number), b.right())
        : Expression.number(number);
  }

  /** A term without its sign. */
  private Expression magnitude(Term term) {
    List<Expression> above = new ArrayList<>();
    List<Expression> below = new ArrayList<>();
    Monomial m = term.monomial();
    List<Integer> factors = new ArrayList<>();
    for (int i = 0; i < m.size(); i++) {
      factors.add(i);
    }
    factors.sort(Comparator.comparingInt(i -> rank(atoms.get(m.atom(i)))));
    for (int i : factors) {
      Coefficient exponent = m.exponent(i);
      (exponent.isNegative() ? below : above).add(power(atoms.get(m.atom(i)), exponent.absolute()));
    }
    Coefficient c = term.coefficient().absolute();
    if (asFraction(c, !below.isEmpty())) {
      if (c.numerator() != 1) {
        above.add(0, Expression.number((double) c.numerator()));
      }
      below.add(0, Expression.number((double) c.denominator()));
    } else if (!c.isOne()) {
      above.add(0, Expression.number(c.value()));
    }
    Expression numerator = product(above);
    return below.isEmpty() ? numerator : numerator.over(product(below));
  }

  /** Constants stand first, then parameters, coordinates, and what is longer than a name. */
  private static int rank(Atom atom) {
    if (atom.expression() instanceof Symbol symbol) {
      return 1 + Math.max(0, 1 + COORDINATES.indexOf(symbol.name()));
    }
    return atom.expression() instanceof Constant ? 0 : COORDINATES.size() + 2;
  }

  private static boolean asFraction(Coefficient c, boolean divided) {
    if (!c.isExact() || c.isWhole()) {
      return false;
    }
    return divided && c.denominator() <= SMALL_DENOMINATOR || DECIMALS % c.denominator() != 0;
  }

  private static Expression product(List<Expression> factors) {
    return factors.stream().reduce(Expression::times).orElse(Algebra.ONE);
  }

  private static Expression power(Atom atom, Coefficient exponent) {
    Expression base = atom.expression();
    if (exponent.isOne()) {
      return base;
    }
    if (exponent.equals(Coefficient.HALF)) {
      return Expression.call(Function.SQRT, base);
    }
    return new Binary(Operator.POWER, base, numeral(exponent));
  }

  private static Expression numeral(Coefficient c) {
    return asFraction(c, false)
        ? Expression.number((double) c.numerator())
            .over(Expression.number((double) c.denominator()))
        : Expression.number(c.value());
  }

  /** A number by itself. */
  Expression number(Coefficient c) {
    return c.isNegative() ? expression(Polynomial.of(c)) : numeral(c);
  }

  /** How long a normal form is when it is written: its operations and operands. */
  long length(Polynomial p) {
    long length = 0;
    for (Map.Entry<Monomial, Coefficient> entry : p.terms().entrySet()) {
      Coefficient c = entry.getValue();
      Monomial m = entry.getKey();
      long term = c.absolute().isOne() && !m.isOne() ? 0 : asFraction(c, false) ? 3 : 2;
      for (int i = 0; i < m.size(); i++) {
        Coefficient exponent = m.exponent(i).absolute();
        term += length(atoms.get(m.atom(i))) + 1;
        term += exponent.isOne() ? 0 : 2;
      }
      length += term;
    }
    return length;
  }

  private long length(Atom atom) {
    Long known = lengths.get(atom.number());
    if (known == null) {
      known =
          atom.kind() == Atom.Kind.SUM
              ? length(atom.inner()) + 1
              : Symbols.parts(atom.expression()).size();
      lengths.put(atom.number(), known);
    }
    return known;
  }
}
