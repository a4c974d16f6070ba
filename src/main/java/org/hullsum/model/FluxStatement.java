package org.hullsum.model;

import java.util.Objects;
import org.hullsum.expression.Expression;
import org.hullsum.field.VectorField;

/** How the flux through a patch is known. Formulas may refer to the inputs of the case. */
public sealed interface FluxStatement {
  /** The alternatives, one method each. */
  interface Visitor<R> {
    R field(Field statement);

    R density(Density statement);

    R metered(Metered statement);

    R profile(Profile statement);

    R traverse(Traverse statement);

    R none();

    R unknown();
  }

  <R> R accept(Visitor<R> visitor);

  /** The flux of a field through the surface; follows the normal. */
  record Field(VectorField field) implements FluxStatement {
    public Field {
      Objects.requireNonNull(field, "field");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.field(this);
    }
  }

  /** A flux density along the normal, a formula in {@code x y z t}. */
  record Density(Expression density) implements FluxStatement {
    public Density {
      Objects.requireNonNull(density, "density");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.density(this);
    }
  }

  /**
   * A measured rate from the volume left to the volume entered, whatever the facing.
   *
   * @param rate a formula of inputs, usually the symbol of one inline figure
   * @param fixed whether it may not be adjusted by a reconciliation
   */
  record Metered(Expression rate, boolean fixed) implements FluxStatement {
    public Metered {
      Objects.requireNonNull(rate, "rate");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.metered(this);
    }
  }

  /**
   * A velocity profile over a disk, along the normal.
   *
   * @param density the flux density as a formula in {@code x y z}, computed from the profile's law,
   *     the disk's centre and radius
   * @param law a phrase for the report, such as {@code power law, n = 7}
   */
  record Profile(Expression density, String law) implements FluxStatement {
    public Profile {
      Objects.requireNonNull(density, "density");
      Objects.requireNonNull(law, "law");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.profile(this);
    }
  }

  /**
   * Point readings over a cross-section, along the normal.
   *
   * @param rate the mean of the readings by the rule, times the area: a formula of inputs
   * @param errorBound of the rule's mean, times the area, in working units; 0 where the rule's
   *     error is an input of the formula
   * @param readings what went into it
   */
  record Traverse(Expression rate, double errorBound, TraverseReadings readings)
      implements FluxStatement {
    public Traverse {
      Objects.requireNonNull(rate, "rate");
      Objects.requireNonNull(readings, "readings");
      if (!(errorBound >= 0)) {
        throw new IllegalArgumentException("error bound " + errorBound);
      }
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.traverse(this);
    }
  }

  /** Impermeable. */
  record None() implements FluxStatement {
    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.none();
    }
  }

  /** Not measured. */
  record Unknown() implements FluxStatement {
    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.unknown();
    }
  }
}
