package org.hullsum.expression;

import java.util.List;
import java.util.Optional;
import org.hullsum.expression.Polynomial.Term;

/**
 * Products and powers of normal forms, a sum being kept whole as the base of powers.
 *
 * <p>Powers are joined only where the value stays the same wherever it was finite: (xᵃ)ᵇ is xᵃᵇ for
 * whole b and for odd a, |x|ᵃᵇ for even a; a broken power of a product is split only where the
 * factors are not negative.
 */
final class Products {
  private static final int MOST_PASSES = 32;

  private final AtomTable atoms;
  private final Effort effort;

  Products(AtomTable atoms, Effort effort) {
    this.atoms = atoms;
    this.effort = effort;
  }

  static Polynomial of(Atom atom) {
    return Polynomial.of(new Term(Coefficient.ONE, Monomial.of(atom.number(), Coefficient.ONE)));
  }

  Polynomial product(Polynomial p, Polynomial q) {
    effort.spend(p.size() + q.size());
    if (p.isZero() || q.isZero()) {
      return Polynomial.ZERO;
    }
    if (p.isOne()) {
      return q;
    }
    return q.isOne() ? p : flat(times(asTerm(p), asTerm(q)));
  }

  /**
   * A power with a number as its exponent.
   *
   * @param p not zero where the exponent is negative
   */
  Polynomial power(Polynomial p, Coefficient exponent) {
    if (exponent.isZero()) {
      return Polynomial.ONE;
    }
    if (p.isZero() || exponent.isOne()) {
      return p;
    }
    if (p.size() > 1 && !exponent.isWhole()) {
      return flat(normal(brokenPowerOfSum(p, exponent)));
    }
    return flat(power(asTerm(p), exponent));
  }

  /** A sum as one term: a number times a sum that no number divides. */
  Term asTerm(Polynomial p) {
    if (p.size() == 1) {
      return p.single();
    }
    Coefficient content = p.content();
    Coefficient signed = p.allNegative() ? content.negated() : content;
    Polynomial primitive = p.times(new Term(signed.inverse(), Monomial.ONE));
    Optional<Atom> opposite = atoms.knownSum(primitive.negated());
    if (opposite.isPresent()) {
      return new Term(signed.negated(), Monomial.of(opposite.get().number(), Coefficient.ONE));
    }
    return new Term(signed, Monomial.of(atoms.sum(primitive).number(), Coefficient.ONE));
  }

  /** A term that is nothing but a sum, as that sum. */
  private Polynomial flat(Term term) {
    Monomial m = term.monomial();
    if (m.size() == 1
        && m.exponent(0).isOne()
        && atoms.get(m.atom(0)).kind() == Atom.Kind.SUM
        && term.coefficient().absolute().isOne()) {
      Polynomial inner = atoms.get(m.atom(0)).inner();
      return term.coefficient().isOne() ? inner : inner.negated();
    }
    return Polynomial.of(term);
  }

  Term times(Term a, Term b) {
    Coefficient coefficient = a.coefficient().times(b.coefficient());
    checkRange(coefficient);
    return normal(new Term(coefficient, a.monomial().times(b.monomial())));
  }

  /** A number that overflows, or vanishes by rounding, must stay in its factors. */
  private void checkRange(Coefficient coefficient) {
    if (coefficient.isZero() || !Double.isFinite(coefficient.value()) || coefficient.value() == 0) {
      effort.giveUp();
    }
  }

  Term power(Term t, Coefficient exponent) {
    if (exponent.isWhole()) {
      Coefficient coefficient = t.coefficient().power(exponent.numerator());
      checkRange(coefficient);
      return normal(new Term(coefficient, t.monomial().power(exponent)));
    }
    return normal(brokenPower(t, exponent));
  }

  private Term brokenPower(Term t, Coefficient exponent) {
    Monomial split = Monomial.ONE;
    Monomial rest = Monomial.ONE;
    Monomial m = t.monomial();
    for (int i = 0; i < m.size(); i++) {
      Coefficient own = m.exponent(i);
      if (!atoms.factorNotNegative(m.atom(i), own)) {
        rest = rest.times(Monomial.of(m.atom(i), own));
      } else if (own.isEven() && !atoms.get(m.atom(i)).notNegative()) {
        Atom absolute = atoms.call(Function.ABS, List.of(of(atoms.get(m.atom(i)))));
        split = split.times(Monomial.of(absolute.number(), own.times(exponent)));
      } else {
        split = split.times(Monomial.of(m.atom(i), own.times(exponent)));
      }
    }
    if (t.coefficient().isNegative() || rest.size() > 1) {
      Coefficient scale = t.coefficient().absolute();
      Term number = numberPower(scale, exponent);
      Coefficient sign = t.coefficient().isNegative() ? Coefficient.of(-1) : Coefficient.ONE;
      Atom base = atoms.sum(Polynomial.of(new Term(sign, rest)));
      return new Term(
          number.coefficient(),
          number.monomial().times(split).times(Monomial.of(base.number(), exponent)));
    }
    Term number = numberPower(t.coefficient(), exponent);
    return new Term(
        number.coefficient(), number.monomial().times(split).times(rest.power(exponent)));
  }

