package org.hullsum.casefile;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.model.Case;
import org.hullsum.problem.Problem;

/**
 * What came of reading a case file.
 *
 * @param found the case, with its warnings in it; empty where a problem is fatal
 * @param problems all problems in the order of the file, empty where the case was found
 */
public record ReadOutcome(Optional<Case> found, List<Problem> problems) {
  public ReadOutcome {
    Objects.requireNonNull(found, "found");
    problems = List.copyOf(problems);
    if (found.isPresent() == !problems.isEmpty()) {
      throw new IllegalArgumentException("either a case or its problems");
    }
  }
}
