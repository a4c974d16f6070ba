package org.hullsum.closure;

import org.hullsum.numeric.Vector3;

/**
 * A point of a surface.
 *
 * @param position r
 * @param normal the construction normal, of length one
 */
public record SamplePoint(Vector3 position, Vector3 normal) {}
