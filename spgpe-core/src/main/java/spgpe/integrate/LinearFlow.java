package spgpe.integrate;

import spgpe.hamiltonian.ModeMatrix;
import spgpe.internal.linear.ComplexMatrix;
import spgpe.model.Model;

/** Tables of exp(-(i + Gamma) h(k) tau) for every mode. */
final class LinearFlow {
  private LinearFlow() {}

  static ModeTable over(double tau, Model model, int lanes) {
    ModeMatrix h = model.linearPart();
    int n = model.components();
    boolean diagonal = h.isDiagonal();
    ComplexMatrix[] flows = new ComplexMatrix[model.region().modes()];
    for (int m = 0; m < flows.length; m++) {
      ComplexMatrix generator = new ComplexMatrix(n);
      for (int i = 0; i < n; i++) {
        double gamma = model.reservoir().damping(i);
        for (int j = 0; j < n; j++) {
          double re = h.re(m, i, j);
          double im = h.im(m, i, j);
          generator.set(i, j, -(gamma * re - im) * tau, -(re + gamma * im) * tau);
        }
      }
      flows[m] = diagonal ? exponentialOfDiagonal(generator) : generator.exp();
    }
    return ModeTable.of(flows, lanes);
  }

  private static ComplexMatrix exponentialOfDiagonal(ComplexMatrix generator) {
    ComplexMatrix result = new ComplexMatrix(generator.size());
    for (int i = 0; i < generator.size(); i++) {
      double size = Math.exp(generator.re(i, i));
      double angle = generator.im(i, i);
      result.set(i, i, size * Math.cos(angle), size * Math.sin(angle));
    }
    return result;
  }
}
