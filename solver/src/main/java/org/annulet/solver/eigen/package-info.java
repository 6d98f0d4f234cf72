/**
 * Every eigenvalue of the acoustic operator in a window, and the certificate that none is missing.
 *
 * <pre>
 *   L(s) p = [ A(s) + U Φ(s) Vᵀ ] p = 0,      A(s) = K + s² M + Σ a_i(s) A_i   (sparse, symmetric)
 *   L⁻¹ = A⁻¹ − A⁻¹U (1 + Φ VᵀA⁻¹U)⁻¹ Φ VᵀA⁻¹       det L = det A · det(1 + Φ VᵀA⁻¹U)
 *   reduced:   L_r(s) = Qᵀ L(s) Q,  Q real, Qᵀ M Q = 1
 *   count:     N − P = 1/2πi ∮ d log det L(s)
 * </pre>
 *
 * <p>s = σ + iω in 1/s (growth rate σ, frequency ω/2π in Hz), p complex pressure on the mesh, K, M,
 * A_i, U, V real, N roots and P poles inside the contour with multiplicity.
 *
 * <p>The search: passive modes (shift-invert Lanczos, complete by Sylvester's inertia) and
 * responses to flames, ports and walls at frequencies between them span a real basis Q; the small
 * problem is solved whole by contour integrals on tiles (Beyn 2012, Linear Algebra Appl. 436,
 * 3839–3863, from memory) until its own root count agrees; every root is polished on the full
 * operator by block inverse iteration. The certificate counts the roots of the full operator along
 * the contour by the argument principle and compares.
 *
 * <p>Not here: what flames and walls are (they come as coefficients), error bars, derivatives with
 * respect to parameters.
 */
package org.annulet.solver.eigen;
