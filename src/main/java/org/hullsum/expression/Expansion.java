package org.hullsum.expression;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.hullsum.expression.Polynomial.Term;

/**
 * Multiplies normal forms out: terms over powers of the same sums are brought over a common
 * denominator, their numerators expanded, and divided by the sums again where that goes without a
 * rest. So the divergence of r/r³ becomes zero.
 *
 * <p>The work is bounded; empty is returned where the bound is met.
 */
final class Expansion {
  private static final long MOST_WORK = 6_000;
  private static final int MOST_TERMS = 150;
  private static final int MOST_PASSES = 4;
  private static final long HIGHEST_POWER = 12;

  private final AtomTable atoms;
  private final Products products;
  private final Effort effort = new Effort(MOST_WORK);

  /** Which terms are brought over one denominator. */
  enum Grouping {
    /** Those over the same sums. */
    SAME_DIVISORS,
    /** All whose broken powers agree. */
    ALL
  }

  Expansion(AtomTable atoms, Products products) {
    this.atoms = atoms;
    this.products = products;
  }

  /** The expanded form; empty where it takes too much work. */
  Optional<Polynomial> expanded(Polynomial p, Grouping grouping) {
    Polynomial current = p;
    for (int pass = 0; pass < MOST_PASSES; pass++) {
      Polynomial next = once(current, grouping);
      if (effort.spent()) {
        return Optional.empty();
      }
      if (next.equals(current)) {
        break;
      }
      current = next;
    }
    return Optional.of(current);
  }

  private boolean isSum(int atom) {
    return atoms.get(atom).kind() == Atom.Kind.SUM;
  }

  private Polynomial once(Polynomial p, Grouping grouping) {
    Map<List<Object>, List<Term>> groups = new LinkedHashMap<>();
    distributed(p)
        .terms()
        .forEach(
            (monomial, coefficient) ->
                groups
                    .computeIfAbsent(signature(monomial, grouping), key -> new ArrayList<>())
                    .add(new Term(coefficient, monomial)));
    Polynomial.Accumulator sum = new Polynomial.Accumulator();
    for (List<Term> group : groups.values()) {
      sum.add(group(group));
      if (effort.spent()) {
        break;
      }
    }
    return sum.sum();
  }

  /** With all positive whole powers of sums multiplied out, also those that come out of others. */
  private Polynomial distributed(Polynomial p) {
    Polynomial current = p;
    for (int pass = 0; pass < MOST_PASSES && !effort.spent(); pass++) {
      Polynomial.Accumulator sum = new Polynomial.Accumulator();
      boolean changed = false;
      for (Map.Entry<Monomial, Coefficient> entry : current.terms().entrySet()) {
        Monomial m = entry.getKey();
        Monomial rest = m;
        List<Integer> factors = new ArrayList<>();
        for (int i = 0; i < m.size(); i++) {
          if (isSum(m.atom(i)) && m.exponent(i).isWhole() && !m.exponent(i).isNegative()) {
            factors.add(i);
            rest = rest.without(m.atom(i));
          }
        }
        Polynomial expanded = Polynomial.of(new Term(entry.getValue(), rest));
        for (int i : factors) {
          expanded = multiplied(expanded, m.atom(i), m.exponent(i));
          changed = true;
        }
        sum.add(expanded);
      }
      current = sum.sum();
      if (!changed) {
        break;
      }
    }
    return current;
  }

  private List<Object> signature(Monomial m, Grouping grouping) {
    List<Object> signature = new ArrayList<>();
    for (int i = 0; i < m.size(); i++) {
      Coefficient exponent = m.exponent(i);
      if (isSum(m.atom(i))) {
        Coefficient fraction = fraction(exponent);
        if (!fraction.isZero() || grouping == Grouping.SAME_DIVISORS && exponent.isNegative()) {
          signature.add(m.atom(i));
          signature.add(fraction);
        }
      }
    }
    return signature;
  }

  /** The part of an exponent in [0, 1). */
  private static Coefficient fraction(Coefficient exponent) {
    if (!exponent.isExact()) {
      return exponent;
    }
    long below = Math.floorDiv(exponent.numerator(), exponent.denominator());
    return exponent.minus(Coefficient.of(below));
  }

  private Polynomial group(List<Term> terms) {
    Map<Integer, Coefficient> common = commonPowers(terms);
    Polynomial.Accumulator numerator = new Polynomial.Accumulator();
    for (Term term : terms) {
      Monomial m = term.monomial();
      Polynomial expanded = Polynomial.of(new Term(term.coefficient(), withoutSums(m)));
      for (Map.Entry<Integer, Coefficient> base : common.entrySet()) {
        Coefficient power = m.exponentOf(base.getKey()).minus(base.getValue());
        expanded = multiplied(expanded, base.getKey(), power);
      }
      numerator.add(expanded);
      if (effort.spent()) {
        return Polynomial.ZERO;
      }
    }
    return over(distributed(numerator.sum()), common);
  }

