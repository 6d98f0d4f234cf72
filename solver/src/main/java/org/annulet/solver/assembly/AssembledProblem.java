package org.annulet.solver.assembly;

import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.operator.AcousticOperator;

/**
 * A discrete operator and the way back from its unknowns to the mesh. Immutable and thread-safe.
 */
public final class AssembledProblem {
  private final AcousticOperator operator;
  private final Mesh mesh;
  private final Geometry geometry;
  private final Expansion expansion;

  AssembledProblem(AcousticOperator operator, Mesh mesh, Geometry geometry, Expansion expansion) {
    this.operator = operator;
    this.mesh = mesh;
    this.geometry = geometry;
    this.expansion = expansion;
  }

  /** From unknowns to nodes. */
  @FunctionalInterface
  interface Expansion {
    NodalField of(double[] re, double[] im);
  }

  /** The operator L(s). */
  public AcousticOperator operator() {
    return operator;
  }

  /** The mesh fields are expanded on: of a Bloch cell the whole ring. */
  public Mesh mesh() {
    return mesh;
  }

  /** The geometry; of a section with the order of this problem. */
  public Geometry geometry() {
    return geometry;
  }

  /**
   * The field at the nodes of {@link #mesh()}; zero where p̂ = 0 is imposed. On a section it is the
   * amplitude of e^{imθ}.
   *
   * @param re real part of the vector of unknowns, not modified
   * @param im imaginary part of the vector of unknowns, not modified
   */
  public NodalField expand(double[] re, double[] im) {
    if (re.length != operator.size() || im.length != operator.size()) {
      throw new IllegalArgumentException(
          "the problem has "
              + operator.size()
              + " unknowns, the vector "
              + re.length
              + " and "
              + im.length);
    }
    return expansion.of(re, im);
  }
}
