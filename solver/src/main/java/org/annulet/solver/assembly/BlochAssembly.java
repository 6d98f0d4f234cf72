package org.annulet.solver.assembly;

import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;

/**
 * A symmetric ring of N burners as N/2 + 1 small problems on its half cell, one per Bloch number q:
 * from cell to cell the field turns by e^{2πiq/N}. The modes of q and N − q are a degenerate pair
 * of the ring, so each mode of 0 &lt; q &lt; N/2 counts twice; the second is its mirror image.
 * Thread-safe.
 */
public final class BlochAssembly {
  private final Setup setup;
  private final Ring ring;
  private final RingCells cells;
  private final boolean[] mirror;
  private final boolean[] seam;
  private Assembler general;

  BlochAssembly(Setup setup, Ring ring, RingCells cells) {
    this.setup = setup;
    this.ring = ring;
    this.cells = cells;
    mirror = new boolean[setup.nodes().nodeCount()];
    seam = new boolean[setup.nodes().nodeCount()];
    setup.mark(RingCells.MIRROR, mirror);
    setup.mark(RingCells.SEAM, seam);
  }

  /** Largest Bloch number, N/2 rounded down; the smallest is 0. */
  public int largestNumber() {
    return cells.count() / 2;
  }

  /** How many modes of the ring stand behind each mode of q: 1 for 0 and N/2, else 2. */
  public int multiplicity(int q) {
    return q == 0 || 2 * q == cells.count() ? 1 : 2;
  }

  /**
   * The problem of Bloch number q; its fields are expanded on the whole ring.
   *
   * @param q from 0 to {@link #largestNumber()}
   */
  public AssembledProblem number(int q) {
    if (q < 0 || q > largestNumber()) {
      throw new IllegalArgumentException(
          "Bloch number must lie in 0 to " + largestNumber() + ", got " + q);
    }
    Cell cell = setup.cell(q, () -> cell(q));
    return new AssembledProblem(
        setup.operator(setup.matrices(cell.assembler), 0, 0),
        cells.whole(),
        ring,
        (re, im) -> expand(q, cell.even, cell.odd, re, im));
  }

  /** Unknowns of a Bloch number and what is assembled on them. */
  private record Cell(UnknownMap even, UnknownMap odd, Assembler assembler) {}

  private Cell cell(int q) {
    boolean symmetric = multiplicity(q) == 1;
    double cos = !symmetric ? Math.cos(Math.PI * q / cells.count()) : q == 0 ? 1 : 0;
    double sin = !symmetric ? Math.sin(Math.PI * q / cells.count()) : q == 0 ? 0 : 1;
    boolean[] zero = setup.eliminated(Setup.Axis.FREE);
    int n = zero.length;
    UnknownMap even = new UnknownMap(new int[n], new double[n]);
    UnknownMap odd = new UnknownMap(new int[n], new double[n]);
    int size = 0;
    for (int v = 0; v < n; v++) {
      even.unknown()[v] = -1;
      odd.unknown()[v] = -1;
      if (zero[v]) {
        continue;
      }
      if (seam[v]) {
        even.unknown()[v] = cos == 0 ? -1 : size;
        odd.unknown()[v] = sin == 0 ? -1 : size;
        size++;
      } else {
        even.unknown()[v] = size++;
        odd.unknown()[v] = mirror[v] ? -1 : size++;
      }
      even.factor()[v] = seam[v] ? cos : 1;
      odd.factor()[v] = seam[v] ? sin : 1;
    }
    return new Cell(even, odd, assembler(symmetric, size, even, odd));
  }

  private synchronized Assembler assembler(
      boolean symmetric, int size, UnknownMap even, UnknownMap odd) {
    if (symmetric) {
      return setup.assembler(size, even, odd);
    }
    if (general == null) {
      general = setup.assembler(size, even, odd);
    }
    return setup.assembler(general, even, odd);
  }

  private NodalField expand(int q, UnknownMap even, UnknownMap odd, double[] re, double[] im) {
    Mesh whole = cells.whole();
    double[] outRe = new double[whole.nodeCount()];
    double[] outIm = new double[whole.nodeCount()];
    for (int v = 0; v < outRe.length; v++) {
      int h = cells.halfNode()[v];
      double sign = cells.mirrored()[v] ? -1 : 1; // e + i o above the centre line, e − i o below
      double x = even.value(h, re) - sign * odd.value(h, im);
      double y = even.value(h, im) + sign * odd.value(h, re);
      double turn = 2 * Math.PI * Math.floorMod((long) q * cells.cell()[v], cells.count());
      double c = Math.cos(turn / cells.count());
      double s = Math.sin(turn / cells.count());
      outRe[v] = c * x - s * y;
      outIm[v] = s * x + c * y;
    }
    return new NodalField(outRe, outIm);
  }
}
