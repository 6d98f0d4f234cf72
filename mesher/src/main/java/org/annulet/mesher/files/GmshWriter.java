package org.annulet.mesher.files;

import java.io.BufferedWriter;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.annulet.mesher.mesh.Mesh;

/**
 * Writes MSH 4.1 as text: each zone a physical surface, each named edge a physical curve, numbered
 * from 1. The period of a ring stands in a section of its own, {@code $Period}, which Gmsh skips.
 * Coordinates in m, in as many digits as it takes to read the same number back.
 */
public final class GmshWriter {
  private GmshWriter() {}

  /**
   * Writes {@code mesh} to {@code file}, replacing it.
   *
   * @throws IllegalArgumentException if a name cannot stand in such a file
   * @throws IOException if it cannot be written
   */
  public static void write(Mesh mesh, Path file) throws IOException {
    checkNames(mesh.zoneNames());
    checkNames(mesh.edgeNames());
    try (BufferedWriter out = Files.newBufferedWriter(file, StandardCharsets.UTF_8)) {
      out.write("$MeshFormat\n4.1 0 8\n$EndMeshFormat\n");
      if (mesh.period() != 0) {
        out.write("$Period\n" + mesh.period() + "\n$EndPeriod\n");
      }
      names(mesh, out);
      Unrolled flat = Unrolled.of(mesh);
      entities(mesh, flat, out);
      nodes(flat, out);
      elements(mesh, flat, out);
    }
  }

  private static void checkNames(List<String> names) {
    for (String name : names) {
      if (name.isEmpty() || name.length() > 120 || name.chars().anyMatch(c -> c < 32 || c == '"')) {
        throw new IllegalArgumentException(
            "the name '"
                + name
                + "' cannot stand in an MSH file\n    mend: use 1 to 120 characters,"
                + " no quotation marks or line ends");
      }
    }
  }

  private static void names(Mesh mesh, BufferedWriter out) throws IOException {
    int edges = mesh.edgeNames().size();
    int zones = mesh.zoneNames().size();
    out.write("$PhysicalNames\n" + (edges + zones) + "\n");
    for (int i = 0; i < edges; i++) {
      out.write("1 " + (i + 1) + " \"" + mesh.edgeNames().get(i) + "\"\n");
    }
    for (int i = 0; i < zones; i++) {
      out.write("2 " + (i + 1) + " \"" + mesh.zoneNames().get(i) + "\"\n");
    }
    out.write("$EndPhysicalNames\n");
  }

  private static void entities(Mesh mesh, Unrolled flat, BufferedWriter out) throws IOException {
    double[] box = {1e300, 1e300, -1e300, -1e300};
    for (int v = 0; v < flat.points; v++) {
      for (int i = 0; i < 2; i++) {
        box[i] = Math.min(box[i], flat.xy[2 * v + i]);
        box[i + 2] = Math.max(box[i + 2], flat.xy[2 * v + i]);
      }
    }
    String extent = " " + box[0] + " " + box[1] + " 0 " + box[2] + " " + box[3] + " 0 1 ";
    int edges = mesh.edgeNames().size();
    int zones = mesh.zoneNames().size();
    out.write("$Entities\n0 " + edges + " " + zones + " 0\n");
    for (int i = 1; i <= edges; i++) {
      out.write(i + extent + i + " 0\n");
    }
    for (int i = 1; i <= zones; i++) {
      out.write(i + extent + i + " 0\n");
    }
    out.write("$EndEntities\n");
  }

  private static void nodes(Unrolled flat, BufferedWriter out) throws IOException {
    int n = flat.points;
    out.write("$Nodes\n1 " + n + " 1 " + n + "\n2 1 0 " + n + "\n");
    for (int v = 1; v <= n; v++) {
      out.write(v + "\n");
    }
    for (int v = 0; v < n; v++) {
      out.write(flat.xy[2 * v] + " " + flat.xy[2 * v + 1] + " 0\n");
    }
    out.write("$EndNodes\n");
  }

  private static void elements(Mesh mesh, Unrolled flat, BufferedWriter out) throws IOException {
    int all = mesh.segmentCount() + mesh.triangleCount();
    int[] perEdge = new int[mesh.edgeNames().size()];
    for (int e = 0; e < mesh.segmentCount(); e++) {
      perEdge[mesh.segmentEdge(e)]++;
    }
    int[] perZone = new int[mesh.zoneNames().size()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      perZone[mesh.zone(t)]++;
    }
    out.write("$Elements\n" + (perEdge.length + perZone.length) + " " + all + " 1 " + all + "\n");
    int tag = 1;
    for (int i = 0; i < perEdge.length; i++) {
      out.write("1 " + (i + 1) + " 1 " + perEdge[i] + "\n");
      for (int e = 0; e < mesh.segmentCount(); e++) {
        if (mesh.segmentEdge(e) == i) {
          out.write(tag++ + " " + (flat.ends[2 * e] + 1) + " " + (flat.ends[2 * e + 1] + 1) + "\n");
        }
      }
    }
    for (int i = 0; i < perZone.length; i++) {
      out.write("2 " + (i + 1) + " 2 " + perZone[i] + "\n");
      for (int t = 0; t < mesh.triangleCount(); t++) {
        if (mesh.zone(t) == i) {
          out.write(tag++ + "");
          for (int k = 0; k < 3; k++) {
            out.write(" " + (flat.corners[3 * t + k] + 1));
          }
          out.write("\n");
        }
      }
    }
    out.write("$EndElements\n");
  }
}
