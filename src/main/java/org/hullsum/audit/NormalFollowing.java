package org.hullsum.audit;

import org.hullsum.model.FluxStatement;

/** Tells the fluxes that follow the patch normal from those that follow leaves → enters. */
final class NormalFollowing implements FluxStatement.Visitor<Boolean> {
  private static final NormalFollowing INSTANCE = new NormalFollowing();

  private NormalFollowing() {}

  static boolean of(FluxStatement statement) {
    return statement.accept(INSTANCE);
  }

  @Override
  public Boolean field(FluxStatement.Field statement) {
    return true;
  }

  @Override
  public Boolean density(FluxStatement.Density statement) {
    return true;
  }

  @Override
  public Boolean profile(FluxStatement.Profile statement) {
    return true;
  }

  @Override
  public Boolean traverse(FluxStatement.Traverse statement) {
    return true;
  }

  @Override
  public Boolean metered(FluxStatement.Metered statement) {
    return false;
  }

  @Override
  public Boolean none() {
    return false;
  }

  @Override
  public Boolean unknown() {
    return false;
  }
}
