package org.annulet.mesher.files;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.StringReader;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import javax.xml.XMLConstants;
import javax.xml.parsers.DocumentBuilder;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.xml.sax.InputSource;
import org.xml.sax.SAXException;
import org.xml.sax.SAXParseException;

/**
 * The XML of a .vtu file. Appended raw data is no XML: it is cut off first, and the head closed.
 * Document types, external entities and entity expansion are off.
 */
final class VtuParser {
  private static final byte[] APPENDED = "<AppendedData".getBytes(StandardCharsets.US_ASCII);

  private final String name;
  private final byte[] bytes;
  private VtuArrays arrays;

  VtuParser(String name, byte[] bytes) {
    this.name = name;
    this.bytes = bytes;
  }

  VtuGrid read() throws IOException {
    Element root = root();
    if (!root.getTagName().equals("VTKFile")
        || !root.getAttribute("type").equals("UnstructuredGrid")) {
      throw fault(
          "no unstructured grid: the file holds '"
              + root.getTagName()
              + " "
              + root.getAttribute("type")
              + "'",
          "write the data as an unstructured grid (.vtu)");
    }
    Element grid = child(root, "UnstructuredGrid");
    List<Piece> pieces = new ArrayList<>();
    for (Element e : children(grid, "Piece")) {
      pieces.add(piece(e));
    }
    if (pieces.isEmpty()) {
      throw fault("the grid has no piece", ByteCursor.WRITE_AGAIN);
    }
    return joined(pieces, texts(grid));
  }

  MeshFileException fault(String what, String mend) {
    return new MeshFileException(name, "", what, mend);
  }

  private Element root() throws IOException {
    int cut = ByteCursor.indexOf(bytes, APPENDED, 0);
    byte[] head = bytes;
    byte[] data = new byte[0];
    boolean base64 = false;
    if (cut >= 0) {
      int close = cut;
      while (close < bytes.length && bytes[close] != '>') {
        close++;
      }
      String tag = new String(bytes, cut, close - cut, StandardCharsets.ISO_8859_1);
      base64 = tag.contains("base64");
      int start = close;
      while (start < bytes.length && bytes[start] != '_') {
        start++;
      }
      data = Arrays.copyOfRange(bytes, Math.min(start + 1, bytes.length), bytes.length);
      head = Arrays.copyOf(bytes, cut);
    }
    Document document;
    try {
      DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
      factory.setFeature(XMLConstants.FEATURE_SECURE_PROCESSING, true);
      factory.setFeature("http://apache.org/xml/features/disallow-doctype-decl", true);
      factory.setXIncludeAware(false);
      factory.setExpandEntityReferences(false);
      DocumentBuilder builder = factory.newDocumentBuilder();
      builder.setErrorHandler(null);
      builder.setEntityResolver((p, s) -> new InputSource(new StringReader("")));
      if (cut >= 0) {
        byte[] tail = "</VTKFile>".getBytes(StandardCharsets.US_ASCII);
        byte[] closed = Arrays.copyOf(head, head.length + tail.length);
        System.arraycopy(tail, 0, closed, head.length, tail.length);
        head = closed;
      }
      document = builder.parse(new ByteArrayInputStream(head));
    } catch (SAXParseException e) {
      throw new MeshFileException(
          name, " line " + e.getLineNumber(), "no XML: " + e.getMessage(), ByteCursor.WRITE_AGAIN);
    } catch (SAXException | ParserConfigurationException e) {
      throw fault("no XML: " + e.getMessage(), ByteCursor.WRITE_AGAIN);
    }
    Element root = document.getDocumentElement();
    arrays = new VtuArrays(this, root, data, base64);
    return root;
  }

  private record Piece(
      double[] points,
      int[] corners,
      int[] offsets,
      int[] types,
      Map<String, VtuGrid.Field> pointData,
      Map<String, VtuGrid.Field> cellData) {}

  private Piece piece(Element e) throws MeshFileException {
    int points = count(e, "NumberOfPoints");
    int cells = count(e, "NumberOfCells");
    double[] xyz = arrays.doubles(child(child(e, "Points"), "DataArray"), 3L * points);
    Element topology = child(e, "Cells");
    int[] offsets = null;
    int[] types = null;
    Element connectivity = null;
    for (Element a : children(topology, "DataArray")) {
      switch (a.getAttribute("Name")) {
        case "connectivity" -> connectivity = a;
        case "offsets" -> offsets = arrays.integers(a, cells);
        case "types" -> types = arrays.integers(a, cells);
        default -> {
          // faces of polyhedra and the like
        }
      }
    }
    if (connectivity == null || offsets == null || types == null) {
      throw fault(
          "the cells lack one of the arrays connectivity, offsets, types", ByteCursor.WRITE_AGAIN);
    }
    int last = 0;
    for (int end : offsets) {
      if (end < last) {
        throw fault("the offsets of the cells do not ascend", ByteCursor.WRITE_AGAIN);
      }
      last = end;
    }
    int[] corners = arrays.integers(connectivity, last);
    for (int v : corners) {
      if (v < 0 || v >= points) {
        throw fault("a cell names point " + v + " of " + points, ByteCursor.WRITE_AGAIN);
      }
    }
    return new Piece(
        xyz, corners, offsets, types, fields(e, "PointData", points), fields(e, "CellData", cells));
  }

