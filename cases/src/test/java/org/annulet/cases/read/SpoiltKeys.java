package org.annulet.cases.read;

import static org.annulet.cases.read.Spoilt.ring;
import static org.annulet.cases.read.Spoilt.section;

import java.util.stream.Stream;

/** Keys that are missing, misspelt, at odds with one another or hold what they cannot. */
final class SpoiltKeys {
  private SpoiltKeys() {}

  static Stream<Spoilt> all() {
    return Stream.of(
        // keys
        ring("annulet: 1", "annulet: 2", 1, "format '2'", "annulet: 1"),
        ring("title: ring\n", "", 1, "the key 'title' is missing", "title"),
        ring(
            "window:",
            "outputs: {cycles: all}\nwindow:",
            31,
            "cycles is 'all'",
            "write growing or a number, 0 for none"),
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
        ring("walls:", "accuracy: {}\nwalls:", 18, "not supported in this version", "leave it out"),
        ring(
            "walls:",
            "compare: {}\nwalls:",
            18,
            "'compare' is a study and stands under 'studies'",
            "studies: {compare: …}"),
        ring(
            "walls:",
            "studies: {compare: {tables: {rig: {shapes: a.csv}}}}\nwalls:",
            18,
            "one of these keys is wanted: network_model, measured",
            "add one"),
        ring(
            "walls:",
            "studies: {compare: {table: {}}}\nwalls:",
            18,
            "unknown key 'table'",
            "write 'tables'?"),
        ring(
            "walls:",
            "studies: {compare: {tables: {rig: {measured: rig.csv}}}}\nwalls:",
            18,
            "file 'rig.csv' does not exist in the case folder",
            ""),
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
            "tubes, flame_tube"));
  }
}
