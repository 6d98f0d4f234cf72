package org.annulet.cases.read;

import java.io.IOException;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.units.Quantity;
import org.annulet.cases.units.QuantityKind;
import org.annulet.cases.units.UnitFault;
import org.annulet.mesher.files.GmshReader;
import org.annulet.mesher.files.ImportOptions;
import org.annulet.mesher.files.MeshFileException;
import org.annulet.mesher.files.VtuMeshReader;
import org.annulet.mesher.mesh.Mesh;

/** Reads {@code geometry} of kind {@code mesh_file}, and the mesh it names. */
final class MeshFileReader {
  private MeshFileReader() {}

  static Geometry read(Mapping m) {
    Optional<Path> file = m.get("file").flatMap(CaseFolder::existing);
    Geometry.MeshPlane plane =
        m.get("plane")
            .flatMap(e -> e.choice(List.of("section", "cross_section", "plane")))
            .map(p -> Geometry.MeshPlane.valueOf(p.toUpperCase(Locale.ROOT)))
            .orElse(Geometry.MeshPlane.SECTION);
    double unit = m.get("length_unit").map(MeshFileReader::unit).orElse(Double.NaN);
    double depth = 0;
    if (plane == Geometry.MeshPlane.PLANE) {
      if (!m.has("depth")) {
        m.entry().fault("the key 'depth' is missing", "a plane has a depth: add 'depth: 50 mm'");
      }
      depth = m.number("depth", QuantityKind.LENGTH, Range.POSITIVE);
    } else if (plane == Geometry.MeshPlane.CROSS_SECTION) {
      depth = m.number("axial_wavenumber", QuantityKind.WAVENUMBER, Range.NOT_NEGATIVE, 0);
    }
    ImportOptions options =
        ImportOptions.standard()
            .inPlane(coordinates(m))
            .naming(names(m, "zone_names"), names(m, "edge_names"));
    Mesh mesh =
        file.isEmpty() || Double.isNaN(unit)
            ? null
            : mesh(m.get("file").orElseThrow(), file.get(), options.inUnitsOf(unit));
    if (mesh != null && plane == Geometry.MeshPlane.SECTION) {
      axis(m.get("file").orElseThrow(), mesh);
    }
    return new Geometry.MeshFile(
        file.orElse(null), unit, plane, depth, ducts(m, plane, mesh), mesh);
  }

  private static Mesh mesh(Entry entry, Path file, ImportOptions options) {
    String name = file.getFileName().toString().toLowerCase(Locale.ROOT);
    try {
      if (name.endsWith(".vtu")) {
        return VtuMeshReader.read(file, options);
      }
      if (name.endsWith(".msh")) {
        return GmshReader.read(file, options);
      }
      entry.fault(
          "mesh file '" + file.getFileName() + "' is neither .msh nor .vtu",
          "write the mesh as MSH 2.2 or 4.1, or as VTU");
    } catch (MeshFileException e) {
      entry.fault(file.getFileName() + e.place() + ": " + e.what(), e.mend());
    } catch (IOException e) {
      entry.fault("the mesh cannot be read: " + e.getMessage(), "look at its permissions");
    }
    return null;
  }

  private static void axis(Entry entry, Mesh mesh) {
    for (int v = 0; v < mesh.nodeCount(); v++) {
      if (mesh.y(v) < 0) {
        entry.fault(
            "a node of the mesh lies below the axis, at r = " + mesh.y(v) + " m",
            "a section has r not negative; say with 'coordinates' which two of the file's are x"
                + " and r");
        return;
      }
    }
  }

  private static ImportOptions.Plane coordinates(Mapping m) {
    return m.get("coordinates")
        .flatMap(e -> e.choice(List.of("xy", "xz", "yz", "zy", "zx", "yx")))
        .map(c -> ImportOptions.Plane.valueOf(c.toUpperCase(Locale.ROOT)))
        .orElse(ImportOptions.Plane.XY);
  }

  /** Names by the number a group or cell has in the file. */
  private static Map<Integer, String> names(Mapping m, String key) {
    Map<Integer, String> names = new LinkedHashMap<>();
    m.get(key)
        .ifPresent(
            e -> {
              Mapping list = Mapping.named(e);
              list.entries()
                  .forEach(
                      (number, name) -> {
                        if (number.matches("[0-9]{1,9}")) {
                          name.text().ifPresent(t -> names.put(Integer.parseInt(number), t));
                        } else {
                          list.at(number)
                              .fault(
                                  "'" + number + "' is no number of the file",
                                  "write for example {1: plenum, 2: chamber}");
                        }
                      });
            });
    return names;
  }

  private static Map<String, Geometry.SeparateDucts> ducts(
      Mapping m, Geometry.MeshPlane plane, Mesh mesh) {
    Map<String, Geometry.SeparateDucts> ducts = new LinkedHashMap<>();
    m.get("separate_ducts")
        .ifPresent(
            e -> {
              if (plane != Geometry.MeshPlane.SECTION) {
                e.fault(
                    "separate_ducts in a geometry that is no section",
                    "leave it out, or use 'plane: section'");
              }
              Mapping zones = Mapping.named(e);
              zones
                  .entries()
                  .forEach(
                      (name, d) -> {
                        if (mesh != null && !mesh.zoneNames().contains(name)) {
                          zones
                              .at(name)
                              .fault(
                                  "no zone '" + name + "'", Nearest.advice(name, mesh.zoneNames()));
                        }
                        ducts.put(
                            name,
                            GeometryReader.ducts(Mapping.of(d, CaseKeys.MESH_FILE_DUCTS), "count"));
                      });
            });
    return ducts;
  }

  private static double unit(Entry e) {
    Optional<String> text = e.text();
    if (text.isEmpty()) {
      return Double.NaN;
    }
    try {
      return Quantity.parse("1", text.get(), QuantityKind.LENGTH).si();
    } catch (UnitFault f) {
      e.fault(f.what(), f.mend());
      return Double.NaN;
    }
  }
}
