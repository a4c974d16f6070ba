package org.hullsum.flux;

import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.Accuracy;
import org.hullsum.quadrature.Integral;
import org.hullsum.quadrature.ParameterPoint;

/** The cones from one piece of the boundary to a common apex. */
interface Cone {
  /** From now on integrates cones to that apex. */
  void aim(Vector3 apex, RayIntegrals rays, int densities);

  /** Integrates all rows of {@link RayIntegrals}; the accuracy is that of the first density. */
  Integral[] integrate(Accuracy accuracy);

  /** Integrates |g| of the first density alone. */
  Integral integrateMagnitude(Accuracy accuracy);

  /** End points and signed heights of n² rays to an apex: rows x, y, z, height. */
  double[][] lattice(Vector3 apex, int n);

  /** The point of space that {@link Integral#nonFiniteAt} means. */
  Vector3 position(ParameterPoint point);
}
