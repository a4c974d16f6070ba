package org.hullsum.casefile;

import java.util.Map;
import java.util.Optional;
import org.hullsum.model.ConservedQuantity;
import org.hullsum.units.Dimension;

/**
 * What the rates of a case measure.
 *
 * @param name of the conserved quantity, for messages
 * @param dimension of a rate; empty with {@code units: none} and where {@code quantity} was refused
 */
record Rates(String name, Optional<Dimension> dimension) {
  static Rates of(Optional<ConservedQuantity> quantity, boolean units) {
    return new Rates(
        quantity.map(ConservedQuantity::name).orElse("quantity"),
        quantity.filter(q -> units).map(q -> q.rateUnit().dimension()));
  }

  /** Per area: what a flux density measures. */
  Optional<Dimension> perArea() {
    return dimension.map(d -> d.dividedBy(Dimension.LENGTH.power(2)));
  }

  /** Per volume: what a source density measures. */
  Optional<Dimension> perVolume() {
    return dimension.map(d -> d.dividedBy(Dimension.LENGTH.power(3)));
  }

  /** The conserved quantity itself, per volume. */
  Optional<Dimension> contentPerVolume() {
    return perVolume().map(d -> d.times(Dimension.TIME));
  }

  Need need(String what) {
    return new Need(what, Map.of(), dimension, Optional.empty());
  }
}
