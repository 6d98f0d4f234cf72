package org.annulet.solver.assembly;

/**
 * A complex field at the nodes of a mesh.
 *
 * @param re real parts, shape [nodes], not to be modified
 * @param im imaginary parts, shape [nodes], not to be modified
 */
public record NodalField(double[] re, double[] im) {}
