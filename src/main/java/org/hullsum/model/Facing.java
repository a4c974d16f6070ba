package org.hullsum.model;

import java.util.Objects;
import org.hullsum.numeric.Vector3;

/** Which way a patch's normal is declared to point. */
public sealed interface Facing {
  /** The alternatives, one method each. */
  interface Visitor<R> {
    R asDrawn();

    R reversed();

    R along(Along facing);

    R awayFrom(AwayFrom facing);

    R outward();
  }

  <R> R accept(Visitor<R> visitor);

  /** As the case file has it, for reports, such as {@code reversed}. */
  String text();

  /** The construction normal. */
  record AsDrawn() implements Facing {
    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.asDrawn();
    }

    @Override
    public String text() {
      return "as-drawn";
    }
  }

  /** Against the construction normal. */
  record Reversed() implements Facing {
    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.reversed();
    }

    @Override
    public String text() {
      return "reversed";
    }
  }

  /** Out of the volume that the patch leaves, or into the one that it enters, as found. */
  record Outward() implements Facing {
    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.outward();
    }

    @Override
    public String text() {
      return "outward";
    }
  }

  /** The side on which the vector area has a positive component along a direction. */
  record Along(Vector3 direction, String text) implements Facing {
    public Along {
      Objects.requireNonNull(direction, "direction");
      Objects.requireNonNull(text, "text");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.along(this);
    }
  }

  /** The side on which ∬ (r − point)·n dS is positive. */
  record AwayFrom(Vector3 point, String text) implements Facing {
    public AwayFrom {
      Objects.requireNonNull(point, "point");
      Objects.requireNonNull(text, "text");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.awayFrom(this);
    }
  }
}