  /** The power of each sum that all terms are brought over. */
  private Map<Integer, Coefficient> commonPowers(List<Term> terms) {
    Set<Integer> sums = new TreeSet<>();
    for (Term term : terms) {
      for (int i = 0; i < term.monomial().size(); i++) {
        if (isSum(term.monomial().atom(i))) {
          sums.add(term.monomial().atom(i));
        }
      }
    }
    Map<Integer, Coefficient> common = new HashMap<>();
    for (int sum : sums) {
      Coefficient least = terms.get(0).monomial().exponentOf(sum);
      for (Term term : terms) {
        Coefficient exponent = term.monomial().exponentOf(sum);
        least = exponent.value() < least.value() ? exponent : least;
      }
      common.put(sum, least.isWhole() && !least.isNegative() ? Coefficient.ZERO : least);
    }
    return common;
  }

  private Monomial withoutSums(Monomial m) {
    Monomial rest = m;
    for (int i = 0; i < m.size(); i++) {
      if (isSum(m.atom(i))) {
        rest = rest.without(m.atom(i));
      }
    }
    return rest;
  }

  /** Times a whole power, at least 0, of a sum, multiplied out. */
  private Polynomial multiplied(Polynomial p, int sum, Coefficient power) {
    if (!power.isWhole() || power.numerator() > HIGHEST_POWER) {
      effort.giveUp();
      return p;
    }
    Polynomial result = p;
    for (long k = 0; k < power.numerator() && !effort.spent(); k++) {
      result = multiplied(result, atoms.get(sum).inner());
    }
    return result;
  }

  private Polynomial multiplied(Polynomial p, Polynomial q) {
    Polynomial.Accumulator sum = new Polynomial.Accumulator();
    for (Map.Entry<Monomial, Coefficient> a : p.terms().entrySet()) {
      Term left = new Term(a.getValue(), a.getKey());
      for (Map.Entry<Monomial, Coefficient> b : q.terms().entrySet()) {
        if (!effort.spend(1)) {
          return Polynomial.ZERO;
        }
        Term term = products.times(left, new Term(b.getValue(), b.getKey()));
        sum.add(term.monomial(), term.coefficient());
      }
    }
    if (sum.size() > MOST_TERMS) {
      effort.giveUp();
    }
    return sum.sum();
  }

  /** The numerator times the common powers, divided by the sums where that leaves no rest. */
  private Polynomial over(Polynomial numerator, Map<Integer, Coefficient> common) {
    Polynomial reduced = numerator;
    Monomial powers = Monomial.ONE;
    for (Map.Entry<Integer, Coefficient> base : common.entrySet()) {
      Coefficient exponent = base.getValue();
      while (!exponent.isZero() && reduced.size() > 1 && !effort.spent()) {
        Optional<Polynomial> quotient =
            divided(reduced, distributed(atoms.get(base.getKey()).inner()));
        if (quotient.isEmpty()) {
          break;
        }
        reduced = quotient.get();
        exponent = exponent.plus(Coefficient.ONE);
      }
      powers = powers.times(Monomial.of(base.getKey(), exponent));
    }
    if (powers.isOne() || reduced.isZero()) {
      return reduced;
    }
    return Polynomial.of(
        products.times(products.asTerm(reduced), new Term(Coefficient.ONE, powers)));
  }

  /** How much work was done. */
  long work() {
    return effort.taken();
  }

  /** The quotient of two sums where no rest is left. */
  Optional<Polynomial> divided(Polynomial p, Polynomial divisor) {
    Term leading = divisor.leading();
    Polynomial rest = p;
    Polynomial.Accumulator quotient = new Polynomial.Accumulator();
    int steps = p.size();
    for (int step = 0; step < steps && !rest.isZero(); step++) {
      if (!effort.spend(rest.size() + (long) divisor.size())) {
        return Optional.empty();
      }
      Term top = rest.leading();
      Term factor =
          new Term(
              top.coefficient().times(leading.coefficient().inverse()),
              top.monomial().times(leading.monomial().inverse()));
      quotient.add(factor.monomial(), factor.coefficient());
      rest = rest.minus(divisor.times(factor));
    }
    return rest.isZero() ? Optional.of(quotient.sum()) : Optional.empty();
  }
}