  private Map<String, VtuGrid.Field> fields(Element piece, String kind, int tuples)
      throws MeshFileException {
    Map<String, VtuGrid.Field> fields = new LinkedHashMap<>();
    for (Element group : children(piece, kind)) {
      for (Element a : children(group, "DataArray")) {
        int components = a.hasAttribute("NumberOfComponents") ? count(a, "NumberOfComponents") : 1;
        if (VtuArrays.isNumeric(a) && components > 0) {
          fields.put(
              a.getAttribute("Name"),
              new VtuGrid.Field(arrays.doubles(a, (long) tuples * components), components));
        }
      }
    }
    return fields;
  }

  /** Lists of words of the whole file. */
  private Map<String, List<String>> texts(Element grid) throws MeshFileException {
    Map<String, List<String>> texts = new LinkedHashMap<>();
    for (Element group : children(grid, "FieldData")) {
      for (Element a : children(group, "*")) {
        if (a.getAttribute("type").equals("String")) {
          texts.put(a.getAttribute("Name"), arrays.words(a));
        }
      }
    }
    return texts;
  }

  private VtuGrid joined(List<Piece> pieces, Map<String, List<String>> texts)
      throws MeshFileException {
    if (pieces.size() == 1) {
      Piece p = pieces.get(0);
      return new VtuGrid(p.points, p.corners, p.offsets, p.types, p.pointData, p.cellData, texts);
    }
    double[] points = new double[0];
    int[] corners = new int[0];
    int[] offsets = new int[0];
    int[] types = new int[0];
    for (Piece p : pieces) {
      int firstPoint = points.length / 3;
      int firstCorner = corners.length;
      points = VtuArrays.joined(points, p.points);
      corners = joined(corners, p.corners, firstPoint);
      offsets = joined(offsets, p.offsets, firstCorner);
      types = joined(types, p.types, 0);
    }
    return new VtuGrid(
        points,
        corners,
        offsets,
        types,
        joined(pieces.stream().map(Piece::pointData).toList()),
        joined(pieces.stream().map(Piece::cellData).toList()),
        texts);
  }

  private static int[] joined(int[] a, int[] b, int shift) {
    int[] all = Arrays.copyOf(a, a.length + b.length);
    for (int i = 0; i < b.length; i++) {
      all[a.length + i] = b[i] + shift;
    }
    return all;
  }

  private Map<String, VtuGrid.Field> joined(List<Map<String, VtuGrid.Field>> parts)
      throws MeshFileException {
    Map<String, VtuGrid.Field> all = new LinkedHashMap<>(parts.get(0));
    for (Map<String, VtuGrid.Field> part : parts.subList(1, parts.size())) {
      if (!part.keySet().equals(all.keySet())) {
        throw fault("the pieces carry different arrays", ByteCursor.WRITE_AGAIN);
      }
      part.forEach(
          (n, f) ->
              all.merge(
                  n,
                  f,
                  (x, y) ->
                      new VtuGrid.Field(VtuArrays.joined(x.values(), y.values()), x.components())));
    }
    return all;
  }

  private int count(Element e, String attribute) throws MeshFileException {
    String text = e.getAttribute(attribute).strip();
    try {
      int n = Integer.parseInt(text);
      // Every point and cell costs at least a few bits of the file, compressed or not.
      if (n >= 0 && n <= 2000L * bytes.length) {
        return n;
      }
    } catch (NumberFormatException ignored) {
      // the same fault
    }
    throw fault(attribute + " is '" + text + "'", ByteCursor.WRITE_AGAIN);
  }

  private Element child(Element e, String tag) throws MeshFileException {
    List<Element> found = children(e, tag);
    if (found.isEmpty()) {
      throw fault("element '" + e.getTagName() + "' has no '" + tag + "'", ByteCursor.WRITE_AGAIN);
    }
    return found.get(0);
  }

  private static List<Element> children(Element e, String tag) {
    List<Element> found = new ArrayList<>();
    for (Node n = e.getFirstChild(); n != null; n = n.getNextSibling()) {
      if (n instanceof Element c && (tag.equals("*") || c.getTagName().equals(tag))) {
        found.add(c);
      }
    }
    return found;
  }
}
