package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.solver.network.DuctChain;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The chain of ducts a case becomes, against the finite elements of the same case. */
class ChainOfCaseTest {
  private static final String DUCT =
      """
      annulet: 1
      title: straight duct of two gases with flame, loss and lossy end
      geometry:
        kind: plane
        depth: 100 mm
        mesh_size: 10 mm
        points: {a: [0, 0, mm], b: [300, 0, mm], c: [1000, 0, mm], d: [1000, 20, mm], e: [300, 20, mm], f: [0, 20, mm]}
        edges:
          roof: {line: [e, f]}
          inlet: {line: [f, a]}
          floor: {line: [a, b]}
          sheet: {line: [b, e]}
          below: {line: [b, c]}
          outlet: {line: [c, d]}
          above: {line: [d, e]}
        zones:
          up: {boundary: [roof, inlet, floor, sheet]}
          down: {boundary: [below, outlet, above, sheet]}
      gas:
        mean_pressure: 1 bar
        zones:
          up: {temperature: 300 K, gamma: 1.4, gas_constant: 287 J/(kg K)}
          down: {temperature: 1500 K, gamma: 1.3, gas_constant: 290 J/(kg K)}
      walls: {outlet: {impedance: [3, 1]}}
      two_ports: {sheet: {loss_coefficient: 2, velocity: 10 m/s, flow_from: up}}
      flames:
        main:
          heat_release: 800 W
          place: {sheet: sheet}
          reference: {edge: sheet, flow_from: up}
          reference_velocity: 1 m/s
          response: {gain: 0.4, delay: 3 ms}
      window: {frequency: [30 Hz, 900 Hz], growth_rate: [-400, 400, 1/s]}
      """;

  @TempDir private Path folder;

  private CaseFile read(String text) throws Exception {
    return CaseReader.read(Files.writeString(folder.resolve("case.yaml"), text)).orThrow();
  }

  /**
   * Eigenvalues of the chain without near fields, as often as the chamber has them, by frequency.
   */
  private static List<Complex> chain(CaseFile c) {
    ChainOfCase.Chain chain =
        ChainOfCase.of(c, CaseProblem.on(c, ChamberShape.of(c))).chain().orElseThrow();
    List<Complex> all = new ArrayList<>();
    for (int m : chain.orders()) {
      DuctChain.Roots roots = chain.plain().roots(c.window(), m);
      assertThat(roots.complete()).isTrue();
      for (Complex s : roots.s()) {
        all.addAll(Collections.nCopies(m == 0 ? 1 : 2, s));
      }
    }
    all.sort(Comparator.comparingDouble(Complex::getImaginary));
    return all;
  }

  private static List<ModeEntry> modes(CaseFile c) {
    return new ModesStudy(c, Progress.SILENT).modesOnly().run("test").results().modes();
  }

  @Test
  void straightDuct_agreesWithTheFiniteElementsWithinTheirErrorBars() throws Exception {
    CaseFile c = read(DUCT);

    List<Complex> chain = chain(c);
    List<ModeEntry> modes = modes(c);

    assertThat(chain).hasSameSizeAs(modes).hasSizeGreaterThan(2);
    for (int i = 0; i < modes.size(); i++) {
      var view = modes.get(i).view();
      double f = chain.get(i).getImaginary() / (2 * Math.PI);
      assertThat(view.mode().frequency()).isCloseTo(f, within(view.frequencyError() + 1e-6));
      assertThat(view.mode().growthRate())
          .isCloseTo(chain.get(i).getReal(), within(view.growthError() + 1e-6));
    }
  }

  @Test
  void liningAlongTheDuct_isCarriedToo() throws Exception {
    CaseFile c = read(DUCT.replace("[3, 1]}", "[3, 1]}, roof: {admittance: 0.01}"));

    List<ModeEntry> modes = modes(c);
    List<Complex> chain = chain(c);

    assertThat(chain).hasSameSizeAs(modes);
    for (int i = 0; i < modes.size(); i++) {
      var view = modes.get(i).view();
      // the field across 20 mm of height is not quite even beside a lining: (kh)² y/3
      assertThat(view.mode().growthRate())
          .isCloseTo(chain.get(i).getReal(), within(2 * view.growthError() + 0.02));
    }
  }

  @Test
  void shippedRing_hasTheSameModes_wherePlaneAndAzimuthalWavesCarryThem() throws Exception {
    String text = Files.readString(Path.of("hydrogen-ring/case.yaml"));
    CaseFile c =
        read(
            text.replace("mesh_size: 12 mm", "mesh_size: 30 mm")
                .replace("burners: 6 mm", "burners: 12 mm"));

    List<Complex> chain = chain(c);
    List<ModeEntry> modes = modes(c);

    assertThat(chain).hasSameSizeAs(modes);
    for (ModeEntry m : modes) {
      double f = m.view().mode().frequency();
      double g = m.view().mode().growthRate();
      double nearest =
          chain.stream()
              .mapToDouble(
                  r -> Math.hypot(r.getImaginary() / (2 * Math.PI) - f, (r.getReal() - g) / 20))
              .min()
              .orElseThrow();
      // what the end corrections of 14 ducts of 52 mm in annuli of 80 and 115 mm cost
      assertThat(nearest).isLessThan(0.02 * f);
    }
  }

  @Test
  void bentSection_isNoChain_andSaysWhy() throws Exception {
    CaseFile c = CaseReader.read(Path.of("reverse-flow")).orThrow();

    ChainOfCase.Outcome outcome = ChainOfCase.of(c, CaseProblem.on(c, ChamberShape.of(c)));

    assertThat(outcome.chain()).isEmpty();
    assertThat(outcome.whyNot()).contains("zone");
  }
}
