package org.annulet.solver.assembly;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;
import org.annulet.solver.boundary.Damper;
import org.annulet.solver.boundary.OpenEnd;
import org.annulet.solver.boundary.Rigid;
import org.annulet.solver.boundary.TwoPort;
import org.annulet.solver.boundary.Wall;
import org.annulet.solver.flame.Flame;
import org.annulet.solver.flame.Side;
import org.annulet.solver.medium.Medium;

/**
 * Collects walls and flames and assembles the operator. Not thread-safe.
 *
 * <pre>
 *   AssembledProblem problem =
 *       new ProblemBuilder(mesh, new Section(1), gas)
 *           .wall("outlet", new ChokedNozzle(0.2))
 *           .flame(flame)
 *           .build();
 * </pre>
 */
public final class ProblemBuilder {
  private final AssemblyMemory memory;
  private final Metric metric;
  private final Map<String, Wall> walls = new LinkedHashMap<>();
  private final Map<Setup.FaceOf, Wall> faces = new LinkedHashMap<>();
  private final List<Flame> flames = new ArrayList<>();
  private final List<PortTerms.PlacedDamper> dampers = new ArrayList<>();
  private final List<PortTerms.PlacedTwoPort> twoPorts = new ArrayList<>();

  /**
   * Begins with all walls rigid and no flame.
   *
   * @param mesh for {@link #bloch} the half cell
   * @param geometry what its coordinates mean
   * @param medium the gas on its triangles
   * @throws IllegalArgumentException if they do not belong together
   */
  public ProblemBuilder(Mesh mesh, Geometry geometry, Medium medium) {
    this(new AssemblyMemory(mesh, geometry, medium));
  }

  /** The same on what earlier builders with this memory have made. */
  public ProblemBuilder(AssemblyMemory memory) {
    this.memory = memory;
    this.metric = memory.metric();
  }

  /**
   * Puts a wall on a boundary edge, in place of an earlier one.
   *
   * @throws IllegalArgumentException if the mesh has no such edge or it lies inside the gas
   */
  public ProblemBuilder wall(String edge, Wall wall) {
    Mesh mesh = metric.mesh();
    int index = Names.edge(mesh, edge);
    for (int e = 0; e < mesh.segmentCount(); e++) {
      if (mesh.segmentEdge(e) == index && mesh.segmentRight(e) >= 0) {
        throw new IllegalArgumentException(
            "edge '" + edge + "' lies inside the gas, where there is no wall");
      }
    }
    walls.put(edge, wall);
    return this;
  }

  /**
   * Puts a wall on a face of a ring's zone, in place of an earlier one.
   *
   * @throws IllegalArgumentException if there is no such zone, the geometry is no ring, or the wall
   *     is an open end
   */
  public ProblemBuilder face(String zone, Face face, Wall wall) {
    if (!(metric.geometry() instanceof Ring)) {
      throw new IllegalArgumentException("only the zones of a ring have faces");
    }
    if (wall instanceof OpenEnd) {
      throw new IllegalArgumentException("a face of zone '" + zone + "' cannot be an open end");
    }
    int index = Names.zone(metric.mesh(), zone, "face");
    if (wall instanceof Rigid) {
      faces.remove(new Setup.FaceOf(index, face));
    } else {
      faces.put(new Setup.FaceOf(index, face), wall);
    }
    return this;
  }

  /** Adds a flame. */
  public ProblemBuilder flame(Flame flame) {
    flames.add(flame);
    return this;
  }

  /**
   * Adds a damper at a place; on the half cell of a ring, where it must be at angle 0 on a face,
   * one at every burner.
   */
  public ProblemBuilder damper(String name, Damper damper, DamperPlace place) {
    dampers.add(new PortTerms.PlacedDamper(name, damper, place));
    return this;
  }

  /**
   * Puts a two-port across an inner edge, where the pressure may then jump; on a ring one at each
   * burner.
   *
   * @param edge name of the inner edge
   * @param upstream side 1 of the port
   */
  public ProblemBuilder twoPort(String edge, Side upstream, TwoPort port) {
    Names.edge(metric.mesh(), edge);
    twoPorts.add(new PortTerms.PlacedTwoPort(edge, upstream, edge, port));
    return this;
  }

  /**
   * Joins two boundary edges by a two-port; on a ring burner by burner.
   *
   * @param first name of the edge on side 1, the upstream one
   * @param second name of the edge on side 2
   */
  public ProblemBuilder twoPort(String first, String second, TwoPort port) {
    Names.edge(metric.mesh(), first);
    Names.edge(metric.mesh(), second);
    twoPorts.add(new PortTerms.PlacedTwoPort(first, null, second, port));
    return this;
  }

  private Setup setup() {
    return new Setup(
        memory,
        new Setup.Parts(
            new LinkedHashMap<>(walls),
            new LinkedHashMap<>(faces),
            List.copyOf(flames),
            List.copyOf(dampers),
            List.copyOf(twoPorts)));
  }

  /**
   * The problem as the geometry states it.
   *
   * @throws IllegalArgumentException if a flame names an edge or zone that is not there, or asks
   *     for what the geometry cannot give
   */
  public AssembledProblem build() {
    Setup setup = setup();
    int order = metric.geometry() instanceof Section section ? section.order() : 0;
    Assembler assembler = setup.assembler(order > 0 ? Setup.Axis.NO_PRESSURE : Setup.Axis.FREE);
    UnknownMap map = assembler.even();
    return new AssembledProblem(
        setup.operator(setup.matrices(assembler), order, metric.crossFactor()),
        metric.mesh(),
        metric.geometry(),
        (re, im) -> setup.expand(map, re, im));
  }

  /**
   * All azimuthal orders of a section on one set of matrices; the order in the geometry is not
   * used.
   *
   * @throws IllegalArgumentException if the geometry is no section
   */
  public SectionAssembly section() {
    if (!(metric.geometry() instanceof Section section)) {
      throw new IllegalArgumentException("azimuthal orders need a section");
    }
    return new SectionAssembly(setup(), section);
  }

  /**
   * All Bloch numbers of a symmetric ring on its half cell.
   *
   * @param cells whose half cell this builder was made for
   * @throws IllegalArgumentException if the geometry is no ring of as many burners, or the mesh of
   *     this builder is not the half cell
   */
  public BlochAssembly bloch(RingCells cells) {
    if (!(metric.geometry() instanceof Ring ring) || ring.burnerCount() != cells.count()) {
      throw new IllegalArgumentException(
          "Bloch numbers need a ring of " + cells.count() + " burners");
    }
    if (metric.mesh() != cells.half()) {
      throw new IllegalArgumentException(
          "Bloch numbers need the problem on the half cell, not on the whole ring");
    }
    return new BlochAssembly(setup(), ring, cells);
  }
}
