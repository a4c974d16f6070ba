package org.hullsum.casefile;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.hullsum.units.Dimension;
import org.hullsum.units.Unit;

/**
 * What a place of a case needs of the number, quantity or formula that stands there.
 *
 * @param what what stands there, such as {@code the radius}
 * @param variables the coordinates that a formula there may use, each with its dimension if it has
 *     one
 * @param dimension what it must measure; empty for any
 * @param stated the unit that the case states for it; a bare number alone is in that unit
 */
record Need(
    String what,
    Map<String, Optional<Dimension>> variables,
    Optional<Dimension> dimension,
    Optional<Unit> stated) {
  static final Map<String, Optional<Dimension>> SPACE =
      Map.of(
          "x", Optional.of(Dimension.LENGTH),
          "y", Optional.of(Dimension.LENGTH),
          "z", Optional.of(Dimension.LENGTH));
  static final Map<String, Optional<Dimension>> TIME = Map.of("t", Optional.of(Dimension.TIME));
  static final Map<String, Optional<Dimension>> SPACE_AND_TIME = both(SPACE, TIME);

  Need {
    Objects.requireNonNull(what, "what");
    Objects.requireNonNull(dimension, "dimension");
    Objects.requireNonNull(stated, "stated");
    variables = Map.copyOf(variables);
  }

  static Map<String, Optional<Dimension>> both(
      Map<String, Optional<Dimension>> a, Map<String, Optional<Dimension>> b) {
    Map<String, Optional<Dimension>> all = new LinkedHashMap<>(a);
    all.putAll(b);
    return all;
  }

  /** A number of parameters only. */
  static Need of(String what, Dimension dimension) {
    return new Need(what, Map.of(), Optional.of(dimension), Optional.empty());
  }

  static Need length(String what) {
    return of(what, Dimension.LENGTH);
  }

  /** A plain number or an angle. */
  static Need plain(String what) {
    return of(what, Dimension.NONE);
  }

  static Need any(String what) {
    return new Need(what, Map.of(), Optional.empty(), Optional.empty());
  }

  Need in(Map<String, Optional<Dimension>> coordinates) {
    return new Need(what, coordinates, dimension, stated);
  }

  Need in(Unit unit) {
    return new Need(what, variables, Optional.of(unit.dimension()), Optional.of(unit));
  }

  Need called(String other) {
    return new Need(other, variables, dimension, stated);
  }
}
