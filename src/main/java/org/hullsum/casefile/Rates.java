package org.hullsum.casefile;

import java.util.Map;
import java.util.Optional;
import org.hullsum.model.ConservedQuantity;
import org.hullsum.units.Dimension;
import org.hullsum.units.Unit;

/**
 * What the rates of a case measure.
 *
 * @param name of the conserved quantity, for messages
 * @param dimension of a rate; empty with {@code units: none} and where {@code quantity} was refused
 * @param unit in which the case states rates; empty likewise
 */
record Rates(String name, Optional<Dimension> dimension, Optional<Unit> unit) {
  static Rates of(Optional<ConservedQuantity> quantity, boolean units) {
    return new Rates(
        quantity.map(ConservedQuantity::name).orElse("quantity"),
        quantity.filter(q -> units).map(q -> q.rateUnit().dimension()),
        quantity.filter(q -> units).map(ConservedQuantity::rateUnit));
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
    return new Need(what, Map.of(), dimension, unit);
  }
}
