package org.annulet.mesher.geometry;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.annulet.mesher.geometry.GeometryFault.Fault;
import org.annulet.mesher.geometry.GeometryFault.Kind;
import org.junit.jupiter.api.Test;

class OutlineTest {
  private static Outline.Builder square() {
    return Outline.builder()
        .point("a", 0, 0)
        .point("b", 1, 0)
        .point("c", 1, 1)
        .point("d", 0, 1)
        .line("floor", "a", "b")
        .line("exit", "b", "c")
        .line("roof", "c", "d")
        .line("inlet", "d", "a");
  }

  private static List<Fault> faults(Outline.Builder b) {
    GeometryFault f = catchThrowableOfType(GeometryFault.class, b::build);
    assertThat(f).isNotNull();
    assertThat(f.faults()).allMatch(x -> !x.mend().isBlank());
    assertThat(f.getMessage()).contains("mend:");
    return f.faults();
  }

  @Test
  void edgesMayRunEitherWay_andGasLiesOnTheRightHand() {
    Outline o =
        Outline.builder()
            .point("a", 0, 0)
            .point("b", 1, 0)
            .point("c", 1, 1)
            .point("d", 0, 1)
            .line("floor", "b", "a")
            .line("exit", "b", "c")
            .line("roof", "d", "c")
            .line("inlet", "d", "a")
            .zone("gas", "exit", "roof", "inlet", "floor")
            .build();
    assertThat(o.area(0)).isCloseTo(1, within(1e-15));
    assertThat(o.rightZone(0)).isZero();
    assertThat(o.leftZone(0)).isEqualTo(-1);
    assertThat(o.leftZone(1)).isZero();
  }

  @Test
  void discOfTwoArcs_hasAreaPi() {
    Outline o =
        Outline.builder()
            .point("e", 3, 2)
            .point("n", 2, 3)
            .point("w", 1, 2)
            .point("s", 2, 1)
            .arc("upper", "e", "n", "w")
            .arc("lower", "w", "s", "e")
            .zone("gas", "upper", "lower")
            .build();
    assertThat(o.area(0)).isCloseTo(Math.PI, within(1e-13));
    assertThat(o.edge("upper").length()).isCloseTo(Math.PI, within(1e-12));
  }

  @Test
  void splineThroughPointsOfACircle_isNearlyTheCircle() {
    int n = 24;
    Outline.Builder b = Outline.builder();
    String[] names = new String[n + 1];
    for (int i = 0; i < n; i++) {
      names[i] = "p" + i;
      b.point(names[i], Math.cos(2 * Math.PI * i / n), Math.sin(2 * Math.PI * i / n));
    }
    names[n] = "p0";
    Outline o = b.curve("wall", names).zone("gas", "wall").build();
    // A cubic spline is of order h⁴: (π/12)⁴ = 0.005, with a constant of about 1/1000.
    assertThat(o.area(0)).isCloseTo(Math.PI, within(5e-5));
  }

  @Test
  void crossingEdges_areNamedWithTheirPlace() {
    List<Fault> f =
        faults(
            Outline.builder()
                .point("a", 0, 0)
                .point("b", 1, 1)
                .point("c", 1, 0)
                .point("d", 0, 1)
                .line("up", "a", "b")
                .line("right", "b", "c")
                .line("down", "c", "d")
                .line("left", "d", "a")
                .zone("bow tie", "up", "right", "down", "left"));
    assertThat(f)
        .anySatisfy(
            x -> {
              assertThat(x.kind()).isEqualTo(Kind.CROSSING);
              assertThat(x.what()).contains("'up'").contains("'down'");
              assertThat(x.x()).isCloseTo(0.5, within(1e-12));
              assertThat(x.y()).isCloseTo(0.5, within(1e-12));
            });
  }

