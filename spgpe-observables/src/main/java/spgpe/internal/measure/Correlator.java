package spgpe.internal.measure;

import java.util.Arrays;
import spgpe.fourier.FourierTransform;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.model.Model;

/**
 * Correlations and spectra of profiles by Fourier transform, averaged over all origins: on a ring
 * by distance 0, dx, ..., on a plane by shells of distance. Owns scratch memory: one thread at a
 * time.
 */
public abstract class Correlator {
  final double[] data;
  private final double[] first;
  private final double[] second;

  private Correlator(int points) {
    this.data = new double[2 * points];
    this.first = new double[points];
    this.second = new double[points];
  }

  /**
   * Makes a workspace.
   *
   * @param model the model that is run
   * @return workspace for its grid
   */
  public static Correlator of(Model model) {
    return model.region().grid().dimension() == 1 ? new Ring(model) : new Plane(model);
  }

  /**
   * Distances of the correlations.
   *
   * @param grid a ring or a plane
   * @return new array: 0, dx, ..., floor(N/2) dx on a ring, mean distances of shells on a plane
   */
  public static double[] distances(PeriodicGrid grid) {
    return grid.dimension() == 1
        ? steps(grid.axis(0).points(), grid.axis(0).spacing())
        : Shells.ofPoints(grid).means();
  }

  /**
   * Wave numbers of the spectra.
   *
   * @param grid a ring or a plane
   * @return new array: 0, 2 pi/L, ... on a ring, mean wave numbers of shells on a plane
   */
  public static double[] waveNumbers(PeriodicGrid grid) {
    return grid.dimension() == 1
        ? steps(grid.axis(0).points(), grid.axis(0).waveNumber(1))
        : Shells.ofWaveNumbers(grid).means();
  }

  /**
   * How many points of a grid have each distance.
   *
   * @param grid a ring or a plane
   * @return new array
   */
  public static int[] distanceWeights(PeriodicGrid grid) {
    return grid.dimension() == 1
        ? pairs(grid.axis(0).points())
        : Shells.ofPoints(grid).weights();
  }

  /**
   * How many modes of a grid have each wave number.
   *
   * @param grid a ring or a plane
   * @return new array
   */
  public static int[] waveNumberWeights(PeriodicGrid grid) {
    return grid.dimension() == 1
        ? pairs(grid.axis(0).points())
        : Shells.ofWaveNumbers(grid).weights();
  }

  private static double[] steps(int points, double step) {
    double[] values = new double[points / 2 + 1];
    for (int i = 0; i < values.length; i++) {
      values[i] = i * step;
    }
    return values;
  }

  private static int[] pairs(int points) {
    int[] weights = new int[points / 2 + 1];
    for (int i = 0; i < weights.length; i++) {
      weights[i] = i == 0 || 2 * i == points ? 1 : 2;
    }
    return weights;
  }

  /**
   * Scratch array.
   *
   * @return live array, one number for each point
   */
  public final double[] first() {
    return first;
  }

  /**
   * Another scratch array.
   *
   * @return live array, one number for each point
   */
  public final double[] second() {
    return second;
  }

  /**
   * C(r) = mean over y of [a(y) b(y+r) + a(y) b(y-r)]/2 with the scratch arrays a = {@link #first},
   * b = {@link #second}.
   *
   * @param result overwritten from index 0 with a number for each distance
   */
  public final void realCorrelation(double[] result) {
    spectra();
    for (int k = 0; k < first.length; k++) {
      int m = mirror(k);
      if (m >= k) {
        double re = data[2 * k];
        double im = data[2 * k + 1];
        double reM = data[2 * m];
        double imM = data[2 * m + 1];
        // a_k = (z_k + z_-k^*)/2, b_k = (z_k - z_-k^*)/(2i), and Re a_k^* b_k is even in k
        setEven(k, m, ((re + reM) * (im + imM) - (im - imM) * (re - reM)) / 4, 0);
      }
    }
    inverse();
    correlation(0, result);
  }

  /**
   * C(r) of {@link #first} with itself and of {@link #second} with itself, two real profiles by one
   * transform there and one back.
   *
   * @param ofFirst overwritten from index 0 with a number for each distance
   * @param ofSecond overwritten from index 0 with a number for each distance
   */
  public final void ownCorrelations(double[] ofFirst, double[] ofSecond) {
    spectra();
    for (int k = 0; k < first.length; k++) {
      int m = mirror(k);
      if (m >= k) {
        double re = data[2 * k];
        double im = data[2 * k + 1];
        double reM = data[2 * m];
        double imM = data[2 * m + 1];
        // a_k and b_k as above; both powers are even in k
        setEven(
            k, m, ((re + reM) * (re + reM) + (im - imM) * (im - imM)) / 4,
            ((im + imM) * (im + imM) + (re - reM) * (re - reM)) / 4);
      }
    }
    inverse();
    correlation(0, ofFirst);
    correlation(1, ofSecond);
  }

  private void setEven(int k, int mirror, double re, double im) {
    data[2 * k] = re;
    data[2 * k + 1] = im;
    data[2 * mirror] = re;
    data[2 * mirror + 1] = im;
  }

