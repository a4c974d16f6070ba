package org.hullsum.geometry;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.expression.Expression;

/**
 * An oriented surface made of charts, perhaps trimmed.
 *
 * @param kind the word of the case format, such as {@code cylinder}
 * @param charts the pieces, all with construction normals to the same side
 * @param trim a condition in {@code x y z}: the surface is where it holds; empty for all of it
 */
public record Surface(String kind, List<Chart> charts, Optional<Expression> trim) {
  public Surface {
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(trim, "trim");
    charts = List.copyOf(charts);
    if (charts.isEmpty()) {
      throw new IllegalArgumentException("a surface has at least one chart");
    }
  }
}
