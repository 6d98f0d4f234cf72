package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.snakeyaml.engine.v2.common.ScalarStyle;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;
import org.snakeyaml.engine.v2.nodes.SequenceNode;

/** Replaces values in a tree by the path of their key; the tree itself is left as it is. */
final class TreeChange {
  private final Entry change;

  private TreeChange(Entry change) {
    this.change = change;
  }

  /**
   * A copy of the tree with one value replaced, or added to a mapping that lacks the last key.
   *
   * @param root the tree
   * @param path key path, as in {@code flames.main.response.delay}
   * @param change the new value, also the place of faults
   */
  static Node replaced(Node root, String path, Entry change) {
    return new TreeChange(change).replace(root, path, path).orElse(root);
  }

  private Optional<Node> replace(Node node, String rest, String path) {
    if (node instanceof MappingNode map) {
      return mapping(map, rest, path);
    }
    if (node instanceof SequenceNode list) {
      return list(list, rest, path);
    }
    change.fault("'" + path + "' leads into a single value", "end the path before '" + rest + "'");
    return Optional.empty();
  }

  private Optional<Node> mapping(MappingNode map, String rest, String path) {
    List<NodeTuple> tuples = new ArrayList<>(map.getValue());
    int best = -1;
    String bestKey = "";
    List<String> known = new ArrayList<>();
    for (int i = 0; i < tuples.size(); i++) {
      String key = tuples.get(i).getKeyNode() instanceof ScalarNode k ? k.getValue() : "";
      known.add(key);
      if ((rest.equals(key) || rest.startsWith(key + ".")) && key.length() > bestKey.length()) {
        best = i;
        bestKey = key;
      }
    }
    if (best < 0) {
      if (rest.indexOf('.') >= 0) {
        String first = rest.substring(0, rest.indexOf('.'));
        change.fault(
            "no key '" + first + "' on the way of '" + path + "'", Nearest.advice(first, known));
        return Optional.empty();
      }
      Node key =
          new ScalarNode(
              change.node().getTag(),
              true,
              rest,
              ScalarStyle.PLAIN,
              change.node().getStartMark(),
              change.node().getEndMark());
      tuples.add(new NodeTuple(key, change.node()));
      return Optional.of(copy(map, tuples));
    }
    NodeTuple old = tuples.get(best);
    Optional<Node> value =
        rest.equals(bestKey)
            ? Optional.of(change.node())
            : replace(old.getValueNode(), rest.substring(bestKey.length() + 1), path);
    if (value.isEmpty()) {
      return Optional.empty();
    }
    tuples.set(best, new NodeTuple(old.getKeyNode(), value.get()));
    return Optional.of(copy(map, tuples));
  }

  private static Node copy(MappingNode map, List<NodeTuple> tuples) {
    return new MappingNode(
        map.getTag(), true, tuples, map.getFlowStyle(), map.getStartMark(), map.getEndMark());
  }

  private Optional<Node> list(SequenceNode list, String rest, String path) {
    List<Node> items = new ArrayList<>(list.getValue());
    List<String> known = new ArrayList<>();
    for (int i = 0; i < items.size(); i++) {
      String name = YamlPath.itemName(items.get(i), i + 1);
      known.add(name);
      boolean last = rest.equals(name);
      if (!last && !rest.startsWith(name + ".")) {
        continue;
      }
      Optional<Node> value =
          last
              ? Optional.of(change.node())
              : replace(items.get(i), rest.substring(name.length() + 1), path);
      if (value.isEmpty()) {
        return Optional.empty();
      }
      items.set(i, value.get());
      return Optional.of(
          new SequenceNode(
              list.getTag(),
              true,
              items,
              list.getFlowStyle(),
              list.getStartMark(),
              list.getEndMark()));
    }
    String first = rest.replaceFirst("\\..*", "");
    change.fault(
        "no item '" + first + "' on the way of '" + path + "'", Nearest.advice(first, known));
    return Optional.empty();
  }
}
