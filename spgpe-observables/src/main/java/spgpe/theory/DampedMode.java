package spgpe.theory;

/**
 * A damped normal mode, amplitude proportional to {@code exp(-rate t)}.
 *
 * @param slowRate smaller decay rate (1/time); negative for an unstable mode
 * @param fastRate larger decay rate; equal to the slow one if the mode oscillates
 * @param frequency angular frequency (1/time), zero if overdamped
 */
public record DampedMode(double slowRate, double fastRate, double frequency) {

  /** Eigenvalues of [[-gamma B, A], [-B, -gamma A]]. */
  static DampedMode of(double a, double b, double damping) {
    double mean = 0.5 * damping * (a + b);
    double split = 0.5 * damping * (a - b);
    double discriminant = split * split - a * b;
    if (discriminant <= 0) {
      return new DampedMode(mean, mean, Math.sqrt(-discriminant));
    }
    double root = Math.sqrt(discriminant);
    return new DampedMode(mean - root, mean + root, 0);
  }
}
