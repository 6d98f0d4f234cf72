/**
 * Real-rational functions of s: given by polynomials, or fitted to a table over frequency.
 *
 * <pre>
 *   f(s) = d + s e + Σ r_k/(s − p_k),   poles real or in conjugate pairs, Re p_k &lt; 0
 * </pre>
 *
 * <p>Fits are by vector fitting (Gustavsen and Semlyen 1999, IEEE Trans. Power Delivery 14, 1052;
 * from memory): all work is real least squares, and poles that come out unstable are mirrored into
 * the left half plane.
 */
package org.annulet.solver.rational;
