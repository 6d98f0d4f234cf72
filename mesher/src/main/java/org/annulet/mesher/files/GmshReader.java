package org.annulet.mesher.files;

import java.io.IOException;
import java.nio.ByteOrder;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.annulet.mesher.mesh.Mesh;

/**
 * Reads MSH 2.2 and 4.1, text and binary. Physical surfaces become zones, physical curves named
 * edges. Points are ignored; volumes and cells of second order are refused.
 */
public final class GmshReader {
  private static final String INTEGER = "an integer";
  private static final String REAL = "a number";
  private static final Map<Integer, Integer> CORNERS = Map.of(15, 1, 1, 2, 2, 3, 3, 4);

  private final ByteCursor in;
  private final ImportOptions options;
  private final Cells cells = new Cells();
  private final Map<Long, Integer> nodeOfTag = new HashMap<>();
  private final Map<Long, String> physicalName = new TreeMap<>();
  private final Map<Long, int[]> physicalOfEntity = new HashMap<>();
  private boolean binary;
  private boolean four;

  private GmshReader(ByteCursor in, ImportOptions options) {
    this.in = in;
    this.options = options;
  }

  /**
   * The mesh in {@code file}.
   *
   * @throws MeshFileException if it is not such a file, is damaged, or names are missing
   * @throws IOException if it cannot be read
   */
  public static Mesh read(Path file, ImportOptions options) throws IOException {
    ByteCursor in = new ByteCursor(file.toString(), ByteCursor.load(file));
    return new GmshReader(in, options).read();
  }

  private Mesh read() throws MeshFileException {
    if (!in.line().equals("$MeshFormat")) {
      throw in.faultAt(0, "no MSH file: it does not begin with $MeshFormat", "name an MSH file");
    }
    double version = in.realWord("the version of the format");
    four = version == 4.1;
    if (!four && version != 2.2) {
      throw in.fault(
          "MSH version " + version + "; 2.2 and 4.1 are read",
          "write the file with Mesh.MshFileVersion = 4.1");
    }
    binary = in.integerWord("the kind of file") == 1;
    long size = in.integerWord("the size of a number");
    in.line();
    if (size != 8) {
      throw in.fault("numbers of " + size + " bytes; 8 are read", "write the file on 64 bits");
    }
    if (binary) {
      int one = in.int32("the number one");
      if (one != 1 && Integer.reverseBytes(one) != 1) {
        throw in.fault("the byte order cannot be told", ByteCursor.WRITE_AGAIN);
      }
      in.order(one == 1 ? ByteOrder.LITTLE_ENDIAN : ByteOrder.BIG_ENDIAN);
    }
    in.skipPast("$EndMeshFormat");
    boolean nodes = false;
    boolean elements = false;
    while (in.remaining() > 0) {
      String section = in.line();
      if (section.isEmpty()) {
        continue;
      }
      if (!section.startsWith("$") || section.length() > 64) {
        throw in.fault("a section should begin here", ByteCursor.WRITE_AGAIN);
      }
      switch (section) {
        case "$PhysicalNames" -> physicalNames();
        case "$Entities" -> entities();
        case "$Period" -> cells.period = in.realWord(REAL);
        case "$Nodes" -> {
          nodes = true;
          if (four) {
            nodes4();
          } else {
            nodes2();
          }
        }
        case "$Elements" -> {
          elements = true;
          if (four) {
            elements4();
          } else if (binary) {
            elements2Binary();
          } else {
            elements2();
          }
        }
        default -> {
          // sections this reader has no use for
        }
      }
      if (!in.skipPast("$End" + section.substring(1))) {
        throw in.fault("section " + section + " does not end", ByteCursor.WRITE_AGAIN);
      }
      in.line();
    }
    if (!nodes || !elements) {
      throw in.fault("the file has no " + (nodes ? "elements" : "nodes"), ByteCursor.WRITE_AGAIN);
    }
    return Assembly.mesh(cells, options, in);
  }

