package org.annulet.mesher.files;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeSet;
import org.annulet.mesher.mesh.Mesh;

/**
 * Reads a mesh from VTK's unstructured grid: triangles and quadrilaterals with a cell array {@code
 * zone}, lines along the edges with a cell array {@code edge}. The numbers get their names from the
 * file's own lists {@code zone_names} and {@code edge_names}, counted from 0, or from the caller.
 * Other cells of less than two dimensions are ignored, volumes and curved cells refused.
 */
public final class VtuMeshReader {
  private static final int LINE = 3;
  private static final int TRIANGLE = 5;
  private static final int QUADRILATERAL = 9;
  private static final List<Integer> POINTS = List.of(0, 1, 2, 4);

  private final VtuGrid grid;
  private final ImportOptions options;
  private final ByteCursor where;
  private final Cells cells = new Cells();

  private VtuMeshReader(Path file, VtuGrid grid, ImportOptions options) {
    this.grid = grid;
    this.options = options;
    this.where = new ByteCursor(file.toString(), new byte[0]);
  }

  /**
   * The mesh in {@code file}.
   *
   * @throws MeshFileException if it is not such a file, is damaged, or names are missing
   * @throws IOException if it cannot be read
   */
  public static Mesh read(Path file, ImportOptions options) throws IOException {
    return new VtuMeshReader(file, VtuGrid.read(file), options).mesh();
  }

  private Mesh mesh() throws MeshFileException {
    for (int v = 0; v < grid.pointCount(); v++) {
      cells.point(grid.points()[3 * v], grid.points()[3 * v + 1], grid.points()[3 * v + 2]);
    }
    Names zones = new Names("zone", options.names().zones());
    Names edges = new Names("edge", options.names().edges());
    for (int c = 0; c < grid.cellCount(); c++) {
      int type = grid.types()[c];
      int[] corners = Arrays.copyOfRange(grid.corners(), grid.begin(c), grid.offsets()[c]);
      int wanted = type == LINE ? 2 : type == TRIANGLE ? 3 : type == QUADRILATERAL ? 4 : 0;
      if (POINTS.contains(type)) {
        continue;
      }
      if (wanted == 0 || corners.length != wanted) {
        throw where.fault(
            "cell " + c + " is of VTK's kind " + type + " with " + corners.length + " points",
            "write lines, triangles and quadrilaterals with straight sides alone");
      }
      cells.cell(0, (type == LINE ? edges : zones).of(c), corners);
    }
    cells.declaredZones.addAll(zones.unused());
    cells.declaredEdges.addAll(edges.unused());
    cells.period = period();
    return Assembly.mesh(cells, options, where);
  }

  /** A ring's file says after which length y repeats; 0 where there is no such text. */
  private double period() throws MeshFileException {
    List<String> text = grid.texts().getOrDefault("period", List.of());
    if (text.isEmpty()) {
      return 0;
    }
    try {
      return Double.parseDouble(text.get(0));
    } catch (NumberFormatException e) {
      throw where.fault("the period is '" + text.get(0) + "'", "write a length in the file's unit");
    }
  }

  /** Names of the numbers in a cell array. */
  private final class Names {
    private final String array;
    private final Map<Integer, String> given;
    private final List<String> listed;
    private final VtuGrid.Field field;
    private final TreeSet<String> used = new TreeSet<>();

    Names(String array, Map<Integer, String> given) {
      this.array = array;
      this.given = given;
      this.listed = grid.texts().getOrDefault(array + "_names", List.of());
      this.field = grid.cellData().get(array);
    }

    /** The name of a cell; null where it has no number or a negative one. */
    String of(int cell) throws MeshFileException {
      if (field == null || field.components() != 1) {
        return null;
      }
      double value = field.values()[cell];
      int number = (int) value;
      if (number != value) {
        throw where.fault(
            "the cell array '" + array + "' holds " + value, "give every cell a whole number");
      }
      if (number < 0) {
        return null;
      }
      String name = given.get(number);
      if (name == null && number < listed.size()) {
        name = listed.get(number);
      }
      if (name == null) {
        throw where.fault(
            String.format(
                Locale.ROOT,
                "%s number %d of cell %d has no name; names are %s",
                array,
                number,
                cell,
                listed.isEmpty() && given.isEmpty() ? "none" : listed + " and " + given),
            "list it in '" + array + "_names' of the file or of the case");
      }
      used.add(name);
      return name;
    }

    /** Names of the list that no cell has. */
    TreeSet<String> unused() {
      TreeSet<String> unused = new TreeSet<>(listed);
      unused.removeAll(used);
      return unused;
    }
  }
}
