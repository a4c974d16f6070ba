package org.hullsum.mesh;

/**
 * What a welding within a length has done.
 *
 * @param length within which vertices were made one
 * @param vertices that have become others
 * @param farthest that one of them has moved
 * @param triangles that have lost a corner and with it their area
 */
public record MeshWeld(double length, int vertices, double farthest, int triangles) {}
