package org.annulet.cases.read;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.annulet.mesher.mesh.Mesh;

/** The shape of the gas. Lengths in m. */
public sealed interface Geometry {
  /** Sizes of triangles. */
  MeshSize meshSize();

  /** Names of the zones, in the order of the file. */
  List<String> zoneNames();

  /**
   * Largest sides of triangles.
   *
   * @param largest everywhere, in m
   * @param local by edge or zone name, in m; in the order of the file
   * @param sidesPerWavelength least number of sides per wavelength at the top of the window; 0 for
   *     no such rule
   */
  record MeshSize(double largest, Map<String, Double> local, double sidesPerWavelength) {}

  /**
   * Thin annuli, unrolled: N burners on one ring. Axial coordinate x is 0 at the upstream end of
   * the first zone.
   *
   * @param burnerCount N
   * @param unrolledRadius radius R₀ at which the arc coordinate is measured, in m
   * @param zones from upstream to downstream, touching each other
   * @param meshSize sizes of triangles
   */
  record Ring(int burnerCount, double unrolledRadius, List<RingZone> zones, MeshSize meshSize)
      implements Geometry {
    @Override
    public List<String> zoneNames() {
      return zones.stream().map(RingZone::name).toList();
    }

    /** The zone of this name; fails when there is none. */
    public RingZone zone(String name) {
      return zones.stream().filter(z -> z.name().equals(name)).findFirst().orElseThrow();
    }

    /** Axial coordinate of the upstream end of a zone, in m. */
    public double start(String zone) {
      double x = 0;
      for (RingZone z : zones) {
        if (z.name().equals(zone)) {
          return x;
        }
        x += z.length();
      }
      throw new IllegalArgumentException("no zone '" + zone + "' in the ring");
    }
  }

  /** One zone of a ring. */
  sealed interface RingZone {
    /** Name of the zone. */
    String name();

    /** Mean radius in m. */
    double meanRadius();

    /** Axial length in m. */
    double length();
  }

  /**
   * A full annulus.
   *
   * @param name of the zone
   * @param meanRadius in m
   * @param gap radial height in m
   * @param length in m
   */
  record Annulus(String name, double meanRadius, double gap, double length) implements RingZone {}

  /**
   * N equal round ducts, one per burner.
   *
   * @param name of the zone
   * @param meanRadius radius of the burners' pitch circle in m
   * @param bore diameter in m; of the circle of equal area when the case file gives an area
   * @param length in m
   */
  record Ducts(String name, double meanRadius, double bore, double length) implements RingZone {}

  /**
   * Half-plane (x, r) of an axisymmetric chamber; one problem per azimuthal order.
   *
   * @param outline points are (x, r)
   * @param meshSize sizes of triangles
   */
  record Section(Outline outline, MeshSize meshSize) implements Geometry {
    @Override
    public List<String> zoneNames() {
      return List.copyOf(outline.zones().keySet());
    }
  }

  /**
   * Plane across the axis, for transverse modes.
   *
   * @param outline points are (y, z)
   * @param meshSize sizes of triangles
   * @param axialWavenumber k in 1/m; the field varies as e^{ikx}
   */
  record CrossSection(Outline outline, MeshSize meshSize, double axialWavenumber)
      implements Geometry {
    @Override
    public List<String> zoneNames() {
      return List.copyOf(outline.zones().keySet());
    }
  }

  /**
   * Two-dimensional rig.
   *
   * @param outline points are (x, y)
   * @param meshSize sizes of triangles
   * @param depth across the plane in m
   */
  record Plane(Outline outline, MeshSize meshSize, double depth) implements Geometry {
    @Override
    public List<String> zoneNames() {
      return List.copyOf(outline.zones().keySet());
    }
  }

  /** What the coordinates of a mesh made elsewhere mean. */
  enum MeshPlane {
    /** (x, r) of an axisymmetric chamber. */
    SECTION,
    /** (y, z) across the axis. */
    CROSS_SECTION,
    /** (x, y) of a rig. */
    PLANE
  }

  /**
   * A mesh made elsewhere; its physical groups are the zones and edges.
   *
   * @param file the mesh, existing
   * @param metresPerUnit length in m of one unit of the file's coordinates
   * @param plane what the coordinates mean
   * @param depth of a plane in m; axial wavenumber in 1/m of a cross-section; 0 on a section
   * @param separateDucts number of identical tubes and open share by zone name
   * @param mesh as read from the file, in m
   */
  record MeshFile(
      Path file,
      double metresPerUnit,
      MeshPlane plane,
      double depth,
      Map<String, SeparateDucts> separateDucts,
      Mesh mesh)
      implements Geometry {
    @Override
    public MeshSize meshSize() {
      return new MeshSize(Double.POSITIVE_INFINITY, Map.of(), 0);
    }

    @Override
    public List<String> zoneNames() {
      return mesh == null ? List.of() : mesh.zoneNames();
    }
  }

  /**
   * Identical tubes side by side on a section: weight 2πr × open share, no (m/r)² term.
   *
   * @param count number of tubes N; orders must satisfy 2|m| &lt; N
   * @param openShare open area over annular area, above 0, at most 1
   */
  record SeparateDucts(int count, double openShare) {}
}
