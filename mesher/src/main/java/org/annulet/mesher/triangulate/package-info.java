/**
 * From an outline to triangles: constrained Delaunay triangulation and Delaunay refinement.
 *
 * <p>A triangulation is Delaunay where no node lies inside the circle round a triangle,
 *
 * <pre>
 *            | ax−dx  ay−dy  (ax−dx)²+(ay−dy)² |
 * incircle = | bx−dx  by−dy  (bx−dx)²+(by−dy)² |  ≤ 0   for every triangle abc and node d
 *            | cx−dx  cy−dy  (cx−dx)²+(cy−dy)² |
 * </pre>
 *
 * and constrained Delaunay where only nodes visible past the edges' segments count (Chew 1989).
 * Refinement (Ruppert, J. Algorithms 18, 1995; Chew, SoCG 1993) inserts a node while a triangle has
 * an angle below 28° or a side above the local size h; a node that would lie in the circle over a
 * segment splits that segment instead, on its true curve. The node sits on the bisector of the
 * triangle's shortest side ℓ, at the smallest of the distances to the circumcentre, to the
 * off-centre ℓ/2 · cot 14° (Üngör, LATIN 2004) and to the apex of a triangle of sides L = 0.85 h,
 * √(L² − ℓ²/4), so that triangles of the wanted size grow from the boundary inward (advancing-front
 * points, Rebay, J. Comput. Phys. 106, 1993).
 *
 * <p>At a corner below 60° segments are split at equal distances 2ᵏ from the corner (Ruppert's
 * concentric shells), and a thin triangle between two such nodes is left as it is, so refinement
 * ends whatever the corner (Shewchuk, SoCG 2000).
 *
 * <p>The size field: h(p) = min(cap of the zone, min over sources (h_i + g |p − p_i|)), handed from
 * node to node; sources are edges with a size of their own and re-entrant corners.
 *
 * <p>Lengths in metres, angles in degrees where named so. One thread; same input, same result.
 */
package org.annulet.mesher.triangulate;
