package spgpe.theory;

/**
 * Kept modes of a periodic box, sorted into symmetry classes of a configuration centred at the
 * origin; class zero is fully symmetric. Functions are given on a grid of one symmetric part of the
 * box that integrates products of four modes exactly.
 */
interface ModeBasis {
  /** Number of symmetry classes. */
  int classes();

  /** How often the spectrum of a class occurs. */
  int degeneracy(int symmetry);

  int count(int symmetry);

  double squaredWaveNumber(int symmetry, int mode);

  /** Length or area of the box. */
  double volume();

  /** The same modes in a box whose linear size is multiplied by a factor. */
  ModeBasis stretched(double factor);

  int points();

  /** Distance of a grid point from the centre. */
  double radius(int point);

  /** Grid values of a fully symmetric function given by its coefficients. */
  double[] values(double[] coefficients);

  /** Coefficients of a fully symmetric function given on the grid. */
  double[] coefficients(double[] values);

  double integral(double[] values);

  /** Adds the matrix of multiplication by a fully symmetric function within a class. */
  void addMultiplication(double[][] matrix, int row, int column, double[] function, int symmetry);

  /** Adds k^2 to the diagonal of a block. */
  default void addKinetic(double[][] matrix, int start, int symmetry) {
    for (int i = 0; i < count(symmetry); i++) {
      matrix[start + i][start + i] += squaredWaveNumber(symmetry, i);
    }
  }
}
