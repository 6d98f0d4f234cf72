/**
 * Modes of the chamber against modes known from elsewhere: a network model's table, measured
 * values, and the chamber's own chain of ducts.
 *
 * <p>Matching is one to one with the least sum of costs over all rows (Hungarian method: Kuhn 1955,
 * Munkres 1957; in the form with potentials, from memory):
 *
 * <pre>
 *   cost = √( (|Δs| / (w |s|))² + (2 (1 − MAC))² ),   MAC = |aᴴb|² / (aᴴa · bᴴb)
 * </pre>
 *
 * <p>s of ours, Δs theirs less ours (of the frequency alone where no growth rate is given), w the
 * distance within which two modes can be the same, MAC the modal assurance criterion of the two
 * shapes along the axis (Allemang and Brown 1982; from memory), left out where there is none.
 * Different azimuthal orders never match; a cost above 1 is no match, which is itself a choice of
 * cost 1, so that a row is left alone rather than push others aside. A match is called ambiguous
 * where the best assignment without it costs less than 0.15 more.
 *
 * <p>An azimuthal pair is two modes here and often one row there: the second member then belongs to
 * the match of the first.
 */
package org.annulet.cases.compare;
