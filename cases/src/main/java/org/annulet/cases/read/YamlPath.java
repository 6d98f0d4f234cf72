package org.annulet.cases.read;

import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;

/** Paths of keys: names joined by points; items of a list by their name, or counted from 1. */
final class YamlPath {
  private YamlPath() {}

  /** Name of a list item: its {@code name}, or its number counted from 1. */
  static String itemName(Node item, int number) {
    if (item instanceof MappingNode map) {
      for (NodeTuple t : map.getValue()) {
        if (t.getKeyNode() instanceof ScalarNode k
            && k.getValue().equals("name")
            && t.getValueNode() instanceof ScalarNode v) {
          return v.getValue();
        }
      }
    }
    return String.valueOf(number);
  }
}
