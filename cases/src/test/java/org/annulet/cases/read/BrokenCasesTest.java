package org.annulet.cases.read;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Case files spoilt in one place each: the fault names its line, what was read, and the remedy. */
class BrokenCasesTest {
  static final String RING =
      """
      annulet: 1
      title: ring
      geometry:
        kind: ring
        burner_count: 14
        mesh_size: 12 mm
        mesh_size_at: {burners: 6 mm}
        zones:
          - {name: plenum,  shape: annulus, mean_radius: 360 mm, gap: 80 mm,  length: 200 mm}
          - {name: burners, shape: ducts,   mean_radius: 345 mm, bore: 52 mm, length: 100 mm}
          - {name: chamber, shape: annulus, mean_radius: 330 mm, gap: 115 mm, length: 310 mm}
      gas:
        mean_pressure: 12 bar
        zones:
          plenum:  {temperature: 650 K, gamma: 1.37, gas_constant: 287 J/(kg K)}
          burners: {as: plenum}
          chamber: {sound_speed: 820 m/s, density: 2.2 kg/m3}
      walls:
        plenum.upstream: rigid
        chamber.downstream: {impedance: [12, 0]}
      flames:
        main:
          heat_release: 15.5 MW
          place: {sheet: burners.outlet}
          reference: {zone: burners, distance: [20 mm, 60 mm]}
          reference_velocity: 57 m/s
          response: {gain: 0.7, delay: 2.1 ms}
          staging:
            - {burners: [1, 8], gain: 0.5}
            - {burners: every_second, delay: 2.4 ms}
      window:
        frequency: [60 Hz, 1200 Hz]
        growth_rate: [-600, 600, 1/s]
      """;

  static final String SECTION =
      """
      annulet: 1
      title: section
      geometry:
        kind: section
        mesh_size: 20 mm
        points_in: mm
        points:
          a: [0, 300]
          b: [200, 300]
          c: [300, 300]
          d: [300, 400]
          e: [200, 400]
          f: [0, 400]
          g: [350, 350]
        edges:
          hub: {line: [a, b]}
          exit: {line: [b, e]}
          shroud: {line: [e, f]}
          inlet: {line: [f, a]}
          hub2: {line: [b, c]}
          nose: {arc: [c, g, d]}
          shroud2: {line: [d, e]}
        zones:
          tubes: {boundary: [hub, exit, shroud, inlet], separate_ducts: 12, open_share: 25 %}
          flame_tube: {boundary: [hub2, nose, shroud2, exit]}
      gas:
        mean_pressure: 1 bar
        zones:
          tubes: {temperature: 20 °C, mixture: air}
          flame_tube: {temperature: 1740 K, mixture: {fuel: {hydrogen: 60 %, methane: 40 %}, equivalence_ratio: 0.5}}
      walls: {inlet: open, nose: {admittance: 0.02}}
      flames:
        main:
          heat_release: 1 MW
          place: {sheet: exit, answer: pointwise}
          reference_velocity: 30 m/s
          response: {gain: 1, delay: 3 ms}
      window:
        frequency: 900 Hz
        azimuthal_orders: [0, 1, 5]
      """;

  /** One spoilt place: what is replaced by what, and the fault it gives. */
  record Spoilt(String base, String old, String by, int line, String what, String mend) {
    @Override
    public String toString() {
      return old.strip() + " → " + by.strip();
    }
  }

  static Spoilt ring(String old, String by, int line, String what, String mend) {
    return new Spoilt(RING, old, by, line, what, mend);
  }

  static Spoilt section(String old, String by, int line, String what, String mend) {
    return new Spoilt(SECTION, old, by, line, what, mend);
  }

