package org.annulet.solver.eigen;

import com.github.fommil.netlib.F2jARPACK;
import java.util.Arrays;
import org.annulet.solver.dense.PureJavaNetlib;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.sparse.RealFactor;
import org.netlib.util.doubleW;
import org.netlib.util.intW;

/**
 * Implicitly restarted Lanczos for the eigenvalues of K p = λ M p nearest to a shift (ARPACK
 * dsaupd/dseupd, mode 3).
 *
 * <p>The translated ARPACK keeps static state between its calls: one lock for the whole JVM is held
 * from the first call of dsaupd to the end of dseupd.
 */
final class Lanczos {
  private static final Object ARPACK_IS_STATIC = new Object();
  private static final int LARGEST_RESTARTS = 300;

  static {
    PureJavaNetlib.select();
  }

  private Lanczos() {}

  /**
   * The eigenpairs nearest to the shift, vectors with pᵀMp = 1; fewer than wanted if the iteration
   * stops early.
   *
   * @param factor of K − shift · M
   * @param wanted number of eigenpairs, below n
   * @param start selects one of several fixed start vectors
   */
  static PassiveModes.Spectrum nearest(
      AcousticOperator op, RealFactor factor, double shift, int wanted, int start) {
    int n = op.size();
    int ncv = Math.min(n, Math.max(2 * wanted + 1, wanted + 12));
    double[] resid = startVector(n, start);
    double[] v = new double[n * ncv];
    int[] iparam = new int[11];
    iparam[0] = 1;
    iparam[2] = LARGEST_RESTARTS;
    iparam[6] = 3;
    int[] ipntr = new int[14];
    double[] workd = new double[3 * n];
    double[] workl = new double[ncv * (ncv + 8)];
    intW ido = new intW(0);
    intW info = new intW(1);
    doubleW tol = new doubleW(1e-12);
    double[] d = new double[wanted + 1];
    double[] z = v;
    intW nev = new intW(wanted);
    synchronized (ARPACK_IS_STATIC) {
      F2jARPACK arpack = new F2jARPACK();
      while (true) {
        arpack.dsaupd(
            ido,
            "G",
            n,
            "LM",
            wanted,
            tol,
            resid,
            ncv,
            v,
            n,
            iparam,
            ipntr,
            workd,
            workl,
            workl.length,
            info);
        if (ido.val == -1 || ido.val == 1) {
          double[] b = new double[n];
          if (ido.val == 1) {
            System.arraycopy(workd, ipntr[2] - 1, b, 0, n);
          } else {
            multiply(op, workd, ipntr[0] - 1, b);
          }
          factor.solveUnrefined(b);
          System.arraycopy(b, 0, workd, ipntr[1] - 1, n);
        } else if (ido.val == 2) {
          double[] b = new double[n];
          multiply(op, workd, ipntr[0] - 1, b);
          System.arraycopy(b, 0, workd, ipntr[1] - 1, n);
        } else {
          break;
        }
      }
      if (info.val < 0) {
        throw new ArithmeticException(inWords("dsaupd", info.val));
      }
      if (iparam[4] == 0) {
        return new PassiveModes.Spectrum(new double[0], new double[0][], wanted);
      }
      boolean[] select = new boolean[ncv];
      arpack.dseupd(
          true,
          "A",
          select,
          d,
          z,
          n,
          shift,
          "G",
          n,
          "LM",
          nev,
          tol.val,
          resid,
          ncv,
          v,
          n,
          iparam,
          ipntr,
          workd,
          workl,
          workl.length,
          info);
      if (info.val != 0) {
        throw new ArithmeticException(inWords("dseupd", info.val));
      }
    }
    int found = Math.min(iparam[4], wanted);
    double[] lambda = Arrays.copyOf(d, found);
    double[][] vectors = new double[found][];
    for (int i = 0; i < found; i++) {
      vectors[i] = Arrays.copyOfRange(z, i * n, (i + 1) * n);
    }
    return new PassiveModes.Spectrum(lambda, vectors, wanted);
  }

  private static void multiply(AcousticOperator op, double[] from, int offset, double[] y) {
    double[] x = Arrays.copyOfRange(from, offset, offset + op.size());
    op.pattern().addProduct(op.mass(), x, 1, y);
  }

  /** Fixed, free of symmetry, different for each number. */
  private static double[] startVector(int n, int number) {
    double[] x = new double[n];
    double phase = 0.3 + number;
    for (int i = 0; i < n; i++) {
      phase = (phase + 0.6180339887498949 * (1 + 0.1 * number)) % 1.0;
      x[i] = 0.5 + phase - ((i * 7919L + 31 * number) % 1009) / 1009.0;
    }
    return x;
  }

  private static String inWords(String routine, int code) {
    String what =
        switch (code) {
          case -8 -> "the small tridiagonal problem did not converge";
          case -9, -9999 -> "the start vector gave no Krylov space";
          case -14 -> "no eigenvalue to sufficient accuracy";
          default -> "it refused its arguments";
        };
    return "Lanczos (" + routine + ", code " + code + "): " + what;
  }
}
