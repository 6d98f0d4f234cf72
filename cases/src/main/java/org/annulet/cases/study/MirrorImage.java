package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;

/**
 * The mirror image of a field on a ring, about the centre line of burner 1: turns a wave that runs
 * one way round into the one that runs the other way.
 */
final class MirrorImage {
  private final int[] image;

  MirrorImage(RingCells cells) {
    Mesh mesh = cells.whole();
    List<List<Integer>> images = new ArrayList<>();
    for (int h = 0; h < cells.half().nodeCount(); h++) {
      images.add(new ArrayList<>());
    }
    for (int v = 0; v < mesh.nodeCount(); v++) {
      images.get(cells.halfNode()[v]).add(v);
    }
    image = new int[mesh.nodeCount()];
    double zero = 1e-9 * mesh.period();
    for (List<Integer> same : images) {
      // The arcs y of the images of one node of the half cell are their own mirror image: y = 0
      // maps to itself, the k-th of the
      // others to the k-th last.
      same.sort(Comparator.comparingDouble(mesh::y));
      int first = 0;
      if (!same.isEmpty()
          && Math.min(mesh.y(same.get(0)), mesh.period() - mesh.y(same.get(0))) < zero) {
        image[same.get(0)] = same.get(0);
        first = 1;
      }
      for (int k = first; k < same.size(); k++) {
        image[same.get(k)] = same.get(same.size() - 1 - (k - first));
      }
    }
  }

  /** The mirrored values, a new array. */
  double[] of(double[] values) {
    double[] out = new double[values.length];
    for (int v = 0; v < out.length; v++) {
      out[v] = values[image[v]];
    }
    return out;
  }
}
