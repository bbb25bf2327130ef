package spgpe.benchmarks;

import java.util.Locale;
import spgpe.integrate.Stepper;

/**
 * Times the step like the program in {@code peer/} does, for alternating runs: arguments points,
 * steps, repeats, integrator, lanes and, for a square of points times points, the word plane.
 * Prints microseconds for each trajectory and step, best of the repeats after one that is not
 * counted.
 */
public final class StepTimer {
  private StepTimer() {}

  /**
   * Runs the timer.
   *
   * @param arguments points, steps, repeats, integrator, lanes[, plane]
   */
  public static void main(String[] arguments) {
    int points = Integer.parseInt(arguments[0]);
    int steps = Integer.parseInt(arguments[1]);
    int repeats = Integer.parseInt(arguments[2]);
    int lanes = Integer.parseInt(arguments[4]);
    boolean plane = arguments.length > 5 && "plane".equals(arguments[5]);
    Stepper stepper =
        Problem.startedStepper(
            plane ? Problem.plane(points) : Problem.model(points),
            Problem.integrator(arguments[3]), lanes);
    double best = Double.POSITIVE_INFINITY;
    for (int r = 0; r <= repeats; r++) {
      long begin = System.nanoTime();
      for (int i = 0; i < steps; i++) {
        stepper.advance();
      }
      double each = (System.nanoTime() - begin) * 1e-3 / steps / lanes;
      best = r == 0 ? best : Math.min(best, each);
    }
    System.out.printf(
        Locale.ROOT, "N=%d %s lanes=%d: %.3f us/step%n", points, arguments[3], lanes, best);
  }
}