  static Stream<Spoilt> spoilt() {
    return Stream.of(
        // keys
        ring("annulet: 1", "annulet: 2", 1, "format '2'", "annulet: 1"),
        ring("title: ring\n", "", 1, "the key 'title' is missing", "title"),
        ring("window:", "windows:", 31, "unknown key 'windows'", "write 'window'?"),
        ring(
            "  burner_count: 14",
            "  burner_cuont: 14",
            5,
            "unknown key 'burner_cuont'",
            "'burner_count'?"),
        ring(
            "walls:",
            "dampers: {d: {resonator: {neck_bore: 5 mm, neck_length: 20 mm, volume: 50 cm3,"
                + " resistance: 0.1}, at: {face: chamber.outer_fac, x: 400 mm, angles: [0 °]}}}\n"
                + "walls:",
            18,
            "no face 'chamber.outer_fac'",
            "chamber.outer_face"),
        ring(
            "walls:",
            "dampers: {d: {quarter_wave: {bore: 20 mm, length: 200 mm, resistance: 0.1},"
                + " at: {face: chamber.outer_face, x: 100 mm, angles: [0 °]}}}\nwalls:",
            18,
            "x lies outside zone 'chamber'",
            "it runs from 300 mm to 610 mm"),
        ring(
            "walls:",
            "dampers: {d: {quarter_wave: {bore: 20 mm, length: 200 mm},"
                + " at: {edge: chamber.downstream, x: 100 mm}}}\nwalls:",
            18,
            "the key 'resistance' is missing",
            "add"),
        ring(
            "walls:",
            "outputs: {shapes_along: [chamber.downsteam]}\nwalls:",
            18,
            "no edge 'chamber.downsteam'",
            "write 'chamber.downstream'?"),
        ring(
            "walls:",
            "outputs: {shapes_along: [burners.side, burners.side]}\nwalls:",
            18,
            "stands here twice",
            "leave one out"),
        ring(
            "walls:",
            "dampers: {d: {quarter_wave: {bore: 20 mm, length: 200 mm, resistance: 0, bias_velocity: 9 m/s},"
                + " at: {face: chamber.outer_face, x: 400 mm, angles: [0 °]}}}\nwalls:",
            18,
            "a bias flow needs 'loss_coefficient' and 'bias_velocity'",
            "give both"),
        ring("walls:", "compare: {}\nwalls:", 18, "not supported in this version", "leave it out"),
        ring("walls:", "studies: {damper: {}}\nwalls:", 18, "unknown key 'damper'", "dampers"),
        ring(
            "walls:",
            "studies: {sweep: {across: {set: {a: [1, 2]}}}}\nwalls:",
            18,
            "the key 'along' is missing",
            "add"),
        ring(
            "walls:",
            "studies: {uncertainty: {inputs: {gas.mean_pressure: {gaussian: 2 %}}}}\nwalls:",
            18,
            "unknown key 'gaussian'",
            "normal"),
        ring(
            "walls:",
            "studies: {uncertainty: {inputs: {gas.mean_pressure: {normal: 2 %, uniform: 1 %}}}}\nwalls:",
            18,
            "these keys exclude each other: normal, uniform",
            "keep one"),
        ring(
            "walls:",
            "studies: {uncertainty: {seed: 3}}\nwalls:",
            18,
            "nothing is uncertain",
            "burner_scatter"),
        ring(
            "walls:",
            "studies: {uncertainty: {inputs: {a: {normal: 1 %}, b: {normal: 1 %}}, correlated: [{between: [a, b], coefficient: 1}]}}\nwalls:",
            18,
            "the coefficient must lie between",
            "0.5"),
        ring(
            "walls:",
            "studies: {uncertainty: {inputs: {a: {normal: 1 %}}, correlated: [{between: [a, c], coefficient: 0.2}]}}\nwalls:",
            18,
            "no input 'c'",
            "known: a"),
        ring(
            "walls:",
            "studies: {uncertainty: {burner_scatter: {pilot: {gain: {normal: 1 %}}}}}\nwalls:",
            18,
            "no flame 'pilot'",
            "main"),
        ring(
            "walls:",
            "studies: {sweep: {along: {set: {}}}}\nwalls:",
            18,
            "nothing is set on this axis",
            "add"),
        ring(
            "walls:",
            "studies: {sweep: {along: {set: {gas.mean_pressure: [1 bar, 200000 Pa]}}}}\nwalls:",
            18,
            "the unit is 'Pa', that of the values before 'bar'",
            "in one unit"),
        ring(
            "walls:",
            "studies: {sweep: {along: {set: {gas.mean_pressure: 2 bar}}}}\nwalls:",
            18,
            "a list of values is wanted",
            "[1.5 ms, 3 ms]"),
        ring(
            "walls:",
            "studies: {sweep: {along: {set: {walls.chamber.downstream: [rigid, open]}}}}\nwalls:",
            18,
            "'rigid' is not a number with a unit",
            "variants"),
        ring(
            "walls:",
            "studies: {sweep: {along: {set: {window.frequency: [1 Hz, 2 Hz]}}}}\nwalls:",
            18,
            "'window' cannot be swept",
            "geometry, gas"),
        ring(
            "walls:",
            "studies: {sweep: {along: {points: 1, set: {gas.mean_pressure: [1 bar, 2 bar]}}}}\nwalls:",
            18,
            "a whole number is wanted, got '1'",
            "from 2 to 2000"),
        ring(
            "walls:",
            "studies: {sweep: {along: {set: {gas.mean_pressure: [1 bar, 2 bar]}}, across: {set: {gas.mean_pressure: [1 bar, 2 bar]}}}}\nwalls:",
            18,
            "'gas.mean_pressure' is set along and across",
            "one of the two axes"),
        ring(
            "walls:",
            "studies: {dampers: {designs: {a: {count: 3, quarter_wave: {bore: 20 mm, length: 200 mm, resistance: 0.1}}}, positions: {face: chamber.outer_face, x: 400 mm, burners: [1, 3]}}}\nwalls:",
            18,
            "3 dampers for 2 free positions",
            "more angles"),
        ring(
            "walls:",
            "studies: {dampers: {designs: {a: {count: 1, quarter_wave: {bore: 20 mm, length: 200 mm, resistance: 0.1}}}, positions: {face: chamber.outer_face, x: 400 mm, angles: [0 °, 1 °]}}}\nwalls:",
            18,
            "two positions are 5.75959 mm apart, the mouths 17.7245 mm",
            "move the positions apart"),
        ring(
            "walls:",
            "studies: {dampers: {designs: {a: {count: 1, quarter_wave: {bore: 20 mm, length: 200 mm, resistance: 0.1}}}, frequency: [10 Hz, 500 Hz], positions: {face: chamber.outer_face, x: 400 mm, burners: all}}}\nwalls:",
            18,
            "the range of the modes to be tamed",
            "within"),
        ring(
            "walls:",
            "studies: {dampers: {designs: {a: {count: 1, quarter_wave: {bore: 20 mm, length: 200 mm, resistance: 0.1}}}, positions: {face: chamber.outer_face, x: 400 mm, burners: [1], taken: [2]}}}\nwalls:",
            18,
            "a place is taken that is not among the positions",
            "leave it out"),
        ring(
            "title: ring",
            "title: ring\ntitle: twice",
            3,
            "stands here twice, first on line 2",
            "keep one"),
        ring(
            "mean_pressure: 12 bar",
            "mean_pressure: 12 bar\n  <<: {}",
            14,
            "merge keys",
            "write the values out"),
        ring("gap: 80 mm", "bore: 80 mm", 9, "unknown key 'bore'", "gap"),
        ring(
            "bore: 52 mm",
            "bore: 52 mm, area: 21 cm2",
            10,
            "exclude each other: bore, area",
            "keep one"),
        ring("bore: 52 mm, ", "", 10, "one of these keys is wanted: bore, area", "add one"),
        ring("kind: ring", "kind: rnig", 4, "'rnig' is not one of the words", "write 'ring'?"),
        ring("  kind: ring\n", "", 4, "the key 'kind' is missing", "cross_section"),
        ring("shape: ducts", "shape: duct", 10, "'duct' is not one of the words", "write 'ducts'?"),
        // losses
        ring(
            "flames:",
            "two_ports: {burner.inlet: {effective_length: 9 mm}}\nflames:",
            21,
            "no inner edge 'burner.inlet'",
            "'burners.inlet'?"),
        ring(
            "flames:",
            "two_ports: {plenum.upstream: {effective_length: 9 mm}}\nflames:",
            21,
            "is a wall: a two-port has gas on both sides",
            "burners.inlet"),
        ring(
            "flames:",
            "two_ports: {burners.inlet: {loss_coefficient: 0.8}}\nflames:",
            21,
            "a loss needs the mean velocity",
            "'velocity'"),
        ring(
            "flames:",
            "two_ports: {burners.inlet: {loss_coefficient: -1, velocity: 57 m/s}}\nflames:",
            21,
            "out of range",
            "zero or above"),
        ring(
            "flames:",
            "two_ports: {burners.inlet: {loss_coefficient: 1, pressure_drop: 1 bar, velocity: 57 m/s}}\nflames:",
            21,
            "both 'loss_coefficient' and 'pressure_drop'",
            "one of the two"),
        ring(
            "flames:",
            "two_ports: {burners.inlet: {flow_from: plenum}}\nflames:",
            21,
            "joins nothing",
            "'effective_length'"),
        section(
            "flames:",
            "two_ports: {exit: {effective_length: 9 mm}}\nflames:",
            32,
            "not clear on which side",
            "tubes, flame_tube"),
        // units and numbers
        ring("12 bar", "12", 13, "'12' has no unit", "12 bar"),
        ring("12 bar", "12 Bar", 13, "unknown unit 'Bar'", "'bar'"),
        ring("2.1 ms", "2,1 ms", 27, "after a comma", "with a point"),
        ring("57 m/s", "57 mm", 26, "is a length; a speed is wanted", "57 m/s"),
        ring("650 K", "650 °", 15, "is an angle; a temperature is wanted", "°C or K"),
        ring("650 K", "-300 °C", 15, "out of range for a temperature", "above zero"),
        ring("650 K", ".nan", 15, "not a finite number", "650 K"),
        ring("287 J/(kg K)", "287 J/kg/K", 15, "divides twice", "J/(kg K)"),
        ring("1.37", "2.37", 15, "out of range", "between 1 and 1.7"),
        ring("gap: 80 mm", "gap: -80 mm", 9, "out of range for a length", "above zero"),
        ring(
            "burner_count: 14",
            "burner_count: 14.5",
            5,
            "a whole number is wanted, got '14.5'",
            "from 1 to 1000"),
        ring("burner_count: 14", "burner_count: 42", 10, "42 ducts do not fit", "51.6119 mm"),
        ring("[-600, 600, 1/s]", "[-600, 600]", 33, "has no unit", "1/s"),
        ring("[-600, 600, 1/s]", "[-600 1/s, 600, Hz]", 33, "2 values are wanted, got 3", "1/s"),
        ring("gap: 115 mm", "gap: 700 mm", 11, "reaches across the axis", "twice the mean radius"),
        // names
        ring("burners: 6 mm", "burner: 6 mm", 7, "no edge or zone 'burner'", "'burners'?"),
        ring("name: chamber", "name: plenum", 11, "two zones are called 'plenum'", "rename"),
        ring(
            "name: plenum",
            "name: plenum, name: plenum2",
            9,
            "the key 'name' stands here twice",
            "keep one"),
        ring("burners: {as: plenum}", "burner: {as: plenum}", 16, "no zone 'burner'", "'burners'?"),
        ring("    burners: {as: plenum}\n", "", 15, "no gas in zone 'burners'", "burners: {"),
        ring("as: plenum", "as: chmaber", 16, "no gas of a zone 'chmaber'", "'chamber'?"),
        ring("as: plenum", "as: burners", 16, "goes in a circle: burners → burners", "of its own"),
        ring("density: 2.2", "density: 24", 17, "gamma = density", "between 1 and 1.7"),
        ring(", density: 2.2 kg/m3", "", 17, "'density' is missing beside 'sound_speed'", "add"),
        ring(
            "as: plenum",
            "as: plenum, gamma: 1.4",
            16,
            "'gamma' does not go with 'as'",
            "sound_speed"),
        ring(
            ", gamma: 1.37, gas_constant: 287 J/(kg K)",
            "",
            15,
            "a temperature alone",
            "mixture: air"),
        ring(
            "plenum.upstream",
            "plenum.upstraem",
            19,
            "no edge 'plenum.upstraem'",
            "'plenum.upstream'?"),
        ring("plenum.upstream", "burners.outlet", 19, "gas on both sides", "burners.side"),
        ring(
            "upstream: rigid",
            "upstream: ridgid",
            19,
            "'ridgid' is not one of the words",
            "'rigid'?"),
        ring("impedance: [12, 0]", "impedance: [12, 0, 1]", 20, "2 values are wanted, got 3", "["),
        ring("impedance: [12, 0]", "impedance: 0", 20, "impedance 0", "'open'"),
        ring(
            "impedance: [12, 0]",
            "choked_nozzle: {mach: 1.2}",
            20,
            "out of range",
            "between 0 and 1"),
        ring(
            "sheet: burners.outlet",
            "sheet: burners.exit",
            24,
            "no inner edge 'burners.exit'",
            "burners.outlet"),
        ring("sheet: burners.outlet", "sheet: burners.side", 24, "is a wall", "burners.outlet"),
        ring(
            "sheet: burners.outlet",
            "zone: flame_zone",
            24,
            "no zone 'flame_zone'",
            "plenum, burners, chamber"),
        ring(
            "sheet: burners.outlet",
            "zone: chamber, from: 340 mm, to: 310 mm",
            24,
            "ends before it begins",
            "below"),
        ring(
            "sheet: burners.outlet",
            "sheet: burners.outlet, answer: pointwise",
            24,
            "pointwise answer outside a section",
            "uniform"),
        ring(
            "zone: burners, distance",
            "zone: burner, distance",
            25,
            "no zone 'burner'",
            "'burners'?"),
        ring(
            "distance: [20 mm, 60 mm]",
            "from: 20 mm, to: 60 mm",
            25,
            "leaves zone 'burners'",
            "x = 200 mm to 300 mm"),
        ring(
            "distance: [20 mm, 60 mm]",
            "distance: [20 mm, 160 mm]",
            25,
            "leaves zone 'burners'",
            "300 mm"),
        ring("delay: 2.1 ms", "delay: -2.1 ms", 27, "out of range for a time", "zero or above"),
        ring("[1, 8]", "[1, 15]", 29, "a whole number is wanted, got '15'", "from 1 to 14"),
        ring("[1, 8]", "[8, 8]", 29, "burner 8 stands here twice", "leave one out"),
        ring("[1, 8], gain: 0.5", "[1, 8]", 29, "changes nothing", "gain, delay or heat_share"),
        ring(
            "every_second",
            "every_third",
            30,
            "'every_third' is not one of the words",
            "every_second"),
        // window
        ring(
            "[60 Hz, 1200 Hz]",
            "[1200 Hz, 60 Hz]",
            32,
            "the window is empty: frequencies from 1200 to 60 Hz",
            "lowest, highest"),
        ring(
            "[60 Hz, 1200 Hz]",
            "[0 Hz, 1200 Hz]",
            32,
            "out of range for a frequency",
            "above zero"),
        ring(
            "[-600, 600, 1/s]",
            "[600, 600, 1/s]",
            33,
            "the window is empty: growth rates",
            "lowest"),
        ring(
            "[-600, 600, 1/s]",
            "[-600 1/s, 600 1/s]\n  azimuthal_orders: [0]",
            34,
            "outside a section",
            "leave them out"),
        section("[0, 1, 5]", "[0, 1, 6]", 40, "order 6 with 12 separate ducts", "at most 5"),
        section("[0, 1, 5]", "[-1]", 40, "a whole number is wanted, got '-1'", "from 0"),
        // outline
        section("points_in: mm", "points_in: mn", 6, "unknown unit 'mn'", "mm"),
        section("  points_in: mm\n", "", 7, "the points carry no unit", "points_in: mm"),
        section("a: [0, 300]", "a: [0, -300]", 8, "below the axis", "not negative"),
        section("a: [0, 300]", "a: [0]", 8, "2 values are wanted, got 1", "["),
        section("hub: {line: [a, b]}", "hub: {line: [a, z]}", 16, "no point 'z'", "a, b, c"),
        section("hub: {line: [a, b]}", "hub: {line: [a]}", 16, "through 1 points", "at least two"),
        section("[c, g, d]", "[c, d]", 21, "through 2 points", "three points"),
        section("[c, g, d]", "[c, d, d]", 21, "stands twice in a row", "leave one out"),
        section(
            "[hub, exit, shroud, inlet]",
            "[hub, exit, shruod, inlet]",
            24,
            "no edge 'shruod'",
            "'shroud'?"),
        section(
            "[hub, exit, shroud, inlet]",
            "[hub, shroud, exit, inlet]",
            24,
            "the loop is open: edge 'hub' (a–b) does not lead on to edge 'shroud'",
            "in order"),
        section(
            "[hub2, nose, shroud2, exit]",
            "[hub2, nose, shroud2]",
            25,
            "the loop is open",
            "in order"),
        section(", open_share: 25 %", "", 24, "belong together", "open_share"),
        section("open_share: 25 %", "open_share: 125 %", 24, "out of range", "at most 1"),
        section(
            "hub2: {line: [b, c]}",
            "hub2: {line: [b, c]}\n    spare: {line: [a, c]}",
            21,
            "bounds no zone",
            "leave it out"),
        section("g: [350, 350]", "g: [300, 350]", 21, "'nose'", ""),
        section("e: [200, 400]", "e: [200, 200]", 16, "cross", ""),
        // gas, flames of a section
        section("methane: 40 %", "methane: 50 %", 30, "add up to 110 %", "100 %"),
        section("methane: 40 %", "methan: 40 %", 30, "no fuel 'methan'", "'methane'?"),
        section("mixture: air", "mixture: argon", 29, "'argon' is not one of the words", "air"),
        section(
            "equivalence_ratio: 0.5", "equivalence_ratio: 1.5", 30, "out of range", "at most 1"),
        section(
            "{temperature: 20 °C,",
            "{temperature: {file: t.csv},",
            29,
            "file 't.csv' does not exist",
            ""),
        section(
            "{temperature: 20 °C,",
            "{temperature: {file: ../case.yaml},",
            29,
            "outside the case folder",
            "copy it"),
        section(
            "{temperature: 20 °C,",
            "{temperature: {profile: {x: [0, 1, m], temperature: [300 K]}},",
            29,
            "2 stations but 1 temperatures",
            "each station"),
        section(
            "{temperature: 20 °C,",
            "{temperature: {profile: {x: [1, 0, m], temperature: [300, 400, K]}},",
            29,
            "not behind the one before",
            "rising x"),
        section(
            "response: {gain: 1, delay: 3 ms}",
            "response: {gain: 1, delay: 3 ms}\n    staging: [{burners: [1], gain: 0}]",
            38,
            "staging outside a ring",
            "kind: ring"),
        section(
            "separate_ducts: 12, open_share: 25 %",
            "holes: []", 34, "not clear on which side of edge 'exit'", "flow_from: tubes"),
        section(
            "reference_velocity",
            "reference: {edge: exit, flow_from: hub}\n    reference_velocity",
            36,
            "no zone at edge 'exit' called 'hub'",
            "tubes, flame_tube"));
  }

