package org.annulet.solver.dense;

import com.github.fommil.netlib.F2jARPACK;
import com.github.fommil.netlib.F2jBLAS;
import com.github.fommil.netlib.F2jLAPACK;

/**
 * Tells netlib-java to take its pure Java routines. Left to itself it looks for native libraries on
 * first use, finds none and logs so. To be called before the first use of ARPACK, LAPACK or MTJ;
 * calling it again changes nothing.
 */
public final class PureJavaNetlib {
  private PureJavaNetlib() {}

  /**
   * Selects the pure Java routines unless the user has chosen others by the same system properties.
   */
  public static void select() {
    choose("ARPACK", F2jARPACK.class);
    choose("LAPACK", F2jLAPACK.class);
    choose("BLAS", F2jBLAS.class);
  }

  private static void choose(String library, Class<?> implementation) {
    String key = "com.github.fommil.netlib." + library;
    if (System.getProperty(key) == null) {
      System.setProperty(key, implementation.getName());
    }
  }
}
