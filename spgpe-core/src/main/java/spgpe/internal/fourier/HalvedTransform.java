package spgpe.internal.fourier;

import spgpe.fourier.FourierTransform;

/** A transform of 2m points made of two transforms of m points (decimation in time). */
final class HalvedTransform implements FourierTransform {
  private final FourierTransform half;
  private final int m;
  private final double[] even;
  private final double[] odd;
  private final double[] cos;
  private final double[] sin;

  HalvedTransform(FourierTransform half) {
    this.half = half;
    this.m = half.size();
    this.even = new double[2 * m];
    this.odd = new double[2 * m];
    this.cos = new double[m];
    this.sin = new double[m];
    for (int k = 0; k < m; k++) {
      cos[k] = Math.cos(Math.PI * k / m);
      sin[k] = Math.sin(Math.PI * k / m);
    }
  }

  @Override
  public int size() {
    return 2 * m;
  }

  @Override
  public void forward(double[] data, int offset) {
    split(data, offset);
    half.forward(even, 0);
    half.forward(odd, 0);
    combine(data, offset, -1);
  }

  @Override
  public void inverse(double[] data, int offset) {
    split(data, offset);
    half.inverse(even, 0);
    half.inverse(odd, 0);
    combine(data, offset, 1);
  }

  private void split(double[] data, int offset) {
    for (int k = 0; k < m; k++) {
      int from = offset + 4 * k;
      even[2 * k] = data[from];
      even[2 * k + 1] = data[from + 1];
      odd[2 * k] = data[from + 2];
      odd[2 * k + 1] = data[from + 3];
    }
  }

  private void combine(double[] data, int offset, int sign) {
    for (int k = 0; k < m; k++) {
      double c = cos[k];
      double s = sign * sin[k];
      double re = c * odd[2 * k] - s * odd[2 * k + 1];
      double im = c * odd[2 * k + 1] + s * odd[2 * k];
      int low = offset + 2 * k;
      int high = low + 2 * m;
      data[low] = even[2 * k] + re;
      data[low + 1] = even[2 * k + 1] + im;
      data[high] = even[2 * k] - re;
      data[high + 1] = even[2 * k + 1] - im;
    }
  }
}
