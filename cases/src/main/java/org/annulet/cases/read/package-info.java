/**
 * Case file to typed, immutable records in SI, with every fault at once.
 *
 * <p>The file is YAML 1.2, read as a tree of nodes with line and column; the binder walks the tree
 * once, collects a {@link org.annulet.cases.read.Problem} for everything it cannot take as written,
 * and yields a {@link org.annulet.cases.read.CaseFile} only when there is none. Nothing is guessed:
 * a dimensional value without a unit, an unknown key or a name that does not exist is a fault.
 *
 * <p>Numbers in records are SI: m, s, K, Pa, kg/m³, W, rad, Hz, 1/s. Sign convention: p' = Re(p̂
 * e^{st}); growth rate = Re s in 1/s, positive grows; frequency = Im s/2π in Hz.
 *
 * <p>What is not done here: geometry is checked for names and numbers, not for crossings (the
 * mesher's business), and nothing is computed.
 */
package org.annulet.cases.read;
