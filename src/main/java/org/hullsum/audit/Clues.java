package org.hullsum.audit;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * What geometry and computation have shown, by which explanations are allowed or vetoed.
 *
 * @param inward patches whose normal as declared points the wrong way
 * @param surfaced patches that have a surface
 * @param overlaps groups of patches that lie on one another
 * @param open volumes whose surface was proved open
 * @param surfaceless volumes with a patch without surface, of whose closedness nothing can be said
 * @param gaps by volume or envelope
 * @param fields the names of the fields that give every flux, by volume or envelope
 * @param causes what may be wrong with the figures of a patch, by its name
 */
record Clues(
    Set<String> inward,
    Set<String> surfaced,
    List<Overlap> overlaps,
    Set<String> open,
    Set<String> surfaceless,
    Map<String, Gap> gaps,
    Map<String, List<String>> fields,
    Map<String, List<PatchCause>> causes) {
  /** Nothing known. */
  static final Clues NONE =
      new Clues(Set.of(), Set.of(), List.of(), Set.of(), Set.of(), Map.of(), Map.of(), Map.of());

  /**
   * Two patches of one volume that cover the same piece of surface.
   *
   * @param first stands earlier in the case
   * @param second stands later
   */
  record Overlap(String first, String second) {
    boolean has(String patch) {
      return first.equals(patch) || second.equals(patch);
    }
  }

  /**
   * The gaps in a surface.
   *
   * @param described their areas and places, with units
   * @param area of all, in SI
   * @param between the patches on their rims
   * @param flux outward through plane patches over them
   * @param residualThen the residual of the balance with that flux; empty where it can't be said
   * @param slack numerical error of the flux
   */
  record Gap(
      String described,
      double area,
      List<String> between,
      Optional<Double> flux,
      Optional<Double> residualThen,
      double slack) {
    Gap {
      between = List.copyOf(between);
    }
  }

  /** Whether a flow may be left out: where no closed surface shows that none is. */
  boolean mayLack(BalanceSubject subject) {
    return subject.members().stream().anyMatch(m -> open.contains(m) || surfaceless.contains(m));
  }

  Clues {
    inward = Set.copyOf(inward);
    surfaced = Set.copyOf(surfaced);
    overlaps = List.copyOf(overlaps);
    open = Set.copyOf(open);
    surfaceless = Set.copyOf(surfaceless);
    gaps = Map.copyOf(gaps);
    fields = Map.copyOf(fields);
    causes = Map.copyOf(causes);
  }
}