  @TempDir Path folder;

  private Reading read(String text) throws IOException {
    return CaseReader.read(Files.writeString(folder.resolve("case.yaml"), text));
  }

  @Test
  void unspoilt_haveNoFault() throws IOException {
    assertThat(read(RING).problems()).isEmpty();
    assertThat(read(SECTION).problems()).isEmpty();
  }

  @ParameterizedTest
  @MethodSource("spoilt")
  void spoiltPlace_isReportedWithItsLine(Spoilt s) throws IOException {
    assertThat(s.base()).as("the fragment stands once").containsOnlyOnce(s.old());
    Reading reading = read(s.base().replace(s.old(), s.by()));
    assertThat(reading.caseFile()).isEmpty();
    assertThat(reading.problems())
        .anySatisfy(
            p -> {
              assertThat(p.file()).isEqualTo("case.yaml");
              assertThat(p.line()).as(p.toString()).isEqualTo(s.line());
              assertThat(p.what()).contains(s.what());
              assertThat(p.mend()).isNotBlank().contains(s.mend());
            });
    assertThat(reading.problems()).as("no flood of consequences").hasSizeLessThanOrEqualTo(3);
  }

  @Test
  void allFaults_comeAtOnce_inTheOrderOfTheFile() throws IOException {
    Reading r =
        read(
            RING.replace("12 bar", "12")
                .replace("every_second", "every_third")
                .replace("gap: 80 mm", "gap: 80")
                .replace("[60 Hz, 1200 Hz]", "[1200 Hz, 60 Hz]")
                .replace("plenum.upstream", "plenum.upstraem"));
    assertThat(r.problems()).extracting(Problem::line).containsExactly(9, 13, 19, 30, 32);
  }

