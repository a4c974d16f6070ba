package org.hullsum.expression;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.hullsum.expression.Atom.Kind;
import org.hullsum.expression.Polynomial.Term;

/**
 * Chooses among equal normal forms the shortest to write: as collected, with sin² + cos² = 1 or
 * cosh² − sinh² = 1 applied, with common factors taken out; of equally long ones the first in that
 * order, which is nearest to what was written. A form that is multiplied out must be much shorter
 * to be chosen, since it loses more digits where its terms cancel, and is wider over intervals.
 */
final class ShortestForm {
  /** Of all expansions of one simplification; beyond it forms stay as they were collected. */
  private static final long MOST_WORK = 30_000;

  /** A multiplied out form is taken where it is at most this long relative to the collected one. */
  private static final double WORTH_EXPANDING = 0.6;

  /** Factors that are taken out one after another. */
  private static final int MOST_FACTORS = 6;

  private final AtomTable atoms;
  private final Products products;
  private final Effort effort = new Effort(MOST_WORK);

  ShortestForm(AtomTable atoms, Products products) {
    this.atoms = atoms;
    this.products = products;
  }

  Polynomial of(Polynomial p) {
    if (p.size() < 2 && !hasSum(p)) {
      return p;
    }
    Polynomial collected = shortest(variants(p), p);
    if (!hasSum(p)) {
      return collected;
    }
    List<Polynomial> expanded = new ArrayList<>();
    for (Expansion.Grouping grouping : Expansion.Grouping.values()) {
      if (!effort.spent()) {
        Expansion expansion = new Expansion(atoms, products);
        expansion.expanded(p, grouping).ifPresent(form -> expanded.addAll(variants(form)));
        effort.spend(expansion.work());
      }
    }
    Polynomial best = shortest(expanded, collected);
    return length(best) <= WORTH_EXPANDING * length(collected) ? best : collected;
  }

  private long length(Polynomial p) {
    return atoms.assembly().length(p);
  }

  /** The form itself, with identities applied, and each of these with common factors taken out. */
  private List<Polynomial> variants(Polynomial p) {
    List<Polynomial> forms = new ArrayList<>();
    forms.add(p);
    new JoinedConditionals(atoms, products).joined(p).ifPresent(forms::add);
    addReplaced(p, Kind.SINE, Kind.COSINE, forms);
    addReplaced(p, Kind.COSINE, Kind.SINE, forms);
    addReplaced(p, Kind.HYPERBOLIC_COSINE, Kind.HYPERBOLIC_SINE, forms);
    for (Polynomial form : List.copyOf(forms)) {
      if (form.size() > 1) {
        forms.add(factored(form));
      }
    }
    return forms;
  }

  private Polynomial shortest(List<Polynomial> forms, Polynomial first) {
    Polynomial best = first;
    for (Polynomial form : forms) {
      best = length(form) < length(best) ? form : best;
    }
    return best;
  }

  /**
   * The form to take a broken power of: in factors where it has any, since u·(1 − u) keeps its sign
   * and its digits near its zeros, over intervals too, where u − u² does not.
   */
  Polynomial underRoot(Polynomial p) {
    Polynomial shortest = of(p);
    if (shortest.size() < 2 || effort.spent()) {
      return shortest;
    }
    Polynomial factored = factored(shortest);
    return factored.single().monomial().size() > 1 ? factored : shortest;
  }

  private boolean hasSum(Polynomial p) {
    for (Monomial m : p.terms().keySet()) {
      for (int i = 0; i < m.size(); i++) {
        if (atoms.get(m.atom(i)).kind() == Kind.SUM) {
          return true;
        }
      }
    }
    return false;
  }

  /** With each square of one function written by the square of its partner. */
  private void addReplaced(Polynomial p, Kind kind, Kind partner, List<Polynomial> forms) {
    Polynomial.Accumulator sum = new Polynomial.Accumulator();
    boolean replaced = false;
    for (Map.Entry<Monomial, Coefficient> entry : p.terms().entrySet()) {
      Polynomial term = Polynomial.of(new Term(entry.getValue(), entry.getKey()));
      Monomial m = entry.getKey();
      for (int i = 0; i < m.size(); i++) {
        Atom atom = atoms.get(m.atom(i));
        if (atom.kind() == kind && m.exponent(i).isWhole() && m.exponent(i).numerator() >= 2) {
          replaced = true;
          term = replaced(term, atom, partner);
        }
      }
      sum.add(term);
    }
    if (replaced) {
      forms.add(sum.sum());
    }
  }

