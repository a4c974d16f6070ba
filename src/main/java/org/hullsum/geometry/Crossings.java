package org.hullsum.geometry;

import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * All points at which a line passes through a surface, in the order of the line.
 *
 * @param crossings each once; those on trimmed-away parts left out
 * @param doubt why the list may not be right, if it may not: then another line is to be taken
 */
public record Crossings(List<Crossing> crossings, Optional<Doubt> doubt) {
  /** What makes a list of crossings doubtful. */
  public enum Doubt {
    /** The line comes within tolerance of a side of a chart: a rim, a pole, a glued side. */
    NEAR_SIDE("passes too near a rim, a pole or a seam inside the surface"),
    /** It comes within tolerance of a curve along which the surface is trimmed. */
    NEAR_TRIM("passes too near a curve along which the surface is trimmed"),
    /** It runs nearly within the surface. */
    NEARLY_TANGENT("is nearly tangent to the surface"),
    /** The bound on the number of cells was reached before all was proved. */
    WORK_LIMIT("could not be followed within the limit of subdivision");

    private final String words;

    Doubt(String words) {
      this.words = words;
    }

    /** What to say of the line. */
    public String words() {
      return words;
    }
  }

  public Crossings {
    crossings = List.copyOf(crossings);
    Objects.requireNonNull(doubt, "doubt");
  }

  /** Whether the list is proved complete and every crossing clear of edges. */
  public boolean reliable() {
    return doubt.isEmpty();
  }
}
