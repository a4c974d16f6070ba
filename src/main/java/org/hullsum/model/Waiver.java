package org.hullsum.model;

import java.time.LocalDate;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.problem.FindingCode;
import org.hullsum.problem.Place;

/**
 * A finding that is accepted, with the reason; it then does not count for the exit code.
 *
 * @param code the finding's code
 * @param where the name that the finding is on
 * @param because the reason
 * @param by who answers for it
 * @param until the last day on which it holds
 * @param place where it is stated
 */
public record Waiver(
    FindingCode code,
    String where,
    String because,
    String by,
    Optional<LocalDate> until,
    Place place) {
  public Waiver {
    Objects.requireNonNull(code, "code");
    Objects.requireNonNull(where, "where");
    Objects.requireNonNull(because, "because");
    Objects.requireNonNull(by, "by");
    Objects.requireNonNull(until, "until");
    Objects.requireNonNull(place, "place");
  }
}