  @Test
  void arcThatCutsAWall_isACrossing_andOneThatGrazesItATouch() {
    for (double top : new double[] {0.6, 0.5}) {
      List<Fault> f =
          faults(
              square()
                  .point("p", 0.3, 0.7)
                  .point("q", 0.5, 0.5 - (top - 0.5))
                  .point("r", 0.7, 0.7)
                  .line("lid", "p", "r")
                  .arc("bowl", "p", "q", "r")
                  .zone("hole", "lid", "bowl")
                  .point("m", 0, 0.5)
                  .point("n", 1, 0.5)
                  .line("middle", "m", "n")
                  .zone("gas", "floor", "exit", "roof", "inlet"));
      assertThat(f).anyMatch(x -> x.what().contains("'bowl' and 'middle'"));
    }
  }

  @Test
  void pointOnAnotherEdge_isATouch() {
    List<Fault> f =
        faults(
            square()
                .point("p", 0.5, 0)
                .point("q", 0.6, 0.3)
                .point("r", 0.4, 0.3)
                .line("tip", "p", "q", "r", "p")
                .zone(
                    new Zone(
                        "gas",
                        List.of("floor", "exit", "roof", "inlet"),
                        List.of(List.of("tip")))));
    assertThat(f)
        .anyMatch(
            x ->
                x.kind() == Kind.TOUCHING
                    && x.what().contains("'floor'")
                    && x.what().contains("'tip'"));
  }

  @Test
  void openLoop_namesTheGap() {
    List<Fault> f = faults(square().zone("gas", "floor", "exit", "inlet"));
    assertThat(f.get(0).kind()).isEqualTo(Kind.OPEN);
    assertThat(f.get(0).what()).contains("exit").contains("inlet").contains("'c'");
  }

  @Test
  void twoZonesOnOneSide_andZoneInsideZone_overlap() {
    assertThat(
            faults(
                square()
                    .zone("one", "floor", "exit", "roof", "inlet")
                    .zone("two", "floor", "exit", "roof", "inlet")))
        .anyMatch(
            f ->
                f.kind() == Kind.OVERLAP
                    && f.what().contains("'one'")
                    && f.what().contains("'two'"));
    Outline.Builder inner =
        square()
            .point("p", 0.4, 0.4)
            .point("q", 0.6, 0.4)
            .point("r", 0.5, 0.6)
            .line("island", "p", "q", "r", "p")
            .zone("one", "floor", "exit", "roof", "inlet")
            .zone("two", "island");
    assertThat(faults(inner)).anyMatch(f -> f.kind() == Kind.OVERLAP && f.mend().contains("holes"));
  }

  @Test
  void holeOutsideItsZone_leaks() {
    assertThat(
            faults(
                square()
                    .point("p", 2, 0)
                    .point("q", 3, 0)
                    .point("r", 2, 1)
                    .line("island", "p", "q", "r", "p")
                    .zone(
                        new Zone(
                            "gas",
                            List.of("floor", "exit", "roof", "inlet"),
                            List.of(List.of("island"))))))
        .anyMatch(f -> f.kind() == Kind.LEAK && f.what().contains("'gas'"));
  }

  @Test
  void unusedEdge_zeroLength_wrongNamesAndTwinPoints_areAllReported() {
    assertThat(
            faults(
                square()
                    .point("e", 0.5, 0.5)
                    .line("stray", "d", "e")
                    .zone("gas", "floor", "exit", "roof", "inlet")))
        .anyMatch(f -> f.kind() == Kind.USE && f.what().contains("'stray'"));
    List<Fault> f =
        faults(
            square()
                .line("nothing", "a", "a")
                .line("lost", "a", "x")
                .arc("flat", "a", "b", "a")
                .point("e", 1, 1)
                .point("f", Double.NaN, 0)
                .line("floor", "a", "c"));
    assertThat(f)
        .extracting(Fault::kind)
        .contains(Kind.ZERO_LENGTH, Kind.NAME, Kind.TOUCHING, Kind.VALUE);
    assertThat(f).hasSizeGreaterThanOrEqualTo(6);
  }
}