  /**
   * Re C(r), C(r) = mean over y of z^*(y) z(y+r), z = {@link #first} + i {@link #second}. The mean
   * of r and -r has no imaginary part.
   *
   * @param result overwritten from index 0 with a number for each distance
   */
  public final void complexCorrelation(double[] result) {
    spectra();
    takePowers();
    inverse();
    correlation(0, result);
  }

  private void correlation(int part, double[] result) {
    byDistance(part, result);
    scale(result, distanceCount(), 1 / ((double) first.length * first.length));
  }

  /**
   * |A_k|<sup>2</sup>, A_k = cell volume times sum of a exp(-ikx), a = {@link #first}; overwrites
   * {@link #second}.
   *
   * @param cell volume of a cell
   * @param result overwritten from index 0 with a number for each wave number
   */
  public final void powerSpectrum(double cell, double[] result) {
    Arrays.fill(second, 0);
    spectra();
    takePowers();
    byWaveNumber(result);
    scale(result, waveNumberCount(), cell * cell);
  }

  private static void scale(double[] result, int count, double factor) {
    for (int i = 0; i < count; i++) {
      result[i] *= factor;
    }
  }

  private void spectra() {
    for (int i = 0; i < first.length; i++) {
      data[2 * i] = first[i];
      data[2 * i + 1] = second[i];
    }
    forward();
  }

  private void takePowers() {
    for (int k = 0; k < data.length; k += 2) {
      data[k] = data[k] * data[k] + data[k + 1] * data[k + 1];
      data[k + 1] = 0;
    }
  }

  abstract void forward();

  abstract void inverse();

  /** Index of -k. */
  abstract int mirror(int k);

  abstract int distanceCount();

  abstract int waveNumberCount();

  /** Picks or averages the real (0) or imaginary (1) parts of the data, points. */
  abstract void byDistance(int part, double[] result);

  /** Picks or averages the real parts of the data, modes. */
  abstract void byWaveNumber(double[] result);

  private static final class Ring extends Correlator {
    private final FourierTransform fourier;
    private final int points;

    Ring(Model model) {
      super(model.region().grid().points());
      this.points = model.region().grid().points();
      this.fourier = model.fourierProvider().transform(points);
    }

    @Override
    void forward() {
      fourier.forward(data, 0);
    }

    @Override
    void inverse() {
      fourier.inverse(data, 0);
    }

    @Override
    int mirror(int k) {
      return (points - k) % points;
    }

    @Override
    int distanceCount() {
      return points / 2 + 1;
    }

    @Override
    int waveNumberCount() {
      return points / 2 + 1;
    }

    @Override
    void byDistance(int part, double[] result) {
      for (int i = 0; i <= points / 2; i++) {
        result[i] = data[2 * i + part];
      }
    }

    @Override
    void byWaveNumber(double[] result) {
      byDistance(0, result);
    }
  }

  private static final class Plane extends Correlator {
    private final FourierTransform overX;
    private final FourierTransform overY;
    private final int pointsX;
    private final int pointsY;
    private final double[] column;
    private final Shells distances;
    private final Shells waveNumbers;

    Plane(Model model) {
      super(model.region().grid().points());
      PeriodicGrid grid = model.region().grid();
      Axis x = grid.axis(0);
      Axis y = grid.axis(1);
      this.pointsX = x.points();
      this.pointsY = y.points();
      this.overX = model.fourierProvider().transform(pointsX);
      this.overY = model.fourierProvider().transform(pointsY);
      this.column = new double[2 * pointsY];
      this.distances = Shells.ofPoints(grid);
      this.waveNumbers = Shells.ofWaveNumbers(grid);
    }

    @Override
    void forward() {
      transform(true);
    }

    @Override
    void inverse() {
      transform(false);
    }

    private void transform(boolean forward) {
      for (int y = 0; y < pointsY; y++) {
        if (forward) {
          overX.forward(data, 2 * y * pointsX);
        } else {
          overX.inverse(data, 2 * y * pointsX);
        }
      }
      for (int x = 0; x < pointsX; x++) {
        for (int y = 0; y < pointsY; y++) {
          column[2 * y] = data[2 * (y * pointsX + x)];
          column[2 * y + 1] = data[2 * (y * pointsX + x) + 1];
        }
        if (forward) {
          overY.forward(column, 0);
        } else {
          overY.inverse(column, 0);
        }
        for (int y = 0; y < pointsY; y++) {
          data[2 * (y * pointsX + x)] = column[2 * y];
          data[2 * (y * pointsX + x) + 1] = column[2 * y + 1];
        }
      }
    }

    @Override
    int mirror(int k) {
      int x = k % pointsX;
      int y = k / pointsX;
      return (pointsY - y) % pointsY * pointsX + (pointsX - x) % pointsX;
    }

    @Override
    int distanceCount() {
      return distances.size();
    }

    @Override
    int waveNumberCount() {
      return waveNumbers.size();
    }

    @Override
    void byDistance(int part, double[] result) {
      distances.average(data, 2, part, result);
    }

    @Override
    void byWaveNumber(double[] result) {
      waveNumbers.average(data, 2, 0, result);
    }
  }
}
