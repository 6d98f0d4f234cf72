package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;
import org.annulet.solver.assembly.AssembledProblem;
import org.annulet.solver.assembly.AssemblyMemory;
import org.annulet.solver.assembly.BlochAssembly;
import org.annulet.solver.assembly.ProblemBuilder;
import org.annulet.solver.assembly.Section;
import org.annulet.solver.assembly.SectionAssembly;
import org.annulet.solver.medium.Medium;

/**
 * A case as the operators to be solved: one for each azimuthal order of a section, one for each
 * Bloch number of a ring whose burners are all alike, one for a whole ring with staged burners, one
 * for a plane.
 *
 * @param shape mesh and geometry
 * @param medium gas on the triangles of the whole mesh
 * @param parts the operators
 * @param method which way was taken and why, in one sentence
 */
public record CaseProblem(ChamberShape shape, Medium medium, List<Part> parts, String method) {
  /**
   * One operator.
   *
   * @param name for the reader ("order 1")
   * @param order azimuthal order; null where the operator has none of its own
   * @param copies modes of the chamber behind each eigenvalue: 2 where the operator stands for a
   *     turning wave and its mirror image
   * @param assembled operator and expansion
   */
  public record Part(String name, Integer order, int copies, AssembledProblem assembled) {}

  /**
   * The operators of a case on a mesh of its shape.
   *
   * @throws CaseFaultException if the case cannot be set up
   */
  public static CaseProblem on(CaseFile caseFile, ChamberShape shape) {
    return on(caseFile, new CaseMemory(caseFile, shape));
  }

  /** The same with what was assembled before for cases like it. */
  static CaseProblem on(CaseFile caseFile, CaseMemory memory) {
    ChamberShape shape = memory.shape();
    if (shape.cells().isPresent()
        && new CaseFlames(caseFile).allBurnersAlike()
        && CaseDampers.allBurnersAlike(caseFile)
        && caseFile.gas().even()) {
      RingCells cells = shape.cells().get();
      BlochAssembly bloch = builder(caseFile, cells.half(), memory).bloch(cells);
      List<Part> parts = new ArrayList<>();
      for (int q = 0; q <= bloch.largestNumber(); q++) {
        parts.add(new Part("Bloch number " + q, null, bloch.multiplicity(q), bloch.number(q)));
      }
      return new CaseProblem(
          shape,
          memory.medium(caseFile),
          parts,
          String.format(
              Locale.ROOT,
              "All %d burners are alike: one burner cell is solved for each Bloch number 0 to %d.",
              cells.count(),
              bloch.largestNumber()));
    }
    return whole(caseFile, memory);
  }

  /** The same without use of a ring's symmetry. */
  public static CaseProblem whole(CaseFile caseFile, ChamberShape shape) {
    return whole(caseFile, new CaseMemory(caseFile, shape));
  }

  /** The same without use of a ring's symmetry. */
  static CaseProblem whole(CaseFile caseFile, CaseMemory memory) {
    ChamberShape shape = memory.shape();
    ProblemBuilder builder = builder(caseFile, shape.mesh(), memory);
    Medium medium = memory.medium(caseFile);
    if (shape.geometry() instanceof Section) {
      SectionAssembly section = builder.section();
      List<Part> parts = new ArrayList<>();
      for (int m : caseFile.azimuthalOrders()) {
        parts.add(new Part("order " + m, m, m == 0 ? 1 : 2, section.order(m)));
      }
      return new CaseProblem(
          shape, medium, parts, "Each azimuthal order of the section is solved by itself.");
    }
    String method =
        shape.cells().isPresent()
            ? whyWhole(caseFile) + ": the whole ring is solved."
            : "The plane is solved as a whole.";
    return new CaseProblem(shape, medium, List.of(new Part("", null, 1, builder.build())), method);
  }

  private static String whyWhole(CaseFile caseFile) {
    if (!new CaseFlames(caseFile).allBurnersAlike()) {
      return "The burners differ";
    }
    return CaseDampers.allBurnersAlike(caseFile)
        ? "The temperature changes round the ring"
        : "Dampers break the symmetry";
  }

  private static ProblemBuilder builder(CaseFile caseFile, Mesh mesh, CaseMemory memory) {
    AssemblyMemory assembled = memory.of(caseFile, mesh);
    ProblemBuilder b = new ProblemBuilder(assembled);
    CaseWalls.put(caseFile, b);
    CaseTwoPorts.put(caseFile, mesh, assembled.medium(), b);
    CaseDampers.put(caseFile, mesh, assembled.medium(), b);
    new CaseFlames(caseFile).all().forEach(b::flame);
    return b;
  }
}
