package org.annulet.cases.read;

/**
 * One spoilt place in a sound case.
 *
 * @param base the sound case
 * @param old a fragment that stands in it once
 * @param by what stands there instead
 * @param line of the fault
 * @param what part of what the fault says
 * @param mend part of the remedy
 */
record Spoilt(String base, String old, String by, int line, String what, String mend) {
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

  @Override
  public String toString() {
    return old.strip() + " → " + by.strip();
  }

  static Spoilt ring(String old, String by, int line, String what, String mend) {
    return new Spoilt(RING, old, by, line, what, mend);
  }

  static Spoilt section(String old, String by, int line, String what, String mend) {
    return new Spoilt(SECTION, old, by, line, what, mend);
  }
}
