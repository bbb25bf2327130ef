package spgpe.hamiltonian;

/** Multiplication of an element by a phase factor. */
final class PhaseTurn {
  private PhaseTurn() {}

  static void turn(double[] re, double[] im, int i, double angle) {
    double c = Math.cos(angle);
    double s = Math.sin(angle);
    double x = re[i];
    re[i] = c * x - s * im[i];
    im[i] = c * im[i] + s * x;
  }
}
