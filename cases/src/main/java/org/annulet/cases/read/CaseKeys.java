package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * The keys of every mapping of the format whose keys are not names. A key that must be there ends
 * in {@code !}. The JSON Schema holds the same keys under {@code $defs}; a test keeps them equal.
 */
enum CaseKeys {
  CASE(
      "annulet! title! about geometry! gas! walls two_ports dampers flames window! studies outputs"
          + " variants"),
  RING("kind! burner_count! unrolled_radius mesh_size! mesh_size_at sides_per_wavelength zones!"),
  ANNULUS("name! shape! mean_radius! gap! length!"),
  DUCTS("name! shape! mean_radius! bore area length!"),
  SECTION("kind! mesh_size! mesh_size_at sides_per_wavelength points_in points! edges! zones!"),
  CROSS_SECTION(
      "kind! mesh_size! mesh_size_at sides_per_wavelength axial_wavenumber points_in points! edges! zones!"),
  PLANE(
      "kind! mesh_size! mesh_size_at sides_per_wavelength depth! points_in points! edges! zones!"),
  MESH_FILE(
      "kind! file! plane! length_unit! coordinates zone_names edge_names depth axial_wavenumber"
          + " separate_ducts"),
  MESH_FILE_DUCTS("count! open_share!"),
  EDGE("line arc curve"),
  OUTLINE_ZONE("boundary! holes separate_ducts open_share"),
  GAS("mean_pressure! zones!"),
  GAS_ZONE("temperature gamma gas_constant mixture sound_speed density as"),
  TEMPERATURE(
      "profile gas_path file array length_unit temperature_unit axis sectors adiabatic_from"
          + " fuel_temperature"),
  GAS_PATH("corners! distance! temperature!"),
  PROFILE("x! temperature!"),
  MIXTURE("fuel equivalence_ratio progress humid_air"),
  HUMID_AIR("relative_humidity! temperature! pressure!"),
  WALL(
      "impedance admittance choked_nozzle impedance_table admittance_table reflection_table"
          + " perforated radiating_end"),
  PERFORATED("hole_bore! pitch! thickness! bias_velocity! cavity_depth"),
  RADIATING_END("radius! rim"),
  CHOKED_NOZZLE("mach!"),
  TWO_PORT(
      "loss_coefficient pressure_drop velocity effective_length flow_from perforated"
          + " transfer_table"),
  SCREEN("hole_bore! pitch! thickness! bias_velocity!"),
  DAMPER("resonator quarter_wave gas_of at! mouth_width"),
  RESONATOR(
      "neck_bore! necks neck_length! end_correction volume! resistance! loss_coefficient bias_velocity"),
  QUARTER_WAVE("bore! length! end_correction resistance! loss_coefficient bias_velocity"),
  DAMPER_PLACE("edge face x! y r count angles burners"),
  FLAME("heat_release! fuel_flow place! reference reference_velocity response! staging"),
  PLACE("sheet answer zone from to distance width brush heat_file"),
  BRUSH("centre! deviation! corners"),
  REFERENCE("edge quantity flow_from zone from to distance width direction"),
  RESPONSE("gain delay delay_deviation cutoff sum table low_frequency_limit"),
  RESPONSE_PART("gain! delay!"),
  STAGING("burners! gain delay heat_share"),
  WINDOW("frequency! growth_rate azimuthal_orders"),
  STUDIES("dampers sweep uncertainty compare"),
  UNCERTAINTY("samples seed inputs correlated burner_scatter"),
  SPREAD("normal uniform triangular"),
  CORRELATED("between! coefficient!"),
  BURNER_SCATTER("gain delay"),
  COMPARE("tables match_within"),
  COMPARED_TABLE("network_model measured shapes about"),
  SWEEP("along! across"),
  SWEEP_AXIS("name shown points set!"),
  DAMPER_STUDY("designs! positions! frequency"),
  DAMPER_DESIGN("resonator quarter_wave gas_of mouth_width count!"),
  DAMPER_POSITIONS("face! x! angles burners taken"),
  OUTPUTS("field_files cycles shapes_along"),
  VARIANT("name! about set!");

  /** Keys that a later version will read. */
  static final List<String> RESERVED = List.of("accuracy");

  private final List<String> all = new ArrayList<>();
  private final List<String> required = new ArrayList<>();

  CaseKeys(String keys) {
    for (String key : keys.split(" ")) {
      String name = key.replace("!", "");
      all.add(name);
      if (key.endsWith("!")) {
        required.add(name);
      }
    }
  }

  List<String> all() {
    return List.copyOf(all);
  }

  List<String> required() {
    return List.copyOf(required);
  }

  /** Name of the definition in the JSON Schema. */
  String definition() {
    return name().toLowerCase(Locale.ROOT);
  }
}
