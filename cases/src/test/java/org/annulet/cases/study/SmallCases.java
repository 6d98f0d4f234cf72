package org.annulet.cases.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;

/** Two small active cases that are solved in a fraction of a second; invented. */
final class SmallCases {
  private static final String DUCT =
      """
      annulet: 1
      title: Duct with a flame
      geometry:
        kind: plane
        depth: 50 mm
        mesh_size: 40 mm
        points_in: mm
        points: {a: [0, 0], b: [300, 0], c: [1000, 0], d: [1000, 60], e: [300, 60], f: [0, 60]}
        edges:
          low1: {line: [a, b]}
          low2: {line: [b, c]}
          outlet: {line: [c, d]}
          up2: {line: [d, e]}
          up1: {line: [e, f]}
          inlet: {line: [f, a]}
          sheet: {line: [b, e]}
        zones:
          cold: {boundary: [low1, sheet, up1, inlet]}
          hot: {boundary: [low2, outlet, up2, sheet]}
      gas:
        mean_pressure: 2 bar
        zones:
          cold: {temperature: 300 K, gamma: 1.4, gas_constant: 287 J/(kg K)}
          hot: {temperature: 1700 K, gamma: 1.3, gas_constant: 287 J/(kg K)}
      walls: {outlet: open}
      flames:
        main:
          heat_release: 9 kW
          place: {sheet: sheet}
          reference: {edge: sheet, flow_from: cold}
          reference_velocity: 8 m/s
          response: {gain: 0.9, delay: 3 ms}
      window: {frequency: [60 Hz, 400 Hz], growth_rate: [-400 1/s, 400 1/s]}
      """;

  private static final String RING =
      """
      annulet: 1
      title: Small ring
      geometry:
        kind: ring
        burner_count: 4
        mesh_size: 60 mm
        zones:
          - {name: plenum,  shape: annulus, mean_radius: 160 mm, gap: 60 mm, length: 120 mm}
          - {name: burners, shape: ducts,   mean_radius: 155 mm, bore: 50 mm, length: 60 mm}
          - {name: chamber, shape: annulus, mean_radius: 150 mm, gap: 80 mm, length: 200 mm}
      gas:
        mean_pressure: 6 bar
        zones:
          plenum:  {temperature: 600 K, gamma: 1.37, gas_constant: 287 J/(kg K)}
          burners: {as: plenum}
          chamber: {temperature: 1700 K, gamma: 1.29, gas_constant: 290 J/(kg K)}
      walls: {chamber.downstream: {admittance: 0.08}}
      flames:
        main:
          heat_release: 1.5 MW
          place: {sheet: burners.outlet}
          reference_velocity: 50 m/s
          response: {gain: 0.8, delay: 1.6 ms}
      window: {frequency: [250 Hz, 500 Hz], growth_rate: [-500 1/s, 500 1/s]}
      """;

  private SmallCases() {}

  /** A plane duct with an n–τ flame at a jump of temperature. */
  static CaseFile duct(Path folder) throws IOException {
    return read(folder.resolve("duct.yaml"), DUCT);
  }

  /** A ring of four burners that are all alike. */
  static CaseFile ring(Path folder) throws IOException {
    return read(folder.resolve("ring.yaml"), RING);
  }

  private static CaseFile read(Path file, String text) throws IOException {
    Files.writeString(file, text);
    return CaseReader.read(file).caseFile().orElseThrow();
  }
}