  private int integer() throws MeshFileException {
    return binary ? in.int32(INTEGER) : (int) in.integerWord(INTEGER);
  }

  private long size() throws MeshFileException {
    return binary ? in.int64(INTEGER) : in.integerWord(INTEGER);
  }

  private double real() throws MeshFileException {
    return binary ? in.float64(REAL) : in.realWord(REAL);
  }

  private int count(long stated, int binaryBytes, String of) throws MeshFileException {
    return in.count(stated, binary ? binaryBytes : 2, of);
  }

  private void physicalNames() throws MeshFileException {
    int n = in.count(in.integerWord("the number of names"), 5, "names");
    in.line();
    for (int i = 0; i < n; i++) {
      String line = in.line();
      String[] words = line.split("\\s+", 3);
      boolean quoted = words.length == 3 && words[2].matches("\".*\"");
      if (!quoted || !words[0].matches("[0-3]") || !words[1].matches("-?\\d{1,9}")) {
        throw in.fault(
            "a name should read: dimension, number, \"name\"; found " + line,
            ByteCursor.WRITE_AGAIN);
      }
      int dimension = Integer.parseInt(words[0]);
      String name = words[2].substring(1, words[2].length() - 1);
      physicalName.put(key(dimension, Integer.parseInt(words[1])), name);
      if (dimension == 1 || dimension == 2) {
        (dimension == 2 ? cells.declaredZones : cells.declaredEdges).add(name);
      }
    }
  }

  private void entities() throws MeshFileException {
    int[] counts = new int[4];
    for (int d = 0; d < 4; d++) {
      counts[d] = count(size(), d == 0 ? 36 : 68, "entities");
    }
    for (int d = 0; d < 4; d++) {
      for (int i = 0; i < counts[d]; i++) {
        int tag = integer();
        for (int k = 0; k < (d == 0 ? 3 : 6); k++) {
          real();
        }
        int[] groups = new int[count(size(), 4, "groups")];
        for (int k = 0; k < groups.length; k++) {
          groups[k] = Math.abs(integer());
        }
        // Gmsh lists a group twice for a curve that an operation made anew
        physicalOfEntity.put(key(d, tag), Arrays.stream(groups).distinct().toArray());
        for (int k = d == 0 ? 0 : count(size(), 4, "bounding entities"); k > 0; k--) {
          integer();
        }
      }
    }
  }

  private void nodes2() throws MeshFileException {
    int n = count(in.integerWord("the number of nodes"), 28, "nodes");
    in.line();
    for (int i = 0; i < n; i++) {
      long tag = integer();
      node(tag, in.position(), new double[] {real(), real(), real()});
    }
  }

  private void nodes4() throws MeshFileException {
    int blocks = count(size(), 20, "blocks");
    long all = size();
    count(all, 32, "nodes");
    size();
    size();
    for (int b = 0; b < blocks; b++) {
      int dimension = integer();
      integer();
      int parameters = integer() == 1 ? dimension : 0;
      int n = count(size(), 32, "nodes");
      long[] tags = new long[n];
      for (int i = 0; i < n; i++) {
        tags[i] = size();
      }
      for (int i = 0; i < n; i++) {
        node(tags[i], in.position(), new double[] {real(), real(), real()});
        for (int k = 0; k < parameters; k++) {
          real();
        }
      }
    }
  }

  private void node(long tag, int position, double[] p) throws MeshFileException {
    for (double value : p) {
      if (!Double.isFinite(value)) {
        throw in.faultAt(
            position, "node " + tag + " has the coordinate " + value, ByteCursor.WRITE_AGAIN);
      }
    }
    if (nodeOfTag.put(tag, cells.point(p[0], p[1], p[2])) != null) {
      throw in.faultAt(position, "node " + tag + " stands twice", ByteCursor.WRITE_AGAIN);
    }
  }

