package spgpe.integrate;

import java.util.Arrays;
import spgpe.internal.linear.ComplexMatrix;
import spgpe.projector.Amplitudes;

/**
 * A complex matrix over the components for each mode, repeated for each lane, so that applying it
 * is a flat loop. Immutable; elements (or imaginary parts) that vanish for every mode are kept as
 * empty arrays and take no time.
 */
final class ModeTable {
  private final int components;
  private final double[][] re;
  private final double[][] im;

  private ModeTable(int components) {
    this.components = components;
    this.re = new double[components * components][0];
    this.im = new double[components * components][0];
  }

  static ModeTable of(ComplexMatrix[] matrices, int lanes) {
    int n = matrices[0].size();
    ModeTable table = new ModeTable(n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double[] real = new double[matrices.length * lanes];
        double[] imaginary = new double[real.length];
        boolean anyReal = false;
        boolean anyImaginary = false;
        for (int e = 0; e < real.length; e++) {
          real[e] = matrices[e / lanes].re(i, j);
          imaginary[e] = matrices[e / lanes].im(i, j);
          anyReal |= real[e] != 0;
          anyImaginary |= imaginary[e] != 0;
        }
        if (anyReal || anyImaginary) {
          table.re[i * n + j] = real;
        }
        if (anyImaginary) {
          table.im[i * n + j] = imaginary;
        }
      }
    }
    return table;
  }

  /** out = table times in; in and out must differ. */
  void multiply(Amplitudes in, Amplitudes out) {
    for (int i = 0; i < components; i++) {
      multiply(i, in, out, true);
    }
  }

  /** out += table times in; in and out must differ. */
  void multiplyAdd(Amplitudes in, Amplitudes out) {
    for (int i = 0; i < components; i++) {
      multiply(i, in, out, false);
    }
  }

  /** One row of the matrices. The first element that is not empty may overwrite what was there. */
  private void multiply(int i, Amplitudes in, Amplitudes out, boolean overwrite) {
    boolean first = overwrite;
    for (int j = 0; j < components; j++) {
      double[] real = re[i * components + j];
      double[] imaginary = im[i * components + j];
      if (real.length == 0) {
        continue;
      }
      if (first) {
        if (imaginary.length > 0) {
          setComplex(real, imaginary, in.re(j), in.im(j), out.re(i), out.im(i));
        } else {
          setReal(real, in.re(j), out.re(i));
          setReal(real, in.im(j), out.im(i));
        }
        first = false;
      } else if (imaginary.length > 0) {
        addComplex(real, imaginary, in.re(j), in.im(j), out.re(i), out.im(i));
      } else {
        addReal(real, in.re(j), out.re(i));
        addReal(real, in.im(j), out.im(i));
      }
    }
    if (first) {
      Arrays.fill(out.re(i), 0);
      Arrays.fill(out.im(i), 0);
    }
  }

  private static void setReal(double[] factor, double[] in, double[] out) {
    for (int e = 0; e < factor.length; e++) {
      out[e] = factor[e] * in[e];
    }
  }

  private static void setComplex(
      double[] real, double[] imaginary, double[] inRe, double[] inIm, double[] outRe,
      double[] outIm) {
    for (int e = 0; e < real.length; e++) {
      double x = inRe[e];
      double y = inIm[e];
      outRe[e] = real[e] * x - imaginary[e] * y;
      outIm[e] = real[e] * y + imaginary[e] * x;
    }
  }

  private static void addReal(double[] factor, double[] in, double[] out) {
    for (int e = 0; e < factor.length; e++) {
      out[e] += factor[e] * in[e];
    }
  }

  private static void addComplex(
      double[] real, double[] imaginary, double[] inRe, double[] inIm, double[] outRe,
      double[] outIm) {
    for (int e = 0; e < real.length; e++) {
      double x = inRe[e];
      double y = inIm[e];
      outRe[e] += real[e] * x - imaginary[e] * y;
      outIm[e] += real[e] * y + imaginary[e] * x;
    }
  }
}
