package org.annulet.solver.assembly;

import org.annulet.mesher.mesh.Mesh;

/** Looks names up in the mesh and says which there are when one is unknown. */
final class Names {
  private Names() {}

  static int edge(Mesh mesh, String name) {
    int index = mesh.edgeNames().indexOf(name);
    if (index < 0) {
      throw new IllegalArgumentException(
          "edge '" + name + "': no such edge in the mesh; edges are " + mesh.edgeNames());
    }
    return index;
  }

  static int zone(Mesh mesh, String name, String what) {
    int index = mesh.zoneNames().indexOf(name);
    if (index < 0) {
      throw new IllegalArgumentException(
          what + ": no zone '" + name + "' in the mesh; zones are " + mesh.zoneNames());
    }
    return index;
  }
}
