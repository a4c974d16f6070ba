package org.hullsum.audit;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.numeric.Vector3;

/**
 * The interior of one volume, integrated.
 *
 * @param volume its name
 * @param terms by the instant, in the order of the case
 * @param divergence of the fields that give every flux, by the instant; empty where no fields do,
 *     or no region is enclosed
 * @param fields whose divergence that is
 * @param faults what went wrong with integrals, each once
 */
record InteriorAudit(
    String volume,
    List<List<InteriorRate>> terms,
    List<InteriorRate> divergence,
    List<String> fields,
    List<Fault> faults) {
  /**
   * An integral that failed or is less accurate than asked.
   *
   * @param formula what was integrated
   * @param nonFiniteAt where it is not finite
   * @param reached the error bound relative to ∭|g|, where it is finite
   */
  record Fault(String formula, Optional<Vector3> nonFiniteAt, double reached) {}

  InteriorAudit {
    Objects.requireNonNull(volume, "volume");
    terms = List.copyOf(terms);
    divergence = List.copyOf(divergence);
    fields = List.copyOf(fields);
    faults = List.copyOf(faults);
  }
}
