package spgpe.observables;

import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import spgpe.model.Model;
import spgpe.projector.Amplitudes;
import spgpe.reservoir.RandomStreams;
import spgpe.run.InitialState;
import spgpe.run.Snapshot;

/** psi_1 = -exp(i phi), psi_2 = 1 on a plane, phi real and Gaussian with a given spectrum. */
final class PlanePhases {
  private final Model model;
  private final DoubleUnaryOperator spectrum;
  private final Random random;
  private final double[] phase;

  /** The spectrum is &lt;|phi_k|^2&gt; of phi = V^(-1/2) sum of phi_k exp(ikr). */
  PlanePhases(Model model, DoubleUnaryOperator spectrum, long seed) {
    this.model = model;
    this.spectrum = spectrum;
    this.random = new Random(seed);
    this.phase = new double[model.region().grid().points()];
  }

  Snapshot next() {
    Amplitudes a = new Amplitudes(model.region(), 2, 1);
    for (int m = 0; m < model.region().modes(); m++) {
      int nx = model.region().modeNumber(0, m);
      int ny = model.region().modeNumber(1, m);
      int mirror = model.region().indexOf(-nx, -ny);
      double sigma = Math.sqrt(spectrum.applyAsDouble(Math.sqrt(model.region().kSquared(m))));
      if (m == mirror) {
        a.re(0)[m] = sigma * random.nextGaussian();
      } else if (m < mirror) {
        a.re(0)[m] = sigma * Math.sqrt(0.5) * random.nextGaussian();
        a.im(0)[m] = sigma * Math.sqrt(0.5) * random.nextGaussian();
        a.re(0)[mirror] = a.re(0)[m];
        a.im(0)[mirror] = -a.im(0)[m];
      }
    }
    System.arraycopy(Snapshot.of(model, a, 0).field().re(0), 0, phase, 0, phase.length);
    Amplitudes state = new Amplitudes(model.region(), 2, 1);
    double spacing = model.region().grid().axis(0).spacing();
    int points = model.region().grid().axis(0).points();
    InitialState.fromField(
            (c, x, y, psi) -> {
              int p = (int) Math.rint(y / spacing) * points + (int) Math.rint(x / spacing);
              psi[0] = c == 0 ? -Math.cos(phase[p]) : 1;
              psi[1] = c == 0 ? -Math.sin(phase[p]) : 0;
            })
        .prepare(model, RandomStreams.counterBased(1).initialState(0), state);
    return Snapshot.of(model, state, 0);
  }

  /** Gaussian smoothing by its definition, along x and then along y. */
  static double[] smoothed(double[] frame, int points, double side, double sigma) {
    double[] kernel = new double[points];
    double all = 0;
    for (int i = 0; i < points; i++) {
      double r = Math.IEEEremainder(i * side / points, side);
      kernel[i] = Math.exp(-r * r / (2 * sigma * sigma));
      all += kernel[i];
    }
    double[] rows = new double[frame.length];
    double[] result = new double[frame.length];
    for (int p = 0; p < frame.length; p++) {
      for (int i = 0; i < points; i++) {
        rows[p] += kernel[i] / all * frame[p / points * points + (p + i) % points];
      }
    }
    for (int p = 0; p < frame.length; p++) {
      for (int i = 0; i < points; i++) {
        result[p] += kernel[i] / all * rows[(p + i * points) % frame.length];
      }
    }
    return result;
  }
}
