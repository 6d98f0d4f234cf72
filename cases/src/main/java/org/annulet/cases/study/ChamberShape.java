package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Damper;
import org.annulet.cases.read.DrawnShape;
import org.annulet.cases.read.Geometry;
import org.annulet.mesher.geometry.GeometryFault;
import org.annulet.mesher.mesh.EdgeCurves;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;
import org.annulet.mesher.mesh.RingReplication;
import org.annulet.mesher.mesh.UniformRefinement;
import org.annulet.mesher.triangulate.MeshingLimitException;
import org.annulet.mesher.triangulate.OutlineCurves;
import org.annulet.mesher.triangulate.OutlineMesher;
import org.annulet.mesher.triangulate.RingMesher;
import org.annulet.mesher.triangulate.Sizing;
import org.annulet.solver.assembly.CrossSection;
import org.annulet.solver.assembly.Plane;
import org.annulet.solver.assembly.Ring;
import org.annulet.solver.assembly.Section;
import org.annulet.solver.medium.Medium;

/**
 * The shape of a case as mesh and as the solver's geometry.
 *
 * @param mesh of the whole chamber
 * @param cells half cell and its images, on a ring only
 * @param geometry what the mesh's coordinates mean; a section at order 0
 */
public record ChamberShape(
    Mesh mesh, Optional<RingCells> cells, org.annulet.solver.assembly.Geometry geometry) {
  /** Most nodes of a refined mesh made elsewhere; about what 16 GB carry. */
  private static final long MOST_NODES = 4_000_000;

  /**
   * Nested meshes of a case, from coarse to fine: each is the one before with every triangle cut
   * into four, new boundary nodes on the true curves. A mesh made elsewhere is the coarsest; its
   * boundary stays the polygon it is.
   *
   * @param levels how many, at least 1
   * @param scale factor on all sizes of triangles of the finest: 1 for the mesh the case asks for
   * @throws CaseFaultException if the outline cannot be meshed; every fault with its place
   */
  public static List<ChamberShape> ladder(CaseFile caseFile, int levels, double scale) {
    List<ChamberShape> ladder = new ArrayList<>();
    try {
      EdgeCurves curves = curves(caseFile);
      if (caseFile.geometry() instanceof Geometry.MeshFile file) {
        ladder.add(imported(caseFile, file, levels));
      } else {
        ladder.add(mesh(caseFile, scale * (1 << (levels - 1))));
      }
      for (int i = 1; i < levels; i++) {
        ladder.add(ladder.get(i - 1).refined(curves));
      }
    } catch (GeometryFault e) {
      throw new CaseFaultException(DrawnShape.problems(caseFile.source(), e));
    } catch (MeshingLimitException e) {
      throw new CaseFaultException(
          List.of(
              caseFile
                  .source()
                  .problem("geometry.mesh_size", e.getMessage(), "choose larger triangles")));
    }
    return ladder;
  }

  /** The mesh a case asks for. */
  public static ChamberShape of(CaseFile caseFile) {
    return ladder(caseFile, 1, 1).get(0);
  }

  private ChamberShape refined(EdgeCurves curves) {
    if (cells.isPresent()) {
      RingCells old = cells.get();
      Mesh half = UniformRefinement.of(old.half()).mesh();
      RingCells fine = RingReplication.of(half, old.count(), old.whole().period() / old.count());
      return new ChamberShape(fine.whole(), Optional.of(fine), geometry);
    }
    return new ChamberShape(UniformRefinement.of(mesh, curves).mesh(), cells, geometry);
  }

  private static EdgeCurves curves(CaseFile caseFile) {
    return outline(caseFile.geometry())
        .<EdgeCurves>map(read -> new OutlineCurves(DrawnShape.outline(read)))
        .orElse(EdgeCurves.STRAIGHT);
  }

  /** The outline a geometry is drawn by; none of a ring and of a mesh made elsewhere. */
  static Optional<org.annulet.cases.read.Outline> outline(Geometry g) {
    if (g instanceof Geometry.Section section) {
      return Optional.of(section.outline());
    }
    if (g instanceof Geometry.CrossSection cross) {
      return Optional.of(cross.outline());
    }
    return g instanceof Geometry.Plane plane ? Optional.of(plane.outline()) : Optional.empty();
  }

  private static ChamberShape mesh(CaseFile caseFile, double scale) {
    Geometry g = caseFile.geometry();
    Sizing sizing = nearDampers(caseFile, sizing(g.meshSize(), g.zoneNames()));
    if (g.meshSize().sidesPerWavelength() > 0) {
      Sizing.Builder b = sizing.toBuilder();
      perWavelength(caseFile, shape(g, sizing.scaled(4)).mesh())
          .forEach((zone, h) -> b.zone(zone, Math.min(h, sizing.zones().getOrDefault(zone, h))));
      return shape(g, b.build().scaled(scale));
    }
    return shape(g, sizing.scaled(scale));
  }

  /** Half the mouth's width at every damper; on a ring in every cell, which stay alike. */
  private static Sizing nearDampers(CaseFile caseFile, Sizing sizing) {
    Sizing.Builder b = sizing.toBuilder();
    for (Damper damper : caseFile.dampers()) {
      double width = CaseDampers.mouthWidth(damper);
      double size = Math.min(0.5 * width, sizing.largestSide());
      for (Damper.Place place : damper.places()) {
        if (place instanceof Damper.OnEdge e) {
          b.near(e.x(), e.y(), width, size);
        } else {
          Geometry.Ring ring = (Geometry.Ring) caseFile.geometry();
          Damper.OnFace f = (Damper.OnFace) place;
          double pitch = 2 * Math.PI / ring.burnerCount();
          double inCell = Math.IEEEremainder(f.angle(), pitch);
          b.near(f.x(), Math.abs(inCell) * ring.unrolledRadius(), width, size);
        }
      }
    }
    return b.build();
  }

  /** Largest sides that leave the wanted number per wavelength in the slowest gas of each zone. */
  private static Map<String, Double> perWavelength(CaseFile caseFile, Mesh coarse) {
    Medium gas = new CaseGas(caseFile).on(coarse);
    double sides = caseFile.geometry().meshSize().sidesPerWavelength();
    Map<String, Double> largest = new LinkedHashMap<>();
    for (int t = 0; t < coarse.triangleCount(); t++) {
      largest.merge(
          coarse.zoneNames().get(coarse.zone(t)),
          gas.soundSpeed(t) / (sides * caseFile.window().highestFrequency()),
          Math::min);
    }
    return largest;
  }

  private static ChamberShape shape(Geometry g, Sizing sizing) {
    if (g instanceof Geometry.Ring ring) {
      RingCells cells = RingMesher.mesh(DrawnShape.ring(ring), sizing);
      return new ChamberShape(cells.whole(), Optional.of(cells), ringGeometry(ring));
    }
    if (g instanceof Geometry.Section section) {
      Map<String, Section.Ducts> ducts = new LinkedHashMap<>();
      section
          .outline()
          .zones()
          .forEach(
              (name, z) ->
                  z.separateDucts()
                      .ifPresent(
                          d -> ducts.put(name, new Section.Ducts(d.count(), d.openShare()))));
      return flat(section.outline(), sizing, new Section(0, ducts));
    }
    if (g instanceof Geometry.CrossSection cross) {
      return flat(cross.outline(), sizing, new CrossSection(cross.axialWavenumber()));
    }
    if (g instanceof Geometry.Plane plane) {
      return flat(plane.outline(), sizing, new Plane(plane.depth()));
    }
    throw new IllegalArgumentException("no outline to mesh in " + g);
  }

  private static ChamberShape imported(CaseFile caseFile, Geometry.MeshFile file, int levels) {
    long nodes = (long) file.mesh().nodeCount() << (2 * (levels - 1));
    if (nodes > MOST_NODES) {
      throw new CaseFaultException(
          List.of(
              caseFile
                  .source()
                  .problem(
                      "geometry.file",
                      "the mesh has "
                          + file.mesh().nodeCount()
                          + " nodes, and "
                          + nodes
                          + " where it is refined for the error bars",
                      "write a coarser mesh: it is the coarsest of " + levels + " nested ones")));
    }
    org.annulet.solver.assembly.Geometry geometry =
        switch (file.plane()) {
          case SECTION -> {
            Map<String, Section.Ducts> ducts = new LinkedHashMap<>();
            file.separateDucts()
                .forEach((name, d) -> ducts.put(name, new Section.Ducts(d.count(), d.openShare())));
            yield new Section(0, ducts);
          }
          case CROSS_SECTION -> new CrossSection(file.depth());
          case PLANE -> new Plane(file.depth());
        };
    return new ChamberShape(file.mesh(), Optional.empty(), geometry);
  }

  private static ChamberShape flat(
      org.annulet.cases.read.Outline read,
      Sizing sizing,
      org.annulet.solver.assembly.Geometry geometry) {
    return new ChamberShape(
        OutlineMesher.mesh(DrawnShape.outline(read), sizing), Optional.empty(), geometry);
  }

  private static Sizing sizing(Geometry.MeshSize size, List<String> zones) {
    Sizing.Builder b = Sizing.builder(size.largest());
    size.local()
        .forEach(
            (name, h) -> {
              if (zones.contains(name)) {
                b.zone(name, h);
              } else {
                b.edge(name, h);
              }
            });
    return b.build();
  }

  static Ring ringGeometry(Geometry.Ring ring) {
    Map<String, Ring.Annulus> zones = new LinkedHashMap<>();
    for (Geometry.RingZone z : ring.zones()) {
      double height =
          z instanceof Geometry.Annulus a ? a.gap() : Math.PI / 4 * ((Geometry.Ducts) z).bore();
      zones.put(z.name(), new Ring.Annulus(z.meanRadius(), height));
    }
    return new Ring(ring.burnerCount(), ring.unrolledRadius(), zones);
  }
}