  @Test
  void crossingEdges_areReportedAtAnEdge() throws IOException {
    Reading r = read(SECTION.replace("e: [200, 400]", "e: [200, 200]"));
    assertThat(r.problems())
        .anySatisfy(
            p -> {
              assertThat(p.key()).startsWith("geometry.edges.");
              assertThat(p.line()).isBetween(16, 22);
              assertThat(p.what()).contains("cross").contains(" m");
            });
  }

  @Test
  void unusedPoint_isACaution() throws IOException {
    Reading r = read(SECTION.replace("f: [0, 400]", "f: [0, 400]\n    spare: [1, 1]"));
    assertThat(r.problems()).isEmpty();
    assertThat(r.cautions())
        .singleElement()
        .satisfies(
            p -> {
              assertThat(p.line()).isEqualTo(14);
              assertThat(p.what()).contains("point 'spare'");
            });
  }

  @Test
  void wallThatFeedsEnergy_andHotGas_areCautions() throws IOException {
    Reading r = read(RING.replace("[12, 0]", "[-12, 0]").replace("650 K", "6500 K"));
    assertThat(r.problems()).isEmpty();
    assertThat(r.cautions()).extracting(Problem::line).containsExactly(15, 20);
  }

  private void onlyFault(byte[] bytes, int line, String what, String mend) throws IOException {
    Reading r = CaseReader.read(Files.write(folder.resolve("case.yaml"), bytes));
    assertThat(r.problems()).hasSize(1);
    Problem p = r.problems().get(0);
    assertThat(p.line()).as(p.toString()).isEqualTo(line);
    assertThat(p.what()).contains(what);
    assertThat(p.mend()).contains(mend);
  }

