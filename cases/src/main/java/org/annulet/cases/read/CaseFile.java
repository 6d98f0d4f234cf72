package org.annulet.cases.read;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.OptionalInt;
import org.annulet.solver.modes.Window;

/**
 * A case, checked and in SI.
 *
 * @param file the case file
 * @param title one line
 * @param about free text; may be empty
 * @param geometry shape of the gas
 * @param gas the gas in it
 * @param walls by edge or face name, in the order of the file; others are rigid
 * @param twoPorts losses across inner edges, in the order of the file; may be empty
 * @param dampers at their places, in the order of the file; may be empty
 * @param flames in the order of the file; may be empty
 * @param window where modes are wanted
 * @param azimuthalOrders orders m wanted on a section, increasing; empty for other kinds
 * @param studies what-ifs asked for
 * @param outputs which files are written beside the tables
 * @param variants the same case with some values changed; may be empty
 * @param source where each value was read, and the text
 */
public record CaseFile(
    Path file,
    String title,
    String about,
    Geometry geometry,
    Gas gas,
    Map<String, Wall> walls,
    List<TwoPort> twoPorts,
    List<Damper> dampers,
    List<Flame> flames,
    Window window,
    List<Integer> azimuthalOrders,
    Studies studies,
    Outputs outputs,
    List<Variant> variants,
    CaseSource source) {

  /**
   * Which files are written beside the tables.
   *
   * @param fieldFiles most modes whose field is written, those growing fastest first
   * @param cycles most modes whose motion over one cycle is written, those growing fastest first;
   *     empty for every mode that grows
   * @param shapesAlong edges along which mode shapes are tabulated; empty for the usual ones
   */
  public record Outputs(int fieldFiles, OptionalInt cycles, List<String> shapesAlong) {
    /** Everything, as where the case says nothing. */
    static Outputs everything() {
      return new Outputs(Integer.MAX_VALUE, OptionalInt.of(1), List.of());
    }
  }

  /**
   * The case with some values changed.
   *
   * @param name of the variant
   * @param about free text; may be empty
   * @param caseFile the changed case; has no variants itself
   */
  public record Variant(String name, String about, CaseFile caseFile) {}

  /** The same case with other dampers and no variants. */
  public CaseFile withDampers(List<Damper> others) {
    return new CaseFile(
        file,
        title,
        about,
        geometry,
        gas,
        walls,
        twoPorts,
        List.copyOf(others),
        flames,
        window,
        azimuthalOrders,
        studies,
        outputs,
        List.of(),
        source);
  }

  /** The wall of an edge or face; rigid when the case file does not name it. */
  public Wall wall(String edge) {
    return walls.getOrDefault(edge, new Wall.Rigid());
  }

  /**
   * The same case with some values replaced, without variants; the file itself is not read again.
   *
   * @param changes new text by key path, as in {@code flames.main.response.delay} → {@code 2.1 ms}
   */
  public Reading with(Map<String, String> changes) {
    return source.again().apply(changes);
  }

  /** What was understood, line by line, every dimensional value in SI beside its source text. */
  public List<String> echo() {
    return CaseEcho.lines(this);
  }
}