  /** A broken power of a positive number: exact where its root is, else kept as it is. */
  private Term numberPower(Coefficient c, Coefficient exponent) {
    if (c.isOne()) {
      return Term.ONE;
    }
    Optional<Coefficient> root = exponent.denominator() == 2 ? c.exactRoot() : Optional.empty();
    if (root.isPresent()) {
      Coefficient power = root.get().power(exponent.numerator());
      checkRange(power);
      return new Term(power, Monomial.ONE);
    }
    return new Term(Coefficient.ONE, Monomial.of(atoms.number(c).number(), exponent));
  }

  private Term brokenPowerOfSum(Polynomial p, Coefficient exponent) {
    Coefficient content = p.content();
    Term number = numberPower(content, exponent);
    if (number.monomial().isOne()) {
      Polynomial primitive = p.times(new Term(content.inverse(), Monomial.ONE));
      return new Term(number.coefficient(), Monomial.of(atoms.sum(primitive).number(), exponent));
    }
    return new Term(Coefficient.ONE, Monomial.of(atoms.sum(p).number(), exponent));
  }

  /** Carries out what powers of special atoms stand for, such as |x|² = x². */
  private Term normal(Term term) {
    Term current = term;
    for (int pass = 0; pass < MOST_PASSES; pass++) {
      Optional<Term> next = step(current);
      if (next.isEmpty()) {
        return current;
      }
      current = next.get();
    }
    return current;
  }

  private Optional<Term> step(Term term) {
    Monomial m = term.monomial();
    int exponentials = 0;
    boolean powered = false;
    for (int i = 0; i < m.size(); i++) {
      Atom atom = atoms.get(m.atom(i));
      if (atom.kind() == Atom.Kind.EXPONENTIAL) {
        exponentials++;
        powered |= !m.exponent(i).isOne();
        continue;
      }
      int period = period(atom, m.exponent(i));
      long whole = m.exponent(i).wholePart();
      long taken = period == 0 ? 0 : whole - whole % period;
      if (taken != 0) {
        Coefficient inner = Coefficient.of(taken / period);
        Term reduced =
            new Term(
                term.coefficient(), m.times(Monomial.of(atom.number(), Coefficient.of(-taken))));
        return Optional.of(joined(reduced, power(asTerm(stands(atom)), inner)));
      }
    }
    return exponentials > 1 || powered ? Optional.of(joinedExponentials(term)) : Optional.empty();
  }

  private Term joined(Term a, Term b) {
    Coefficient coefficient = a.coefficient().times(b.coefficient());
    checkRange(coefficient);
    return new Term(coefficient, a.monomial().times(b.monomial()));
  }

  /** The whole power of an atom that is {@link #stands} for; 0 for none. */
  private static int period(Atom atom, Coefficient exponent) {
    return switch (atom.kind()) {
      case SUM -> atom.inner().size() == 1 && exponent.isWhole() ? 1 : 0;
      case NUMBER -> 1;
      case ABSOLUTE, HYPOTENUSE -> 2;
      case CUBE_ROOT -> 3;
      default -> 0;
    };
  }

  private Polynomial stands(Atom atom) {
    return atom.kind() == Atom.Kind.ABSOLUTE
        ? power(atom.inner(), Coefficient.of(2))
        : atom.inner();
  }

  /** eᵃ · eᵇ = e^(a + b). */
  private Term joinedExponentials(Term term) {
    Polynomial argument = Polynomial.ZERO;
    Monomial rest = term.monomial();
    for (int i = 0; i < term.monomial().size(); i++) {
      Atom atom = atoms.get(term.monomial().atom(i));
      if (atom.kind() == Atom.Kind.EXPONENTIAL) {
        argument =
            argument.plus(atom.inner().times(new Term(term.monomial().exponent(i), Monomial.ONE)));
        rest = rest.without(atom.number());
      }
    }
    if (argument.isZero()) {
      return new Term(term.coefficient(), rest);
    }
    Atom joined = atoms.call(Function.EXP, List.of(argument));
    return new Term(term.coefficient(), rest.times(Monomial.of(joined.number(), Coefficient.ONE)));
  }
}
