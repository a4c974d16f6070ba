/**
 * Surfaces: how each kind of the case format is made of charts of the unit square, how it is moved
 * and trimmed, where its boundary runs and where a line crosses it.
 *
 * <p>Every surface is a list of {@link org.hullsum.geometry.Chart}s whose positions are formulas in
 * u and v, so that tangents are symbolic derivatives, enclosures are interval evaluations, and the
 * sensitivity to a parameter is a derivative like any other. The construction normal is r_u × r_v;
 * which way a patch faces is not known here. Lengths are in working units.
 *
 * <ul>
 *   <li>{@link org.hullsum.geometry.Shape}: a record per kind, checked and turned into a surface;
 *       what is none is a {@link org.hullsum.geometry.SurfaceFault} with the key at fault.
 *   <li>{@link org.hullsum.geometry.Placement} and {@link org.hullsum.geometry.Trim}: moved, then
 *       cut by {@link org.hullsum.geometry.Body} solids.
 *   <li>{@link org.hullsum.geometry.ChartEvaluator}, {@link org.hullsum.geometry.Bounds}: positions
 *       and tangents over arrays of points, boxes proved to contain them.
 *   <li>{@link org.hullsum.geometry.LineCrossings}: where a line passes through, with proof or with
 *       a doubt; {@link org.hullsum.geometry.SurfaceSamples}: points to start lines from.
 *   <li>{@link org.hullsum.geometry.BoundaryCurves}: rims and the curves of trims as polylines;
 *       {@link org.hullsum.geometry.SurfaceTriangles}: triangles close to a surface.
 * </ul>
 *
 * <p>A side of a chart's square is a rim, or glued to another side, or drawn to a point (a pole, an
 * apex, a corner of a triangle); only rims are boundary, unless a trim leaves but one of two glued
 * sides. Triangles, collapsing ranges and disks all reach the unit square this way.
 *
 * <p>Imports {@code expression} and {@code numeric}. Start reading at {@link
 * org.hullsum.geometry.Surface}.
 */
package org.hullsum.geometry;
