package org.hullsum.flux;

import java.util.Locale;

/** How a flux is known. */
public enum FluxBasis {
  FIELD(true),
  FLUX_DENSITY(true),
  PROFILE(true),
  TRAVERSE(true),
  METERED(false),
  NONE(false),
  UNKNOWN(false);

  private final boolean followsNormal;

  FluxBasis(boolean followsNormal) {
    this.followsNormal = followsNormal;
  }

  /** Whether turning the patch's facing turns the flux. */
  public boolean followsNormal() {
    return followsNormal;
  }

  /** The word of the result document. */
  public String word() {
    return name().toLowerCase(Locale.ROOT).replace('_', '-');
  }
}
