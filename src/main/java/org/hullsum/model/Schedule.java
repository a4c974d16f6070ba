package org.hullsum.model;

import java.util.List;

/**
 * The instants at which a case is audited.
 *
 * @param instants in working units, ascending; empty for a case without time
 * @param span whether the instants are the equally spaced points of an interval over which the
 *     balances are drawn as well
 */
public record Schedule(List<Double> instants, boolean span) {
  public static final Schedule TIMELESS = new Schedule(List.of(), false);

  public Schedule {
    instants = List.copyOf(instants);
    if (span && instants.size() < 2) {
      throw new IllegalArgumentException("an interval has two instants or more");
    }
  }
}
