package org.hullsum.audit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.flux.FieldJump;
import org.hullsum.flux.SingularityOutcome;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.Finding;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Place;

/**
 * What was found of one patch or one volume by looking for singularities and jumps.
 *
 * @param name of the patch or volume
 * @param place of it in the case
 * @param outcomes by what was looked at, such as "field `flow`"
 * @param jump of a field inside, by the same
 */
record SingularityAudit(
    String name,
    Place place,
    Map<String, SingularityOutcome> outcomes,
    Map<String, FieldJump> jump) {
  SingularityAudit {
    outcomes = Map.copyOf(new LinkedHashMap<>(outcomes));
    jump = Map.copyOf(new LinkedHashMap<>(jump));
  }

  /** Why what was looked at can't be integrated: where one of it is singular. */
  Optional<String> singular(Scales scales) {
    return findings(scales).stream()
        .filter(f -> f.code() == FindingCode.FIELD_SINGULAR)
        .findFirst()
        .map(Finding::message);
  }

  /** {@code field-singular}, {@code singularity-not-excluded}, {@code field-discontinuous}. */
  List<Finding> findings(Scales scales) {
    List<Finding> findings = new ArrayList<>();
    outcomes.keySet().stream()
        .sorted()
        .forEach(
            what -> outcomes.get(what).accept(new Teller(what, scales)).ifPresent(findings::add));
    jump.keySet().stream()
        .sorted()
        .forEach(what -> findings.add(discontinuous(what, jump.get(what), scales)));
    return findings;
  }

  private Finding discontinuous(String what, FieldJump found, Scales scales) {
    Map<String, Object> evidence = new LinkedHashMap<>();
    evidence.put("at", CaseFindings.coordinates(scales.point(found.place())));
    evidence.put("surface", found.surface());
    return Finding.of(
        FindingCode.FIELD_DISCONTINUOUS,
        what
            + " jumps at "
            + scales.place(found.place())
            + " inside `"
            + name
            + "`, where "
            + found.surface()
            + " = 0: what it makes or loses there is not in its divergence",
        name,
        Optional.of(place),
        evidence);
  }

  /** Puts an outcome in words. */
  private final class Teller implements SingularityOutcome.Visitor<Optional<Finding>> {
    private final String what;
    private final Scales scales;

    Teller(String what, Scales scales) {
      this.what = what;
      this.scales = scales;
    }

    @Override
    public Optional<Finding> provedAbsent() {
      return Optional.empty();
    }

    @Override
    public Optional<Finding> foundAt(SingularityOutcome.FoundAt outcome) {
      return Optional.of(
          finding(
              FindingCode.FIELD_SINGULAR,
              what
                  + " is undefined or without bound at "
                  + scales.place(outcome.place())
                  + " in `"
                  + name
                  + "`, where "
                  + outcome.part(),
              outcome.place(),
              outcome.part()));
    }

    @Override
    public Optional<Finding> notExcluded(SingularityOutcome.NotExcluded outcome) {
      return Optional.of(
          finding(
              FindingCode.SINGULARITY_NOT_EXCLUDED,
              "that "
                  + what
                  + " is singular near "
                  + scales.place(outcome.place())
                  + " in `"
                  + name
                  + "` could not be excluded: there "
                  + outcome.part(),
              outcome.place(),
              outcome.part()));
    }

    private Finding finding(FindingCode code, String message, Vector3 at, String part) {
      Map<String, Object> evidence = new LinkedHashMap<>();
      evidence.put("at", CaseFindings.coordinates(scales.point(at)));
      evidence.put("part", part);
      return Finding.of(code, message, name, Optional.of(place), evidence);
    }
  }
}
