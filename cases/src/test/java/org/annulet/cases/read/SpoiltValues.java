package org.annulet.cases.read;

import static org.annulet.cases.read.Spoilt.ring;
import static org.annulet.cases.read.Spoilt.section;

import java.util.stream.Stream;

/** Units, numbers, names, windows, outlines, gases and flames that cannot be. */
final class SpoiltValues {
  private SpoiltValues() {}

  static Stream<Spoilt> all() {
    return Stream.of(
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
}
