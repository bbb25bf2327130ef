package spgpe.observables.thermometry;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import spgpe.internal.check.Check;
import spgpe.internal.measure.CurveFit;
import spgpe.internal.measure.Masses;
import spgpe.model.Model;
import spgpe.statistics.Estimate;
import spgpe.observables.TimeAverage;
import spgpe.projector.CoherentRegion;

/**
 * Temperature from the tail of the occupations: at large k the field is nearly free,
 *
 * <pre>T/n_k = k^2/(2m) + offset,</pre>
 *
 * <p>with the offset as free parameter (mean field less chemical potential, 2 g n - mu for one
 * component). The fit is linear in 1/n_k over modes of a range of wave numbers; modes of equal |k|
 * are averaged and shells taken as independent. The line is a limit: pairing of k and -k bends it,
 * T/n_k = (e + a) - b<sup>2</sup>/(e + a) in Bogoliubov theory (e = k<sup>2</sup>/(2m); a = b = g n
 * for one component at mu = g n), so that a fit from e_1 to e_2 finds T too low by about the factor
 * 1 + b<sup>2</sup>/((e_1 + a)(e_2 + a)). A time step that is too long shows first at the upper
 * end. Immutable and thread-safe.
 *
 * @param temperature T
 * @param offset energy offset
 * @param chiSquare weighted sum of squares
 * @param degreesOfFreedom shells less two
 */
public record OccupationTail(
    Estimate temperature, Estimate offset, double chiSquare, int degreesOfFreedom) {

  private static final double SAME = 1e-9;

  /**
   * Fits the tail.
   *
   * @param model the model that was run
   * @param component component whose occupations were averaged; its mass is used
   * @param occupations average of {@code ModeOccupation} with errors
   * @param from smallest wave number used
   * @param to largest wave number used
   * @return the fit
   * @throws IllegalArgumentException if the average is not of mode occupations, the range holds
   *     fewer than three shells, or an occupation or its error is not positive
   */
  public static OccupationTail fit(
      Model model, int component, TimeAverage occupations, double from, double to) {
    Check.notNull(occupations, "occupations");
    CoherentRegion region = Check.notNull(model, "model").region();
    Check.inRange(component, 0, model.components() - 1, "component");
    Check.argument(
        occupations.size() == region.modes(),
        "the average must be of mode occupations: modes=%s, numbers of the average=%s",
        region.modes(), occupations.size());
    Check.argument(to > from, "the range must have from < to: from=%s, to=%s", from, to);
    double mass = Masses.of(model)[component];
    TreeMap<Double, List<Integer>> shells = new TreeMap<>();
    for (int m = 0; m < region.modes(); m++) {
      double k = Math.sqrt(region.kSquared(m));
      if (k >= from && k <= to) {
        Double near = shells.floorKey(k * (1 + SAME));
        double key = near != null && near >= k * (1 - SAME) ? near : k;
        shells.computeIfAbsent(key, unused -> new ArrayList<>()).add(m);
      }
    }
    int n = shells.size();
    Check.argument(
        n >= 3, "the range must hold at least three wave numbers: from=%s, to=%s, found=%s",
        from, to, n);
    double[] x = new double[n];
    double[] y = new double[n];
    double[][] covariance = new double[n][n];
    int i = 0;
    for (Map.Entry<Double, List<Integer>> shell : shells.entrySet()) {
      double sum = 0;
      double variance = 0;
      for (int m : shell.getValue()) {
        sum += occupations.mean(m);
        variance += occupations.standardError(m) * occupations.standardError(m);
      }
      int count = shell.getValue().size();
      double mean = sum / count;
      Check.positive(mean, "mean occupation at k=" + shell.getKey());
      x[i] = shell.getKey() * shell.getKey() / (2 * mass);
      y[i] = 1 / mean;
      covariance[i][i] = variance / count / count / Math.pow(mean, 4);
      i++;
    }
    double slope = (y[n - 1] - y[0]) / (x[n - 1] - x[0]);
    CurveFit.Result r =
        CurveFit.fit(
            x, y, covariance, 1, new double[] {slope > 0 ? 1 / slope : 1, 0},
            (e, p, gradient) -> {
              gradient[0] = -(e + p[1]) / (p[0] * p[0]);
              gradient[1] = 1 / p[0];
              return (e + p[1]) / p[0];
            });
    return new OccupationTail(
        new Estimate(r.parameters()[0], r.error(0)), new Estimate(r.parameters()[1], r.error(1)),
        r.chiSquare(), r.degreesOfFreedom());
  }
}