  private void onlyFault(String text, int line, String what, String mend) throws IOException {
    onlyFault(text.getBytes(StandardCharsets.UTF_8), line, what, mend);
  }

  @Test
  void emptyFile_isAFault() throws IOException {
    onlyFault("", 0, "the file is empty", "annulet: 1");
    onlyFault("# nothing\n", 0, "the file is empty", "annulet: 1");
  }

  @Test
  void tab_isNamedAsSuch() throws IOException {
    onlyFault("annulet: 1\ngeometry:\n\tkind: ring\n", 3, "a tab in the indentation", "spaces");
  }

  @Test
  void brokenNotation_hasItsLine() throws IOException {
    onlyFault("annulet: 1\ntitle: [a, b\ngas: {}\n", 3, "not YAML", "brackets");
    onlyFault("annulet: 1\ntitle: *nobody\n", 2, "alias", "anchor");
    onlyFault("annulet: 1\ntitle: 'open\n", 3, "not YAML", "");
  }

  @Test
  void secondDocument_isAFault() throws IOException {
    onlyFault("annulet: 1\n---\nannulet: 1\n", 2, "a second document", "one case");
  }

  @Test
  void oldEncoding_isNamedWithItsLine() throws IOException {
    onlyFault(
        "annulet: 1\ntitle: 15 °\n".getBytes(StandardCharsets.ISO_8859_1),
        2,
        "byte 0xB0 is not UTF-8",
        "save the file as UTF-8");
    onlyFault("annulet: 1\n".getBytes(StandardCharsets.UTF_16), 1, "UTF-16", "UTF-8");
  }

