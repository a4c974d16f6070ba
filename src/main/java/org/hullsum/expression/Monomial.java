package org.hullsum.expression;

import java.util.Arrays;

/**
 * A product of powers of atoms, each atom by its number; atoms are in increasing order, no exponent
 * is zero. Immutable.
 */
final class Monomial {
  static final Monomial ONE = new Monomial(new int[0], new Coefficient[0]);

  private final int[] atoms;
  private final Coefficient[] exponents;
  private final int hash;

  private Monomial(int[] atoms, Coefficient[] exponents) {
    this.atoms = atoms;
    this.exponents = exponents;
    this.hash = 31 * Arrays.hashCode(atoms) + Arrays.hashCode(exponents);
  }

  static Monomial of(int atom, Coefficient exponent) {
    return exponent.isZero() ? ONE : new Monomial(new int[] {atom}, new Coefficient[] {exponent});
  }

  int size() {
    return atoms.length;
  }

  int atom(int i) {
    return atoms[i];
  }

  Coefficient exponent(int i) {
    return exponents[i];
  }

  /** The exponent of an atom by its number, zero where it does not occur. */
  Coefficient exponentOf(int atom) {
    int i = Arrays.binarySearch(atoms, atom);
    return i < 0 ? Coefficient.ZERO : exponents[i];
  }

  boolean isOne() {
    return atoms.length == 0;
  }

  Monomial times(Monomial other) {
    if (isOne()) {
      return other;
    }
    if (other.isOne()) {
      return this;
    }
    int[] merged = new int[atoms.length + other.atoms.length];
    Coefficient[] sums = new Coefficient[merged.length];
    int count = 0;
    int i = 0;
    int j = 0;
    while (i < atoms.length || j < other.atoms.length) {
      boolean mine = j == other.atoms.length || i < atoms.length && atoms[i] <= other.atoms[j];
      boolean theirs = i == atoms.length || j < other.atoms.length && other.atoms[j] <= atoms[i];
      merged[count] = mine ? atoms[i] : other.atoms[j];
      sums[count] =
          mine && theirs
              ? exponents[i].plus(other.exponents[j])
              : mine ? exponents[i] : other.exponents[j];
      count += sums[count].isZero() ? 0 : 1;
      i += mine ? 1 : 0;
      j += theirs ? 1 : 0;
    }
    return new Monomial(Arrays.copyOf(merged, count), Arrays.copyOf(sums, count));
  }

  Monomial inverse() {
    Coefficient[] negated = new Coefficient[exponents.length];
    for (int i = 0; i < negated.length; i++) {
      negated[i] = exponents[i].negated();
    }
    return new Monomial(atoms, negated);
  }

  /** All exponents times a factor. */
  Monomial power(Coefficient factor) {
    Monomial result = ONE;
    for (int i = 0; i < atoms.length; i++) {
      result = result.times(of(atoms[i], exponents[i].times(factor)));
    }
    return result;
  }

  /** Without one atom. */
  Monomial without(int atom) {
    return times(of(atom, exponentOf(atom).negated()));
  }

  /**
   * The order by the exponent of the first atom in which two monomials differ; products keep it,
   * also with negative and broken exponents.
   */
  int compareTo(Monomial other) {
    int i = 0;
    int j = 0;
    while (i < atoms.length || j < other.atoms.length) {
      int mine = i < atoms.length ? atoms[i] : Integer.MAX_VALUE;
      int theirs = j < other.atoms.length ? other.atoms[j] : Integer.MAX_VALUE;
      Coefficient a = mine <= theirs ? exponents[i] : Coefficient.ZERO;
      Coefficient b = theirs <= mine ? other.exponents[j] : Coefficient.ZERO;
      int order = Double.compare(a.value(), b.value());
      if (order != 0) {
        return order;
      }
      i += mine <= theirs ? 1 : 0;
      j += theirs <= mine ? 1 : 0;
    }
    return 0;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Monomial that
        && hash == that.hash
        && Arrays.equals(atoms, that.atoms)
        && Arrays.equals(exponents, that.exponents);
  }

  @Override
  public int hashCode() {
    return hash;
  }
}
