package org.hullsum.expression;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * A sum of monomials with coefficients that are not zero, in the order of their first appearance;
 * equality does not depend on that order. Exponents may be negative or broken. Immutable.
 */
final class Polynomial {
  static final Polynomial ZERO = new Polynomial(new LinkedHashMap<>());
  static final Polynomial ONE = of(Coefficient.ONE);

  private final Map<Monomial, Coefficient> terms;
  private final int hash;

  private Polynomial(Map<Monomial, Coefficient> terms) {
    this.terms = terms;
    this.hash = terms.hashCode();
  }

  /** One coefficient times one monomial. */
  record Term(Coefficient coefficient, Monomial monomial) {
    static final Term ONE = new Term(Coefficient.ONE, Monomial.ONE);
  }

  static Polynomial of(Coefficient constant) {
    return of(new Term(constant, Monomial.ONE));
  }

  static Polynomial of(Term term) {
    Map<Monomial, Coefficient> terms = new LinkedHashMap<>();
    if (!term.coefficient().isZero()) {
      terms.put(term.monomial(), term.coefficient());
    }
    return new Polynomial(terms);
  }

  /** Sums up terms. */
  static final class Accumulator {
    private final LinkedHashMap<Monomial, Coefficient> terms = new LinkedHashMap<>();

    void add(Monomial monomial, Coefficient coefficient) {
      Coefficient sum = terms.getOrDefault(monomial, Coefficient.ZERO).plus(coefficient);
      if (sum.isZero()) {
        terms.remove(monomial);
      } else {
        terms.put(monomial, sum);
      }
    }

    void add(Polynomial polynomial) {
      polynomial.terms.forEach(this::add);
    }

    int size() {
      return terms.size();
    }

    Polynomial sum() {
      return new Polynomial(new LinkedHashMap<>(terms));
    }
  }

  Map<Monomial, Coefficient> terms() {
    return terms;
  }

  int size() {
    return terms.size();
  }

  boolean isZero() {
    return terms.isEmpty();
  }

  boolean isOne() {
    return equals(ONE);
  }

  /** The number that it is, where it has no atom. */
  Optional<Coefficient> constant() {
    if (isZero()) {
      return Optional.of(Coefficient.ZERO);
    }
    return size() == 1 ? Optional.ofNullable(terms.get(Monomial.ONE)) : Optional.empty();
  }

  /** The only term of a polynomial of one. */
  Term single() {
    Map.Entry<Monomial, Coefficient> entry = terms.entrySet().iterator().next();
    return new Term(entry.getValue(), entry.getKey());
  }

  /** The term whose monomial is the greatest. */
  Term leading() {
    Term leading = null;
    for (Map.Entry<Monomial, Coefficient> entry : terms.entrySet()) {
      if (leading == null || entry.getKey().compareTo(leading.monomial()) > 0) {
        leading = new Term(entry.getValue(), entry.getKey());
      }
    }
    return leading;
  }

  Polynomial plus(Polynomial other) {
    Accumulator sum = new Accumulator();
    sum.add(this);
    sum.add(other);
    return sum.sum();
  }

  Polynomial minus(Polynomial other) {
    return plus(other.negated());
  }

  Polynomial negated() {
    return times(new Term(Coefficient.of(-1), Monomial.ONE));
  }

  Polynomial times(Term factor) {
    Accumulator sum = new Accumulator();
    terms.forEach(
        (monomial, coefficient) ->
            sum.add(monomial.times(factor.monomial()), coefficient.times(factor.coefficient())));
    return sum.sum();
  }

  /** Whether every coefficient is negative. */
  boolean allNegative() {
    return !isZero() && terms.values().stream().allMatch(Coefficient::isNegative);
  }

  /** The positive number that divides all coefficients: 1 where one of them is rounded. */
  Coefficient content() {
    long numerator = 0;
    long denominator = 1;
    for (Coefficient c : terms.values()) {
      if (!c.isExact()) {
        return Coefficient.ONE;
      }
      numerator = Coefficient.divisor(numerator, c.numerator());
      long common = Coefficient.divisor(denominator, c.denominator());
      if (denominator / common > Integer.MAX_VALUE || c.denominator() > Integer.MAX_VALUE) {
        return Coefficient.ONE;
      }
      denominator = denominator / common * c.denominator();
    }
    return Coefficient.of(numerator).times(Coefficient.of(denominator).inverse());
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Polynomial that && hash == that.hash && terms.equals(that.terms);
  }

  @Override
  public int hashCode() {
    return hash;
  }
}