  @Test
  void byteOrderMark_isAccepted() throws IOException {
    assertThat(read("\uFEFF" + RING).problems()).isEmpty();
  }

  @Test
  void windowsLineEnds_areAccepted() throws IOException {
    assertThat(read(RING.replace("\n", "\r\n")).problems()).isEmpty();
  }

  @Test
  void deepNesting_isRefused() throws IOException {
    onlyFault("annulet: 1\ntitle: " + "[".repeat(100_000) + "\n", 2, "nested more than", "close");
  }

  @Test
  void aliasBomb_isRefused() throws IOException {
    StringBuilder bomb = new StringBuilder("annulet: 1\na0: &a0 [x, x, x, x, x, x, x, x, x, x]\n");
    for (int i = 1; i < 20; i++) {
      String before = "*a" + (i - 1);
      bomb.append("a" + i + ": &a" + i + " [");
      bomb.append(String.join(", ", List.of(before, before, before, before, before, before)));
      bomb.append("]\n");
    }
    onlyFault(bomb.toString(), 0, "aliases (*name) unfold", "write the values out");
    onlyFault("annulet: 1\ntitle: &me [*me]\n", 0, "hold themselves", "write the values out");
  }

  @Test
  void alias_repeatsAValue() throws IOException {
    Reading r =
        read(
            RING.replace("gamma: 1.37, gas", "gamma: &g 1.37, gas")
                .replace(
                    "{as: plenum}", "{temperature: 650 K, gamma: *g, gas_constant: 287 J/(kg K)}"));
    assertThat(r.problems()).isEmpty();
    assertThat(r.orThrow().gas().zones().get("burners"))
        .isEqualTo(r.orThrow().gas().zones().get("plenum"));
  }

