package org.hullsum.geometry;

import java.util.Map;

/**
 * What a case states of an untrimmed surface, one record per kind of the case format.
 *
 * <p>Lengths, points and angles are formulas of the parameters and stay formulas in the charts, so
 * that the sensitivity to a parameter is a derivative; directions are values. The values of the
 * parameters serve the checks only.
 */
public interface Shape {
  /**
   * The surface, with its construction normal as the case format has it.
   *
   * @param parameters the value of every parameter, in working units
   * @throws SurfaceFault where the figures describe no such surface
   */
  Surface surface(Map<String, Double> parameters) throws SurfaceFault;
}
