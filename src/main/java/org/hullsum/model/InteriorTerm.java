package org.hullsum.model;

import java.util.Objects;
import org.hullsum.expression.Expression;
import org.hullsum.field.VectorField;
import org.hullsum.problem.Place;

/** What a volume makes or keeps. */
public sealed interface InteriorTerm {
  /** The alternatives, one method each. */
  interface Visitor<R> {
    R divergenceOf(DivergenceOf term);

    R generation(Generation term);

    R generationPerVolume(GenerationPerVolume term);

    R accumulation(Accumulation term);

    R accumulationPerVolume(AccumulationPerVolume term);
  }

  <R> R accept(Visitor<R> visitor);

  Place place();

  /** The volume integral of a field's divergence over the region that the surface encloses. */
  record DivergenceOf(VectorField field, Place place) implements InteriorTerm {
    public DivergenceOf {
      Objects.requireNonNull(field, "field");
      Objects.requireNonNull(place, "place");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.divergenceOf(this);
    }
  }

  /** A rate produced inside, a formula of inputs and {@code t}. */
  record Generation(Expression rate, Place place) implements InteriorTerm {
    public Generation {
      Objects.requireNonNull(rate, "rate");
      Objects.requireNonNull(place, "place");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.generation(this);
    }
  }

  /** A rate per volume produced inside, a formula in {@code x y z t}. */
  record GenerationPerVolume(Expression density, Place place) implements InteriorTerm {
    public GenerationPerVolume {
      Objects.requireNonNull(density, "density");
      Objects.requireNonNull(place, "place");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.generationPerVolume(this);
    }
  }

  /** A rate kept inside, subtracted. */
  record Accumulation(Expression rate, Place place) implements InteriorTerm {
    public Accumulation {
      Objects.requireNonNull(rate, "rate");
      Objects.requireNonNull(place, "place");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.accumulation(this);
    }
  }

  /** An amount per volume, a formula in {@code x y z t}, whose time derivative is kept inside. */
  record AccumulationPerVolume(Expression density, Place place) implements InteriorTerm {
    public AccumulationPerVolume {
      Objects.requireNonNull(density, "density");
      Objects.requireNonNull(place, "place");
    }

    @Override
    public <R> R accept(Visitor<R> visitor) {
      return visitor.accumulationPerVolume(this);
    }
  }
}
