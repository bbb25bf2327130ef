package spgpe.integrate;

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
      java.util.Arrays.fill(out.re(i), 0);
      java.util.Arrays.fill(out.im(i), 0);
    }
    multiplyAdd(in, out);
  }

  /** out += table times in; in and out must differ. */
  void multiplyAdd(Amplitudes in, Amplitudes out) {
    for (int i = 0; i < components; i++) {
      for (int j = 0; j < components; j++) {
        double[] real = re[i * components + j];
        double[] imaginary = im[i * components + j];
        if (imaginary.length > 0) {
          addComplex(real, imaginary, in.re(j), in.im(j), out.re(i), out.im(i));
        } else if (real.length > 0) {
          addReal(real, in.re(j), out.re(i));
          addReal(real, in.im(j), out.im(i));
        }
      }
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
