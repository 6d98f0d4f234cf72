package org.annulet.cases.read;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Compose;
import org.snakeyaml.engine.v2.api.lowlevel.Parse;
import org.snakeyaml.engine.v2.events.Event;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.exceptions.MarkedYamlEngineException;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.SequenceNode;

/**
 * Text of a file to a tree of YAML nodes, within stated limits; faults of the notation only.
 *
 * <p>Depth is checked on the stream of events, before anything recursive sees the text; the size of
 * the tree is checked with every alias written out, by counting each node once.
 */
final class YamlTree {
  static final int MOST_BYTES = 1 << 20;
  static final int DEEPEST = 24;
  static final int MOST_NODES = 100_000;

  private final String file;
  private Problem problem;

  private YamlTree(String file) {
    this.file = file;
  }

  /** The root node, or a problem added to the binder. */
  static Optional<Node> load(Path path, Binder binder) {
    YamlTree tree = new YamlTree(binder.file());
    Optional<Node> root = tree.bytes(path).flatMap(tree::decode).flatMap(tree::compose);
    if (tree.problem != null) {
      binder.add(tree.problem);
      return Optional.empty();
    }
    return root;
  }

  private <T> Optional<T> fail(int line, int column, String what, String mend) {
    problem = new Problem(file, line, column, "", what, mend);
    return Optional.empty();
  }

  private Optional<byte[]> bytes(Path path) {
    try {
      long size = Files.size(path);
      if (size > MOST_BYTES) {
        return fail(
            0,
            0,
            "the file has " + size + " bytes; a case file has at most " + MOST_BYTES,
            "keep tables in files of their own and name them in the case file");
      }
      return Optional.of(Files.readAllBytes(path));
    } catch (IOException e) {
      return fail(0, 0, "cannot be read: " + e.getMessage(), "check the name and the permissions");
    }
  }

  private Optional<String> decode(byte[] bytes) {
    if (bytes.length >= 2
        && ((bytes[0] == (byte) 0xFE && bytes[1] == (byte) 0xFF)
            || (bytes[0] == (byte) 0xFF && bytes[1] == (byte) 0xFE))) {
      return fail(1, 0, "the file is encoded in UTF-16", "save it as UTF-8");
    }
    CharsetDecoder decoder =
        StandardCharsets.UTF_8
            .newDecoder()
            .onMalformedInput(CodingErrorAction.REPORT)
            .onUnmappableCharacter(CodingErrorAction.REPORT);
    ByteBuffer in = ByteBuffer.wrap(bytes);
    CharBuffer out = CharBuffer.allocate(bytes.length + 1);
    CoderResult result = decoder.decode(in, out, true);
    out.flip();
    String text = out.toString();
    if (result.isError()) {
      int line = 1 + (int) text.chars().filter(c -> c == '\n').count();
      return fail(
          line,
          text.length() - text.lastIndexOf('\n'),
          String.format("byte 0x%02X is not UTF-8", bytes[in.position()]),
          "save the file as UTF-8 (° and µ of an older encoding are the usual cause)");
    }
    return Optional.of(text.startsWith("\uFEFF") ? text.substring(1) : text);
  }

  private Optional<Node> compose(String text) {
    LoadSettings settings =
        LoadSettings.builder()
            .setLabel(file)
            .setUseMarks(true)
            .setAllowDuplicateKeys(false)
            .setMaxAliasesForCollections(MOST_NODES)
            .setCodePointLimit(MOST_BYTES)
            .build();
    try {
      if (!shallow(text, settings)) {
        return Optional.empty();
      }
      Optional<Node> root = new Compose(settings).composeString(text);
      if (root.isEmpty()) {
        return fail(0, 0, "the file is empty", "begin with 'annulet: 1' and 'title: …'");
      }
      Size size = size(root.get(), new HashMap<>());
      if (size.nodes > MOST_NODES || size.depth > DEEPEST) {
        return fail(
            0,
            0,
            "aliases (*name) unfold to more than "
                + MOST_NODES
                + " values or "
                + DEEPEST
                + " levels, or hold themselves",
            "write the values out");
      }
      return root;
    } catch (MarkedYamlEngineException e) {
      return syntax(e, text);
    } catch (YamlEngineException e) {
      return fail(
          0,
          0,
          "not YAML: " + String.valueOf(e.getMessage()).replace('\n', ' '),
          "see the format in cases/README.md");
    }
  }

  private boolean shallow(String text, LoadSettings settings) {
    int depth = 0;
    int documents = 0;
    for (Event event : new Parse(settings).parseString(text)) {
      int line = event.getStartMark().map(Mark::getLine).orElse(-1) + 1;
      switch (event.getEventId()) {
        case MappingStart, SequenceStart -> depth++;
        case MappingEnd, SequenceEnd -> depth--;
        case DocumentStart -> documents++;
        default -> {}
      }
      if (depth > DEEPEST) {
        fail(line, 0, "nested more than " + DEEPEST + " levels deep", "close the brackets");
        return false;
      }
      if (documents > 1) {
        fail(line, 0, "a second document begins here (---)", "one file holds one case");
        return false;
      }
    }
    return true;
  }

  private record Size(long nodes, int depth) {}

  /** Size of a node with its aliases written out; a node within itself counts as endless. */
  private static Size size(Node node, Map<Node, Size> known) {
    Size size = known.get(node);
    if (size != null) {
      return size;
    }
    known.put(node, new Size(MOST_NODES + 1L, 0));
    long nodes = 1;
    int depth = 0;
    for (Node child : children(node)) {
      Size s = size(child, known);
      nodes = Math.min(MOST_NODES + 1L, nodes + s.nodes);
      depth = Math.max(depth, s.depth);
    }
    size = new Size(nodes, depth + 1);
    known.put(node, size);
    return size;
  }

  private static List<Node> children(Node node) {
    if (node instanceof SequenceNode list) {
      return list.getValue();
    }
    if (node instanceof MappingNode map) {
      List<Node> both = new ArrayList<>();
      for (NodeTuple t : map.getValue()) {
        both.add(t.getKeyNode());
        both.add(t.getValueNode());
      }
      return both;
    }
    return List.of();
  }

  private Optional<Node> syntax(MarkedYamlEngineException e, String text) {
    Optional<Mark> mark = e.getProblemMark().or(e::getContextMark);
    int line = mark.map(Mark::getLine).orElse(-1) + 1;
    int column = mark.map(Mark::getColumn).orElse(-1) + 1;
    String problem = String.valueOf(e.getProblem());
    String row = line > 0 ? text.lines().skip(line - 1L).findFirst().orElse("") : "";
    if (problem.contains("TAB") || row.matches("\\s*\\t.*")) {
      return fail(line, column, "a tab in the indentation", "indent with spaces");
    }
    String what = "not YAML: " + problem.replace('\n', ' ');
    if (problem.contains("duplicate anchor") || problem.contains("undefined alias")) {
      return fail(line, column, what, "name the anchor (&name) before the alias (*name)");
    }
    return fail(
        line,
        column,
        what,
        "check indentation, brackets, and 'key: value' with a space after the colon");
  }
}
