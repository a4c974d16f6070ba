package org.hullsum.problem;

import java.util.Objects;

/**
 * Something wrong with an input file itself.
 *
 * @param kind what is wrong, with a stable code
 * @param place where
 * @param message what was found, what was expected and what to do, in one or two lines
 */
public record Problem(ProblemKind kind, Place place, String message) {
  public Problem {
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(place, "place");
    Objects.requireNonNull(message, "message");
  }

  /** {@code FILE:LINE:COLUMN: message}. */
  @Override
  public String toString() {
    return place + ": " + message;
  }
}
