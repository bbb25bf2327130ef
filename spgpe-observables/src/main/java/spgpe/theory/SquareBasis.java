package spgpe.theory;

import java.util.ArrayList;
import java.util.List;

/**
 * Modes of a periodic square with {@code n_x^2 + n_y^2 <= cutoff^2} in the symmetry classes of the
 * square: even-even symmetric (0) and antisymmetric (1) under exchange of the axes, even-odd with
 * its mirror image (2), odd-odd symmetric (3) and antisymmetric (4). Grid on a quarter of the
 * square.
 */
final class SquareBasis implements ModeBasis {
  private static final int MIXED = 2;

  final double length;
  final int cutoff;
  private final int side;
  private final List<List<int[]>> modes = new ArrayList<>();
  /** Modes of a class on the grid times the root of the weight, [class][mode][point]. */
  private final double[][][] weighted;
  private final double[] weights;

  SquareBasis(double length, int cutoff) {
    this.length = length;
    this.cutoff = cutoff;
    side = 2 * cutoff + 2;
    for (int symmetry = 0; symmetry < 5; symmetry++) {
      modes.add(list(symmetry));
    }
    weights = new double[side * side];
    double step = length / (4 * cutoff + 2);
    for (int p = 0; p < weights.length; p++) {
      weights[p] = step * step * multiplicity(p / side) * multiplicity(p % side);
    }
    weighted = new double[5][][];
    for (int symmetry = 0; symmetry < 5; symmetry++) {
      weighted[symmetry] = new double[count(symmetry)][];
      for (int i = 0; i < count(symmetry); i++) {
        weighted[symmetry][i] = onGrid(symmetry, modes.get(symmetry).get(i));
      }
    }
  }

  private int multiplicity(int point) {
    return point == 0 || point == side - 1 ? 1 : 2;
  }

  private List<int[]> list(int symmetry) {
    List<int[]> list = new ArrayList<>();
    for (int a = 0; a <= cutoff; a++) {
      for (int b = 0; b <= cutoff; b++) {
        boolean kept = a * a + b * b <= cutoff * cutoff;
        boolean wanted =
            switch (symmetry) {
              case 0 -> a >= b;
              case 1 -> a > b;
              case MIXED -> b >= 1;
              case 3 -> a >= b && b >= 1;
              default -> a > b && b >= 1;
            };
        if (kept && wanted) {
          list.add(new int[] {a, b});
        }
      }
    }
    return list;
  }

  private double[] onGrid(int symmetry, int[] mode) {
    double[] f = new double[side * side];
    boolean oddFirst = symmetry > MIXED;
    boolean oddSecond = symmetry >= MIXED;
    for (int p = 0; p < f.length; p++) {
      int x = p / side;
      int y = p % side;
      double direct = wave(mode[0], x, oddFirst) * wave(mode[1], y, oddSecond);
      if (symmetry != MIXED && mode[0] != mode[1]) {
        double exchanged = wave(mode[0], y, oddFirst) * wave(mode[1], x, oddSecond);
        int sign = symmetry == 1 || symmetry == 4 ? -1 : 1;
        direct = Math.sqrt(0.5) * (direct + sign * exchanged);
      }
      f[p] = direct * Math.sqrt(weights[p]);
    }
    return f;
  }

  private double wave(int mode, int point, boolean odd) {
    double angle = 2 * Math.PI * mode * point / (4 * cutoff + 2);
    double norm = mode == 0 ? 1 / Math.sqrt(length) : Math.sqrt(2 / length);
    return norm * (odd ? Math.sin(angle) : Math.cos(angle));
  }

  @Override
  public int classes() {
    return 5;
  }

  @Override
  public int degeneracy(int symmetry) {
    return symmetry == MIXED ? 2 : 1;
  }

  @Override
  public int count(int symmetry) {
    return modes.get(symmetry).size();
  }

  @Override
  public double squaredWaveNumber(int symmetry, int mode) {
    int[] n = modes.get(symmetry).get(mode);
    double unit = 2 * Math.PI / length;
    return unit * unit * (n[0] * n[0] + n[1] * n[1]);
  }

  @Override
  public double volume() {
    return length * length;
  }

  @Override
  public SquareBasis stretched(double factor) {
    return new SquareBasis(length * factor, cutoff);
  }

  @Override
  public int points() {
    return side * side;
  }

  @Override
  public double radius(int point) {
    return length / (4 * cutoff + 2) * Math.hypot(point / side, point % side);
  }

  @Override
  public double[] values(double[] coefficients) {
    double[] f = new double[points()];
    for (int i = 0; i < coefficients.length; i++) {
      VectorMath.add(f, coefficients[i], weighted[0][i]);
    }
    for (int p = 0; p < f.length; p++) {
      f[p] /= Math.sqrt(weights[p]);
    }
    return f;
  }

  @Override
  public double[] coefficients(double[] values) {
    double[] scaled = values.clone();
    for (int p = 0; p < scaled.length; p++) {
      scaled[p] *= Math.sqrt(weights[p]);
    }
    return VectorMath.times(weighted[0], scaled);
  }

  @Override
  public double integral(double[] values) {
    return VectorMath.dot(weights, values);
  }

  @Override
  public void addMultiplication(
      double[][] matrix, int row, int column, double[] function, int symmetry) {
    double[][] f = weighted[symmetry];
    double[] product = new double[function.length];
    for (int i = 0; i < f.length; i++) {
      for (int p = 0; p < product.length; p++) {
        product[p] = f[i][p] * function[p];
      }
      for (int j = 0; j <= i; j++) {
        double element = VectorMath.dot(product, f[j]);
        matrix[row + i][column + j] += element;
        if (j < i) {
          matrix[row + j][column + i] += element;
        }
      }
    }
  }
}
