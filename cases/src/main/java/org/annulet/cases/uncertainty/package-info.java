/**
 * How sure growth rates are when inputs are not: samples of the inputs, the modes of each, and what
 * derivatives foretell beside them.
 *
 * <pre>
 *   first order    σ ≈ σ₀ + gᵀx            second order   σ ≈ σ₀ + gᵀx + ½ xᵀHx
 *   share of input i in the variance:  b_i Cov(x_i, σ) / Var σ,  b from least squares on all inputs
 * </pre>
 *
 * <p>Shares are those of a linear model with correlated inputs (Li et al. 2010, J. Phys. Chem. A
 * 114, 6022; from memory): they add up to R², and what is left is not linear. Of independent inputs
 * they are the squared standardised regression coefficients; of correlated ones a share may be
 * negative, where an input offsets what goes with it. Intervals of probabilities are Wilson's
 * (1927, J. Am. Stat. Assoc. 22, 209). Correlated inputs have normal scores with the correlation
 * given. Scatter from burner to burner is condensed onto the burners ({@code FlameScatter}); to
 * first order a pair of order m splits by the component 2m of the scatter round the ring.
 */
package org.annulet.cases.uncertainty;