  private void elements2() throws MeshFileException {
    int n = count(in.integerWord("the number of elements"), 12, "elements");
    for (int i = 0; i < n; i++) {
      in.integerWord("the number of an element");
      int position = in.position();
      int type = integer();
      int tags = in.count(in.integerWord("the number of tags"), 2, "tags");
      int physical = 0;
      for (int k = 0; k < tags; k++) {
        int tag = integer();
        physical = k == 0 ? tag : physical;
      }
      element(type, position, physical);
    }
  }

  private void elements2Binary() throws MeshFileException {
    int n = in.count(in.integerWord("the number of elements"), 8, "elements");
    in.line();
    for (int i = 0; i < n; ) {
      int type = in.int32("a type");
      int block = in.count(in.int32("a number of elements"), 8, "elements");
      int tags = in.count(in.int32("a number of tags"), 4, "tags");
      if (block == 0) {
        throw in.fault("an empty block of elements", ByteCursor.WRITE_AGAIN);
      }
      for (int e = 0; e < block; e++) {
        int position = in.position();
        in.int32("the number of an element");
        int physical = 0;
        for (int k = 0; k < tags; k++) {
          int tag = in.int32("a tag");
          physical = k == 0 ? tag : physical;
        }
        element(type, position, physical);
      }
      i += block;
    }
  }

  private void elements4() throws MeshFileException {
    int blocks = count(size(), 20, "blocks");
    count(size(), 16, "elements");
    size();
    size();
    for (int b = 0; b < blocks; b++) {
      int dimension = integer();
      int entity = integer();
      int type = integer();
      int n = count(size(), 16, "elements");
      int[] groups = physicalOfEntity.getOrDefault(key(dimension, entity), new int[0]);
      if (groups.length > 1 && (dimension == 1 || dimension == 2)) {
        List<String> names = new ArrayList<>();
        for (int group : groups) {
          names.add("'" + physicalName.getOrDefault(key(dimension, group), "" + group) + "'");
        }
        throw in.fault(
            (dimension == 2 ? "surface " : "curve ")
                + entity
                + " is in several groups: "
                + String.join(", ", names),
            "put every surface and every curve into one group only");
      }
      for (int i = 0; i < n; i++) {
        int position = in.position();
        size();
        element(type, position, groups.length == 0 ? 0 : groups[0]);
      }
    }
  }

  private void element(int type, int position, int physical) throws MeshFileException {
    Integer corners = CORNERS.get(type);
    if (corners == null) {
      throw in.faultAt(
          position,
          "elements of type " + type + "; lines (1), triangles (2) and quadrangles (3) are read",
          "write a plane mesh of first order (Mesh.ElementOrder = 1)");
    }
    int[] nodes = new int[corners];
    for (int k = 0; k < corners; k++) {
      long tag = four ? size() : integer();
      Integer node = nodeOfTag.get(tag);
      if (node == null) {
        throw in.faultAt(position, "node " + tag + " does not exist", ByteCursor.WRITE_AGAIN);
      }
      nodes[k] = node;
    }
    if (corners > 1) {
      cells.cell(position, name(corners, physical, position), nodes);
    }
  }

  private String name(int corners, int physical, int position) throws MeshFileException {
    if (physical == 0) {
      return null;
    }
    int dimension = corners == 2 ? 1 : 2;
    String inFile = physicalName.get(key(dimension, physical));
    Map<Integer, String> given = dimension == 2 ? options.names().zones() : options.names().edges();
    String name = inFile != null ? inFile : given.get(physical);
    if (name == null) {
      throw in.faultAt(
          position,
          (dimension == 2 ? "physical surface " : "physical curve ")
              + physical
              + " has no name; names in the file are "
              + physicalName.values(),
          "name it, say Physical " + (dimension == 2 ? "Surface" : "Curve") + "(\"chamber\")");
    }
    return name;
  }

  private static long key(int dimension, int tag) {
    return ((long) dimension << 32) | (tag & 0xffffffffL);
  }
}
