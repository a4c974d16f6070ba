package org.hullsum.audit;

import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import org.hullsum.model.Tolerances;

/**
 * Of what a balance is drawn.
 *
 * @param name of the volume or envelope
 * @param label a name for people
 * @param envelope whether it is an envelope
 * @param members the volumes inside; the volume itself where it is one
 * @param check identity or conservation
 * @param tolerances stated, the absolute one in the rate unit
 * @param unproved why a volume of it is not known to be closed
 * @param unbounded why there is nothing to balance
 */
record BalanceSubject(
    String name,
    Optional<String> label,
    boolean envelope,
    Set<String> members,
    BalanceResult.Check check,
    Tolerances tolerances,
    Optional<String> unproved,
    Optional<String> unbounded) {
  BalanceSubject {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(label, "label");
    Objects.requireNonNull(check, "check");
    Objects.requireNonNull(tolerances, "tolerances");
    Objects.requireNonNull(unproved, "unproved");
    Objects.requireNonNull(unbounded, "unbounded");
    members = Set.copyOf(members);
  }

  /** +1 where the patch leaves, −1 where it enters, 0 where it is inside or elsewhere. */
  int signOf(PatchRate rate) {
    boolean leaves = members.contains(rate.leaves());
    boolean enters = members.contains(rate.enters());
    if (leaves == enters) {
      return 0;
    }
    return leaves ? 1 : -1;
  }
}
