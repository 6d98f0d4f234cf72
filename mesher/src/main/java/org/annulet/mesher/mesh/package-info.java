/**
 * The mesh: nodes, triangles, named zones and named edges. All that the solver may see of the
 * mesher.
 *
 * <p>{@link org.annulet.mesher.mesh.MeshCheck} states the laws every mesh obeys, {@link
 * org.annulet.mesher.mesh.Quality} how good it is. {@link
 * org.annulet.mesher.mesh.UniformRefinement} and {@link org.annulet.mesher.mesh.Bisection} refine
 * it: both keep zone and edge names, and put new nodes of curved edges where {@link
 * org.annulet.mesher.mesh.EdgeCurves} says. {@link org.annulet.mesher.mesh.RingReplication} lays a
 * half burner cell round a ring with the ring's symmetry kept to the last bit; a ring is refined by
 * refining its half cell.
 *
 * <p>Laws in use, n out of the gas: ∮ x n_x ds = ∫ dA (divergence theorem); Σ angles about an inner
 * node = 2π; boundary loops of a connected part = 2 − (nodes − sides + triangles) (Euler); angles
 * facing an unnamed side α + β ≤ π (Delaunay). Lengths in m, areas in m².
 */
package org.annulet.mesher.mesh;
