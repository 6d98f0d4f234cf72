package org.annulet.cases.study;

import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;
import org.annulet.cases.read.CaseFile;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.assembly.AssemblyMemory;
import org.annulet.solver.medium.Medium;

/**
 * What a case and its changes have in common on one mesh: the gas and what is assembled on it.
 * Changes that leave the gas alone take both from here. Thread-safe.
 */
final class CaseMemory {
  private final CaseFile base;
  private final ChamberShape shape;
  private final Map<Mesh, AssemblyMemory> made = new ConcurrentHashMap<>();

  /**
   * An empty memory.
   *
   * @param shape the mesh on which the base case and its changes are set up
   */
  CaseMemory(CaseFile base, ChamberShape shape) {
    this.base = base;
    this.shape = shape;
  }

  ChamberShape shape() {
    return shape;
  }

  /** Gas and assembly of a case on the whole mesh or the half cell. */
  AssemblyMemory of(CaseFile caseFile, Mesh mesh) {
    if (!caseFile.gas().equals(base.gas())) {
      return fresh(caseFile, mesh);
    }
    return made.computeIfAbsent(mesh, m -> fresh(base, m));
  }

  private AssemblyMemory fresh(CaseFile caseFile, Mesh mesh) {
    return new AssemblyMemory(mesh, shape.geometry(), new CaseGas(caseFile).on(mesh));
  }

  /** The gas of a case on the whole mesh. */
  Medium medium(CaseFile caseFile) {
    return of(caseFile, shape.mesh()).medium();
  }
}
