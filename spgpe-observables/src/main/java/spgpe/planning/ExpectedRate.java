package spgpe.planning;

import java.util.List;
import spgpe.internal.check.Check;
import spgpe.units.EventRate;

/**
 * Decay rate of the whole ring as theory expects it, and how far a simulation may differ.
 *
 * @param basis which theory gave it
 * @param rate decays per second of the whole ring, d = 0
 * @param barrierOverTemperature E_b/T that is in the rate
 * @param closedBarrierOverTemperature E_b/T of the closed form at fixed density, for comparison
 * @param lowRatio smallest ratio simulation/theory to expect
 * @param highRatio largest ratio simulation/theory to expect
 * @param remarks why the basis was chosen and where it leaves its checked range; empty if nowhere
 */
public record ExpectedRate(
    Basis basis,
    EventRate rate,
    double barrierOverTemperature,
    double closedBarrierOverTemperature,
    double lowRatio,
    double highRatio,
    List<String> remarks) {
  /** Which theory gave the rate, best first. */
  public enum Basis {
    /** Saddle and fluctuations of the full two-component field with the cutoff of the run. */
    FULL_SADDLE,
    /** Barrier of the full saddle, prefactor of the relative phase alone. */
    SADDLE_BARRIER,
    /** Barrier and prefactor of the relative phase alone, densities fixed: order of magnitude. */
    CLOSED_FORM
  }

  /**
   * Checks the parts.
   *
   * @param basis which theory gave it
   * @param rate decays per second of the whole ring, d = 0
   * @param barrierOverTemperature E_b/T that is in the rate
   * @param closedBarrierOverTemperature E_b/T of the closed form at fixed density, for comparison
   * @param lowRatio smallest ratio simulation/theory to expect
   * @param highRatio largest ratio simulation/theory to expect
   * @param remarks why the basis was chosen and where it leaves its checked range
   * @throws IllegalArgumentException if a part is null, the rate is not positive or not a plain
   *     rate, or the band is empty
   */
  public ExpectedRate {
    Check.notNull(basis, "basis");
    Check.positive(Check.notNull(rate, "rate").perSecondPerMetreToD(), "rate in 1/s");
    Check.inRange(rate.dimension(), 0, 0, "dimension of the rate");
    Check.positive(barrierOverTemperature, "barrierOverTemperature");
    Check.positive(closedBarrierOverTemperature, "closedBarrierOverTemperature");
    Check.notNegative(lowRatio, "lowRatio");
    Check.argument(
        highRatio >= lowRatio && Double.isFinite(highRatio),
        "the ratio band must not be empty: lowRatio=%s, highRatio=%s",
        lowRatio,
        highRatio);
    remarks = List.copyOf(Check.notNull(remarks, "remarks"));
  }
}
