package org.hullsum.field;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.hullsum.expression.Expression;
import org.hullsum.expression.VectorExpression;

/**
 * The coordinates in which a field is stated.
 *
 * @param kind Cartesian, cylindrical or spherical
 * @param definitions each native coordinate as a formula in {@code x y z}, in the order of the
 *     components: (x, y, z), (r, theta, z) or (r, polar, azimuth)
 * @param unitVectors the local unit vectors in the same order, Cartesian components as formulas in
 *     {@code x y z}
 */
public record Coordinates(
    Kind kind, Map<String, Expression> definitions, List<VectorExpression> unitVectors) {
  /** The kinds of coordinates. */
  public enum Kind {
    CARTESIAN,
    CYLINDRICAL,
    SPHERICAL
  }

  public Coordinates {
    definitions = Collections.unmodifiableMap(new LinkedHashMap<>(definitions));
    unitVectors = List.copyOf(unitVectors);
  }
}