  @Test
  void hugeFile_isRefused() throws IOException {
    onlyFault("# " + "x".repeat(2_000_000) + "\n", 0, "has 2000003 bytes", "tables in files");
  }

  @Test
  void missingFileOrFolder_isAFault() {
    assertThat(CaseReader.read(folder).problems())
        .singleElement()
        .satisfies(p -> assertThat(p.what()).contains("holds no file 'case.yaml'"));
    assertThat(CaseReader.read(folder.resolve("nowhere")).problems())
        .singleElement()
        .satisfies(p -> assertThat(p.what()).contains("no such file"));
  }

  @Test
  void topLevelList_isAFault() throws IOException {
    onlyFault("- annulet\n", 1, "pairs are wanted, got a list", "");
  }

  @Test
  void variantFaults_standAtTheVariant() throws IOException {
    Reading r =
        read(
            RING
                + """
                variants:
                  - {name: a, set: {flames.main.response.dealy: 2 ms}}
                  - {name: a, set: {flames.mian.response.delay: 2 ms}}
                  - {name: b, set: {flames.main.response.delay: 2 mm}}
                  - {name: c, set: {geometry.zones.chamer.length: 2 m}}
                """);
    assertThat(r.problems()).extracting(Problem::line).containsExactly(35, 36, 36, 37, 38);
    assertThat(r.problems().get(0).mend()).contains("'delay'");
    assertThat(r.problems()).anySatisfy(p -> assertThat(p.mend()).contains("'main'"));
    assertThat(r.problems()).anySatisfy(p -> assertThat(p.mend()).contains("'chamber'"));
  }

  /** Any spoilt text gives faults with places and remedies, never an exception. */
  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4})
  void randomDamage_givesFaultsNotExceptions(long seed) throws IOException {
    Random random = new Random(seed);
    String signs = "{}[]:,-&*!|>'\"%@`#\n\t 0a.°é";
    for (int i = 0; i < 150; i++) {
      StringBuilder text = new StringBuilder(random.nextBoolean() ? RING : SECTION);
      for (int k = 1 + random.nextInt(3); k > 0; k--) {
        int at = random.nextInt(text.length());
        int end = Math.min(text.length(), at + random.nextInt(8));
        String by = String.valueOf(signs.charAt(random.nextInt(signs.length())));
        text.replace(at, end, random.nextBoolean() ? by : "");
      }
      Reading r = read(text.toString());
      assertThat(r.caseFile().isPresent())
          .as("seed %s: %s", seed, text)
          .isEqualTo(r.problems().isEmpty());
      for (Problem p : r.problems()) {
        assertThat(p.what()).as("seed %s: %s", seed, text).isNotBlank();
        assertThat(p.mend()).as("seed %s: %s", seed, p).isNotBlank();
      }
    }
  }
}
