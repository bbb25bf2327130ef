package spgpe.internal.measure;

import spgpe.fourier.FourierTransform;
import spgpe.internal.check.Check;
import spgpe.model.Model;

/**
 * Correlations on a ring by Fourier transform, averaged over the ring. Owns scratch memory: one
 * thread at a time.
 */
public final class RingCorrelator {
  private final FourierTransform fourier;
  private final double[] data;
  private final double[] first;
  private final double[] second;

  /**
   * Makes a workspace.
   *
   * @param model model on a line
   */
  public RingCorrelator(Model model) {
    Check.argument(
        model.region().grid().dimension() == 1,
        "correlations along a ring need a line: grid=%s", model.region().grid());
    int points = model.region().grid().points();
    this.fourier = model.fourierProvider().transform(points);
    this.data = new double[2 * points];
    this.first = new double[points];
    this.second = new double[points];
  }

  /**
   * Scratch array.
   *
   * @return live array, one number for each point
   */
  public double[] first() {
    return first;
  }

  /**
   * Another scratch array.
   *
   * @return live array, one number for each point
   */
  public double[] second() {
    return second;
  }

  /**
   * C(r) = mean over y of [a(y) b(y+r) + a(y) b(y-r)]/2 with the scratch arrays a = {@link #first},
   * b = {@link #second}, r = 0..N/2.
   *
   * @param result overwritten from index 0 with N/2 + 1 numbers
   */
  public void realCorrelation(double[] result) {
    int n = first.length;
    spectra();
    for (int k = 0; k <= n / 2; k++) {
      int m = (n - k) % n;
      double re = data[2 * k];
      double im = data[2 * k + 1];
      double reM = data[2 * m];
      double imM = data[2 * m + 1];
      // a_k = (z_k + z_-k^*)/2, b_k = (z_k - z_-k^*)/(2i), and Re a_k^* b_k is even in k
      double cross = ((re + reM) * (im + imM) - (im - imM) * (re - reM)) / 4;
      data[2 * k] = cross;
      data[2 * m] = cross;
      data[2 * k + 1] = 0;
      data[2 * m + 1] = 0;
    }
    fourier.inverse(data, 0);
    take(0, result);
  }

  /**
   * Re C(r), C(r) = mean over y of z^*(y) z(y+r), z = {@link #first} + i {@link #second}; r =
   * 0..N/2. The mean of r and -r has no imaginary part.
   *
   * @param result overwritten from index 0 with N/2 + 1 numbers
   */
  public void complexCorrelation(double[] result) {
    spectra();
    for (int k = 0; k < data.length; k += 2) {
      data[k] = data[k] * data[k] + data[k + 1] * data[k + 1];
      data[k + 1] = 0;
    }
    fourier.inverse(data, 0);
    take(0, result);
  }

  /**
   * C(r) of {@link #first} with itself and of {@link #second} with itself, two real profiles by one
   * transform there and one back.
   *
   * @param ofFirst overwritten from index 0 with N/2 + 1 numbers
   * @param ofSecond overwritten from index 0 with N/2 + 1 numbers
   */
  public void ownCorrelations(double[] ofFirst, double[] ofSecond) {
    int n = first.length;
    spectra();
    for (int k = 0; k <= n / 2; k++) {
      int m = (n - k) % n;
      double re = data[2 * k];
      double im = data[2 * k + 1];
      double reM = data[2 * m];
      double imM = data[2 * m + 1];
      // a_k = (z_k + z_-k^*)/2, b_k = (z_k - z_-k^*)/(2i); both powers are even in k
      double a = ((re + reM) * (re + reM) + (im - imM) * (im - imM)) / 4;
      double b = ((im + imM) * (im + imM) + (re - reM) * (re - reM)) / 4;
      data[2 * k] = a;
      data[2 * m] = a;
      data[2 * k + 1] = b;
      data[2 * m + 1] = b;
    }
    fourier.inverse(data, 0);
    take(0, ofFirst);
    take(1, ofSecond);
  }

  /**
   * |A_k|^2 for n = 0..N/2, A_k = dx sum of a exp(-ikx), a = {@link #first}.
   *
   * @param cell spacing dx
   * @param result overwritten from index 0 with N/2 + 1 numbers
   */
  public void powerSpectrum(double cell, double[] result) {
    java.util.Arrays.fill(second, 0);
    spectra();
    for (int k = 0; k <= first.length / 2; k++) {
      double re = cell * data[2 * k];
      double im = cell * data[2 * k + 1];
      result[k] = re * re + im * im;
    }
  }

  private void spectra() {
    for (int i = 0; i < first.length; i++) {
      data[2 * i] = first[i];
      data[2 * i + 1] = second[i];
    }
    fourier.forward(data, 0);
  }

  private void take(int part, double[] result) {
    double n = first.length;
    for (int r = 0; r <= first.length / 2; r++) {
      result[r] = data[2 * r + part] / (n * n);
    }
  }
}
