package org.annulet.solver.medium;

import java.util.Map;

/**
 * Standard atomic weights in kg/mol (IUPAC 1999 abridged values, which TM-4513's masses follow).
 */
final class AtomicMass {
  private static final Map<String, Double> TABLE =
      Map.of(
          "H", 1.00794e-3,
          "C", 12.0107e-3,
          "N", 14.0067e-3,
          "O", 15.9994e-3,
          "Ar", 39.948e-3);

  private AtomicMass() {}

  /** Molar mass in kg/mol of a molecule with these atoms. */
  static double of(Map<String, Integer> atoms) {
    double sum = 0;
    // Sorted, so that the sum does not depend on the order of the map.
    for (String element : atoms.keySet().stream().sorted().toList()) {
      Double mass = TABLE.get(element);
      if (mass == null) {
        throw new IllegalArgumentException(
            "no atomic mass for element '" + element + "'; known are " + sortedNames());
      }
      sum += atoms.get(element) * mass;
    }
    return sum;
  }

  private static String sortedNames() {
    return String.join(", ", TABLE.keySet().stream().sorted().toList());
  }
}
