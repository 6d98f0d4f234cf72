/**
 * Sparse symmetric factorisation, real and complex: A = L D Lᵀ without pivoting on a pattern
 * analysed once.
 *
 * <p>The matrices of this program, K + s² M + walls, are symmetric (not Hermitian) for every s.
 * Without pivoting L can grow where a leading block is close to singular; one step of iterative
 * refinement is therefore always taken and the residual returned.
 */
package org.annulet.solver.sparse;
