/**
 * Triangle meshes: what they are made of, how files of them are read, and what their connections
 * say of holes, shells and orientation.
 *
 * <p>A mesh knows nothing of patches and volumes; its triangles' normals follow the right-hand rule
 * along their corners. Coordinates are in the unit of length that the mesh was scaled to when it
 * was read.
 */
package org.hullsum.mesh;
