package org.hullsum.audit;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.model.Case;
import org.hullsum.model.Input;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Place;

/** Finds the parameters and fields of a case to which nothing refers. */
final class NameUse {
  private NameUse() {}

  static List<Finding> findings(Case audited) {
    List<Finding> findings = new ArrayList<>();
    for (Input input : audited.inputs().all().values()) {
      if (!input.inline() && !audited.usedNames().contains(input.name())) {
        findings.add(unused("parameter", input.name(), Optional.of(input.place())));
      }
    }
    for (String field : audited.fields().keySet()) {
      if (!audited.usedNames().contains(field)) {
        findings.add(unused("field", field, Optional.ofNullable(audited.fieldPlaces().get(field))));
      }
    }
    return findings;
  }

  private static Finding unused(String what, String name, Optional<Place> place) {
    return Finding.of(
        FindingCode.NAME_UNUSED,
        "nothing uses the " + what + " `" + name + "`",
        name,
        place,
        Map.of("what", what));
  }
}
