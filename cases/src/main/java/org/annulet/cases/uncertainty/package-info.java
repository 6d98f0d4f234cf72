/**
 * How sure growth rates are when inputs are not: samples of the inputs, the modes of each, and what
 * derivatives foretell beside them.
 *
 * <pre>
 *   first order    σ ≈ σ₀ + gᵀx            second order   σ ≈ σ₀ + gᵀx + ½ xᵀHx
 *   share of input i in the variance:  b_i² Var x_i / Var σ,  b from least squares on all inputs
 * </pre>
 *
 * <p>Shares are squared standardised regression coefficients (Saltelli et al. 2008, Global
 * Sensitivity Analysis, The Primer; from memory); they add up to R², and what is left is not
 * linear. Intervals of probabilities are Wilson's (1927, J. Am. Stat. Assoc. 22, 209). Correlated
 * inputs have normal scores with the correlation given. Scatter from burner to burner is condensed
 * onto the burners ({@code FlameScatter}); to first order a pair of order m splits by the component
 * 2m of the scatter round the ring.
 */
package org.annulet.cases.uncertainty;
