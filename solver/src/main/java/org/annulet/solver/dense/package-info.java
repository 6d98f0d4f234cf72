/**
 * Dense complex linear algebra for the small matrices of the search: LU with the determinant,
 * orthonormal bases, singular values, eigenvalues of a general matrix.
 *
 * <pre>
 *   P A = L U        log det A = Σ log u_kk
 *   A = U Σ Wᴴ       one-sided Jacobi
 *   A = Z T Zᴴ       Hessenberg, then single-shift QR
 * </pre>
 *
 * <p>Real and imaginary parts live in separate arrays, column by column, so that the inner loops
 * run over bare indices. Sources: Golub and Van Loan, Matrix Computations (LU, Householder,
 * Hessenberg QR); Demmel and Veselić 1992 (accuracy of one-sided Jacobi), both from memory. No Java
 * library at hand computes eigenvalues of a general complex matrix. Sizes up to a few hundred;
 * nothing here is blocked.
 */
package org.annulet.solver.dense;
