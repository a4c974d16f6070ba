package org.hullsum.flux;

import java.util.Objects;
import org.hullsum.numeric.Vector3;

/** What a search for singularities came to. */
public sealed interface SingularityOutcome {
  /** The alternatives, one method each. */
  interface Visitor<R> {
    R provedAbsent();

    R foundAt(FoundAt outcome);

    R notExcluded(NotExcluded outcome);
  }

  <R> R accept(Visitor<R> visitor);

  /** Whether there is one. */
  default boolean isFound() {
    return false;
  }

  /** Whether there is provably none. */
  default boolean isProvedAbsent() {
    return false;
  }

  /** Interval evaluation proves that nothing is undefined or unbounded. */
  record ProvedAbsent() implements SingularityOutcome {
    @Override
    public boolean isProvedAbsent() {
      return true;
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.provedAbsent();
    }
  }

  /**
   * A place at which the formula is undefined, or near which it grows without bound.
   *
   * @param place in working units
   * @param part what is at fault, such as {@code x^2 + y^2 is zero}
   */
  record FoundAt(Vector3 place, String part) implements SingularityOutcome {
    public FoundAt {
      Objects.requireNonNull(place, "place");
      Objects.requireNonNull(part, "part");
    }

    @Override
    public boolean isFound() {
      return true;
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.foundAt(this);
    }
  }

  /**
   * Neither proved absent nor found within the work limit; most often a quotient 0/0 that has a
   * limit.
   *
   * @param place near which it can't be excluded
   * @param part what is in doubt, such as {@code x is zero}
   */
  record NotExcluded(Vector3 place, String part) implements SingularityOutcome {
    public NotExcluded {
      Objects.requireNonNull(place, "place");
      Objects.requireNonNull(part, "part");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.notExcluded(this);
    }
  }
}
