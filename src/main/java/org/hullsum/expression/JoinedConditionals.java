package org.hullsum.expression;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.AtomTable.Branches;
import org.hullsum.expression.Polynomial.Term;

/**
 * Joins the terms of a sum that hang on the same condition: {@code if(c, a, b) + if(c, p, q)} is
 * {@code if(c, a + p, b + q)}.
 */
final class JoinedConditionals {
  private final AtomTable atoms;
  private final Products products;

  JoinedConditionals(AtomTable atoms, Products products) {
    this.atoms = atoms;
    this.products = products;
  }

  /** The sum with such terms joined; empty where there are no two. */
  Optional<Polynomial> joined(Polynomial p) {
    Map<Polynomial, List<Term>> byCondition = new LinkedHashMap<>();
    Polynomial.Accumulator sum = new Polynomial.Accumulator();
    p.terms()
        .forEach(
            (monomial, coefficient) -> {
              Optional<Branches> branches = conditional(monomial).flatMap(atoms::branches);
              if (branches.isPresent()) {
                byCondition
                    .computeIfAbsent(branches.get().condition(), c -> new ArrayList<>())
                    .add(new Term(coefficient, monomial));
              } else {
                sum.add(monomial, coefficient);
              }
            });
    boolean joins = false;
    for (Map.Entry<Polynomial, List<Term>> group : byCondition.entrySet()) {
      joins |= group.getValue().size() > 1;
      sum.add(
          group.getValue().size() > 1
              ? joined(group.getKey(), group.getValue())
              : Polynomial.of(group.getValue().get(0)));
    }
    return joins ? Optional.of(sum.sum()) : Optional.empty();
  }

  /** The number of the only conditional in a monomial, where it stands as a plain factor. */
  private Optional<Integer> conditional(Monomial m) {
    Optional<Integer> found = Optional.empty();
    for (int i = 0; i < m.size(); i++) {
      if (atoms.branches(m.atom(i)).isPresent()) {
        if (found.isPresent() || !m.exponent(i).isOne()) {
          return Optional.empty();
        }
        found = Optional.of(m.atom(i));
      }
    }
    return found;
  }

  private Polynomial joined(Polynomial condition, List<Term> terms) {
    Polynomial then = Polynomial.ZERO;
    Polynomial otherwise = Polynomial.ZERO;
    for (Term term : terms) {
      int number = conditional(term.monomial()).orElseThrow();
      Branches branches = atoms.branches(number).orElseThrow();
      Polynomial factor =
          Polynomial.of(new Term(term.coefficient(), term.monomial().without(number)));
      then = then.plus(products.product(factor, branches.then()));
      otherwise = otherwise.plus(products.product(factor, branches.otherwise()));
    }
    return then.equals(otherwise)
        ? then
        : Products.of(atoms.conditional(new Branches(condition, then, otherwise)));
  }
}
