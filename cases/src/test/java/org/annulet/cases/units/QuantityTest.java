package org.annulet.cases.units;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Values from the definitions of the units (SI brochure, 9th edition: bar, litre, degree, zero of
 * °C; 1 atm = 101325 Pa).
 */
class QuantityTest {
  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "12 mm | LENGTH | 0.012",
        "2.1ms | TIME | 0.0021",
        "6 bar | PRESSURE | 6e5",
        "650 Hz | FREQUENCY | 650",
        "1.2 kHz | FREQUENCY | 1200",
        "600 1/s | GROWTH_RATE | 600",
        "-600 1/s | GROWTH_RATE | -600",
        "600 s-1 | GROWTH_RATE | 600",
        "600 s^-1 | GROWTH_RATE | 600",
        "600 s⁻¹ | GROWTH_RATE | 600",
        "287 J/(kg K) | GAS_CONSTANT | 287",
        "287 J kg-1 K-1 | GAS_CONSTANT | 287",
        "0.287 kJ/(kg·K) | GAS_CONSTANT | 287",
        "287 m2/(s2 K) | GAS_CONSTANT | 287",
        "2.4 kg/m3 | DENSITY | 2.4",
        "2.4 g/l | DENSITY | 2.4",
        "15.5 MW | POWER | 15.5e6",
        "15.5 MJ/s | POWER | 15.5e6",
        "1e-3 m | LENGTH | 1e-3",
        "1E-3m | LENGTH | 1e-3",
        "0.1 mm | LENGTH | 1e-4",
        "21.2 cm2 | AREA | 21.2e-4",
        "21.2 cm² | AREA | 21.2e-4",
        "21.2 cm^2 | AREA | 21.2e-4",
        "0.5 l | VOLUME | 5e-4",
        "3 µm | LENGTH | 3e-6",
        "3 μm | LENGTH | 3e-6",
        "650 K | TEMPERATURE | 650",
        "650 °C | TEMPERATURE | 923.15",
        "-10 °C | TEMPERATURE | 263.15",
        "1 atm | PRESSURE | 101325",
        "950 mbar | PRESSURE | 95e3",
        "950 hPa | PRESSURE | 95e3",
        "95 kPa | PRESSURE | 95e3",
        "1.2 MPa | PRESSURE | 1.2e6",
        "2 km | LENGTH | 2000",
        "3 cm | LENGTH | 0.03",
        "30 µs | TIME | 3e-5",
        "2 MHz | FREQUENCY | 2e6",
        "300 W | POWER | 300",
        "300 kW | POWER | 3e5",
        "0.4 GW | POWER | 4e8",
        "0.5 L | VOLUME | 5e-4",
        "500 g/s | MASS_FLOW | 0.5",
        "5 mg/s | MASS_FLOW | 5e-6",
        "50 MJ/kg | SPECIFIC_ENERGY | 5e7",
        "7 kN m/kg | SPECIFIC_ENERGY | 7000",
        "7 N m/g | SPECIFIC_ENERGY | 7000",
        "50 % | FRACTION | 0.5",
        "0.5 | FRACTION | 0.5",
        ".5 | FRACTION | 0.5",
        "57 m/s | SPEED | 57",
        "205 km/s | SPEED | 205e3",
        "12\u00a0mm | LENGTH | 0.012",
      })
  void reads(String text, QuantityKind kind, double si) {
    assertThat(Quantity.parse(text, kind).si()).isEqualTo(si);
  }

  @Test
  void degrees_areRadians() {
    assertThat(Quantity.parse("180 °", QuantityKind.ANGLE).si()).isEqualTo(Math.PI);
    assertThat(Quantity.parse("15 deg", QuantityKind.ANGLE).si())
        .isCloseTo(Math.toRadians(15), within(1e-16));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        // readings another unit library gave without an error
        "0,5 m | LENGTH | comma | 0.5 m",
        "1,500 m | LENGTH | comma | 1500 m",
        "8.3 J/mol/K | GAS_CONSTANT | divides twice | J/(mol K)",
        "287 J/kg K | GAS_CONSTANT | two readings | J/(kg K)",
        "287 J/(kgK) | GAS_CONSTANT | unknown unit 'kgK' | 'kg K'",
        "650 Mhz | FREQUENCY | unknown unit 'Mhz' | MHz",
        "650 hz | FREQUENCY | unknown unit 'hz' | Hz",
        "15 KW | POWER | unknown unit 'KW' | kW",
        "6 Bar | PRESSURE | unknown unit 'Bar' | bar",
        "650 k | TEMPERATURE | unknown unit 'k' | 'K'",
        "650 ° | TEMPERATURE | is an angle | °C or K",
        "650 deg | TEMPERATURE | is an angle | °C or K",
        "650 C | TEMPERATURE | unknown unit 'C' | °C",
        "650 °F | TEMPERATURE | unknown unit '°F' | 459.67",
        "287 J/(kg °C) | GAS_CONSTANT | °C inside | K",
        "NaN m | LENGTH | not a finite number | 12 mm",
        ".nan | LENGTH | not a finite number | 12 mm",
        "Infinity Hz | FREQUENCY | not a finite number | 650 Hz",
        "-.inf | GROWTH_RATE | not a finite number | 1/s",
        "1e999 m | LENGTH | too large | exponent",
        "1e-999 m | LENGTH | too small | exponent",
        "1e-320 mm | LENGTH | too small | exponent",
        "12 | LENGTH | no unit | 12 mm",
        "0 | LENGTH | no unit | 12 mm",
        "mm | LENGTH | does not begin with a number | 12 mm",
        "12 mm 3 | LENGTH | not a unit symbol | ",
        "1 000 mm | LENGTH | not one number | without spaces",
        "1_000 mm | LENGTH | not one number | separators",
        "0x10 m | LENGTH | the power 10 | -9 to 9",
        "1.2.3 m | LENGTH | not one number | ",
        "− 5 mm | LENGTH | not a minus sign | '-5 mm'",
        "600/s | GROWTH_RATE | nothing above the line | 1/s",
        "600 Hz | GROWTH_RATE | is a frequency | 1/s",
        "600 1/s | FREQUENCY | is a growth rate | Hz",
        "4000 rad/s | FREQUENCY | something else | 2π",
        "3000 rpm | FREQUENCY | unknown unit 'rpm' | divide by 60",
        "6 barg | PRESSURE | unknown unit 'barg' | absolute",
        "90 psi | PRESSURE | unknown unit 'psi' | bar",
        "2 in | LENGTH | unknown unit 'in' | 25.4",
        "12 mn | LENGTH | unknown unit 'mn' | mm",
        "12 m0 | LENGTH | power 0 | ",
        "12 s | LENGTH | is a time | 12 mm",
        "0.5 m | FRACTION | is a length | leave the unit",
        "12 furlong | LENGTH | unknown unit 'furlong' | known units",
        "12 m/ | LENGTH | incomplete | ",
        "12 mm! | LENGTH | not a unit symbol | ",
        "15 º | ANGLE | unknown unit 'º' | ordinal",
      })
  void refuses(String text, QuantityKind kind, String what, String mend) {
    assertThatThrownBy(() -> Quantity.parse(text, kind))
        .isInstanceOfSatisfying(
            UnitFault.class,
            f -> {
              assertThat(f.what()).contains(what);
              assertThat(f.mend()).isNotBlank().contains(mend == null ? "" : mend);
            });
  }

  @Test
  void unitStatedOnce_holdsForBareNumbersOnly() {
    assertThat(Quantity.parse("320", "mm", QuantityKind.LENGTH).si()).isEqualTo(0.32);
    assertThatThrownBy(() -> Quantity.parse("320 mm", "mm", QuantityKind.LENGTH))
        .hasMessageContaining("carries a unit although 'mm' is stated");
  }

  @Test
  void longText_isRefusedUnread() {
    assertThatThrownBy(() -> Quantity.parse("1".repeat(1_000_000), QuantityKind.LENGTH))
        .isInstanceOf(UnitFault.class)
        .hasMessageContaining("1000000 characters");
  }

  /** The example of every kind is read as that kind, and as no other. */
  @Test
  void everyExample_isOfItsKind() {
    for (QuantityKind kind : QuantityKind.values()) {
      for (String example : kind.example().split(" or ")) {
        assertThat(Quantity.parse(example, kind).source()).isEqualTo(example);
        for (QuantityKind other : QuantityKind.values()) {
          if (other != kind) {
            assertThatThrownBy(() -> Quantity.parse(example, other))
                .as("%s as %s", example, other)
                .isInstanceOf(UnitFault.class);
          }
        }
      }
    }
  }

  /** Whatever the text, the answer is a finite number or a fault with a remedy. */
  @Test
  void anyText_givesNumberOrRemedy() {
    Random random = new Random(20260101);
    String letters = "0123456789.,eE+-/()^ mkgsKHzJ°µ%²⁻NaInf\u00a0·*_'\"𝄞";
    for (int i = 0; i < 20_000; i++) {
      StringBuilder text = new StringBuilder(random.nextBoolean() ? "1" : "");
      for (int k = random.nextInt(12); k > 0; k--) {
        text.append(letters.charAt(random.nextInt(letters.length())));
      }
      QuantityKind kind = QuantityKind.values()[random.nextInt(QuantityKind.values().length)];
      try {
        assertThat(Quantity.parse(text.toString(), kind).si()).as(text.toString()).isFinite();
      } catch (UnitFault f) {
        assertThat(f.mend()).as(text.toString()).isNotBlank();
      }
    }
  }
}
