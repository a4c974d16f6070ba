package org.hullsum.flux;

import java.util.Objects;
import org.hullsum.numeric.Vector3;

/**
 * A place inside a region at which a field is not continuous.
 *
 * @param place a point of the surface on which it jumps
 * @param surface the text of the function that vanishes on that surface
 * @param jump length of the difference of the field on its two sides
 * @param normalJump what of it is square to the surface: this much flux per area is made or lost
 *     there without any divergence
 */
public record FieldJump(Vector3 place, String surface, double jump, double normalJump) {
  public FieldJump {
    Objects.requireNonNull(place, "place");
    Objects.requireNonNull(surface, "surface");
  }
}