  /** One square of the atom in a polynomial: 1 − partner², or 1 + partner² for cosh. */
  private Polynomial replaced(Polynomial p, Atom atom, Kind partner) {
    Function function =
        switch (partner) {
          case SINE -> Function.SIN;
          case COSINE -> Function.COS;
          default -> Function.SINH;
        };
    Atom other = atoms.call(function, List.of(atom.inner()));
    Coefficient sign = atom.kind() == Kind.HYPERBOLIC_COSINE ? Coefficient.ONE : Coefficient.of(-1);
    Polynomial lower =
        p.times(new Term(Coefficient.ONE, Monomial.of(atom.number(), Coefficient.of(-2))));
    return lower.plus(lower.times(new Term(sign, Monomial.of(other.number(), Coefficient.of(2)))));
  }

  /** With what all terms have in common taken out. */
  private Polynomial factored(Polynomial p) {
    Monomial common = null;
    for (Monomial m : p.terms().keySet()) {
      common = common == null ? m : shared(common, m);
    }
    Polynomial rest = p.times(new Term(Coefficient.ONE, common.inverse()));
    return Polynomial.of(products.times(inFactors(rest), new Term(Coefficient.ONE, common)));
  }

  /** A sum as a product of sums where grouping by the powers of one atom shows it as one. */
  private Term inFactors(Polynomial p) {
    Term product = Term.ONE;
    Polynomial rest = p;
    for (int k = 0; k < MOST_FACTORS; k++) {
      Polynomial dividend = rest;
      Optional<Polynomial> factor = factor(dividend);
      Optional<Polynomial> quotient =
          factor.flatMap(f -> new Expansion(atoms, products).divided(dividend, f));
      if (quotient.isEmpty()) {
        break;
      }
      product = products.times(product, products.asTerm(factor.get()));
      rest = quotient.get();
    }
    return products.times(product, products.asTerm(rest));
  }

  /** A sum that divides the sums by which the powers of some atom are multiplied. */
  private Optional<Polynomial> factor(Polynomial p) {
    Set<Integer> numbers = new TreeSet<>();
    for (Monomial m : p.terms().keySet()) {
      for (int i = 0; i < m.size(); i++) {
        numbers.add(m.atom(i));
      }
    }
    for (int number : numbers) {
      List<Polynomial> parts = partsByPower(p, number);
      Polynomial least = parts.get(0);
      for (Polynomial part : parts) {
        least = part.size() < least.size() ? part : least;
      }
      if (parts.size() > 1 && least.size() > 1 && dividesAll(least, parts)) {
        return Optional.of(least);
      }
    }
    return Optional.empty();
  }

  private static List<Polynomial> partsByPower(Polynomial p, int atom) {
    Map<Coefficient, Polynomial.Accumulator> parts = new LinkedHashMap<>();
    p.terms()
        .forEach(
            (monomial, coefficient) ->
                parts
                    .computeIfAbsent(
                        monomial.exponentOf(atom), power -> new Polynomial.Accumulator())
                    .add(monomial.without(atom), coefficient));
    return parts.values().stream().map(Polynomial.Accumulator::sum).toList();
  }

  private boolean dividesAll(Polynomial divisor, List<Polynomial> parts) {
    for (Polynomial part : parts) {
      if (new Expansion(atoms, products).divided(part, divisor).isEmpty()) {
        return false;
      }
    }
    return true;
  }

  /** Of powers of one sign in both the one nearer to zero above the line, the farther below. */
  private static Monomial shared(Monomial a, Monomial b) {
    Monomial shared = Monomial.ONE;
    for (int i = 0; i < a.size(); i++) {
      Coefficient one = a.exponent(i);
      Coefficient other = b.exponentOf(a.atom(i));
      if (!other.isZero() && one.isNegative() == other.isNegative()) {
        shared = shared.times(Monomial.of(a.atom(i), one.value() < other.value() ? one : other));
      }
    }
    return shared;
  }
}
