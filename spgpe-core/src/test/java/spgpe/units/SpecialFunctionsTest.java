package spgpe.units;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.apache.commons.math3.special.BesselJ;
import org.apache.commons.math3.special.Erf;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class SpecialFunctionsTest {
  /** Abramowitz and Stegun, Handbook of Mathematical Functions, table 9.1. */
  @ParameterizedTest
  @CsvSource({
    "0.1, 0.997501562066040",
    "1, 0.765197686557967",
    "2, 0.223890779141236",
    "5, -0.177596771314338",
    "10, -0.245935764451348",
    "17.5, -0.103110398228686"
  })
  void besselJ0MatchesTheHandbook(double x, double expected) {
    assertEquals(expected, 1 - SpecialFunctions.oneMinusBesselJ0(x), 1e-14);
  }

  /** Abramowitz and Stegun, table 9.1. */
  @ParameterizedTest
  @CsvSource({"1, 0.4400505857", "5, -0.3275791376", "10, 0.0434727462"})
  void besselJ1MatchesTheHandbook(double x, double expected) {
    assertEquals(expected, SpecialFunctions.besselJ1(x), 6e-11);
    assertEquals(BesselJ.value(1, x), SpecialFunctions.besselJ1(x), 1e-14);
  }

  @Test
  void smallArgumentsOfOneMinusJ0DoNotCancel() {
    // series x^2/4 - x^4/64, next term below 1e-19 relative
    double x = 1e-5;
    double expected = x * x / 4 - x * x * x * x / 64;
    assertEquals(expected, SpecialFunctions.oneMinusBesselJ0(x), 1e-14 * expected);
    assertEquals(0, SpecialFunctions.oneMinusBesselJ0(0));
  }

  @Property(tries = 100)
  void besselFunctionsMatchAnIndependentLibrary(
      @ForAll @DoubleRange(min = 0, max = 4000) double x) {
    assertEquals(BesselJ.value(0, x), 1 - SpecialFunctions.oneMinusBesselJ0(x), 1e-12);
    assertEquals(BesselJ.value(1, x), SpecialFunctions.besselJ1(x), 1e-12);
  }

  /** Reference values by scipy.special.k0e; those at 0.1, 1, 5, 10 agree with A and S table 9.8. */
  @ParameterizedTest
  @CsvSource({
    "1e-10, 23.14178244791304",
    "0.01, 4.768694028544461",
    "0.1, 2.6823261022628944",
    "1, 1.1444630798068947",
    "5, 0.547807564313519",
    "10, 0.39163193443659866",
    "100, 0.1251756216591266",
    "1e4, 0.012532984717699288"
  })
  void scaledK0MatchesReference(double x, double expected) {
    assertEquals(expected, SpecialFunctions.scaledBesselK0(x), 2e-14 * expected);
  }

  /** Reference values by scipy.special.erfcx, on both sides of the change of method at 1.5. */
  @ParameterizedTest
  @CsvSource({
    "0, 1",
    "0.1, 0.8964569799691268",
    "0.5, 0.6156903441929258",
    "1, 0.427583576155807",
    "1.4999, 0.32160177950763413",
    "1.5, 0.3215854164543176",
    "2, 0.2553956763105058",
    "5, 0.11070463773306861",
    "50, 0.011281536265323772",
    "1e6, 5.641895835474742e-7"
  })
  void scaledErfcMatchesReference(double x, double expected) {
    assertEquals(expected, SpecialFunctions.scaledErfc(x), 1e-14 * expected);
  }

  @Property(tries = 200)
  void scaledErfcMatchesAnIndependentLibrary(@ForAll @DoubleRange(min = 0, max = 5) double x) {
    double expected = Math.exp(x * x) * Erf.erfc(x);
    assertEquals(expected, SpecialFunctions.scaledErfc(x), 1e-12 * expected);
  }

  @Test
  void lerchAtOneIsALogarithm() {
    // Phi(1/2,1,1) = 2 ln 2, closed form
    assertEquals(2 * Math.log(2), SpecialFunctions.lerch(0.5, 100)[0], 1e-15);
  }

  @Test
  void lerchMatchesItsClosedFormAtSmallIntegers() {
    // z^j Phi(z,1,j) = -ln(1-z) - sum_{m<j} z^m/m, which still carries digits at j = 3
    double z = 0.7;
    double expected = (-Math.log(1 - z) - z - z * z / 2) / (z * z * z);
    assertEquals(expected, SpecialFunctions.lerch(z, 200)[2], 1e-14);
  }

  /**
   * Basis: direct double integral of the collision rate by quadrature, which agrees with the series
   * to 15 digits (derived, see docs/theory.md).
   */
  @ParameterizedTest
  @CsvSource({"0.2, 0.8931471805599453, 0.514556466111589", "0.3, 0.9, 0.684555496566666"})
  void collisionSumMatchesTheDoubleIntegral(double b, double c, double expected) {
    assertEquals(expected, SpecialFunctions.collisionSum(b, c), 2e-14);
  }

  /**
   * The wrong argument exp[(mu - 2 eps_cut)/kB T] would give 0.412 here instead of 0.685; the first
   * term alone, [ln(1 - e^(b-c))]^2 e^0, bounds the sum from below.
   */
  @Property(tries = 200)
  void collisionSumExceedsItsFirstTerm(
      @ForAll @DoubleRange(min = -20, max = 20) double b,
      @ForAll @DoubleRange(min = 0.01, max = 30) double gap) {
    double c = Math.max(b, 0) + gap;
    double first = Math.log1p(-Math.exp(b - c));
    double sum = SpecialFunctions.collisionSum(b, c);
    assertTrue(sum >= first * first * (1 - 1e-12), () -> sum + " < " + first * first);
    assertTrue(Double.isFinite(sum));
  }

  @Property(tries = 50)
  void collisionSumMatchesQuadrature(
      @ForAll @DoubleRange(min = 0, max = 2) double b,
      @ForAll @DoubleRange(min = 0.4, max = 3) double gap) {
    double c = b + gap;
    assertEquals(1, SpecialFunctions.collisionSum(b, c) / byQuadrature(b, c), 1e-6);
  }

  /** Midpoint rule in u = exp(c - x), v = exp(c - y), which maps the quarter plane to a square. */
  private static double byQuadrature(double b, double c) {
    int points = 1000;
    double z = Math.exp(b - c);
    double w = Math.exp(b - 2 * c);
    double sum = 0;
    for (int i = 0; i < points; i++) {
      double u = (i + 0.5) / points;
      for (int k = 0; k < points; k++) {
        double v = (k + 0.5) / points;
        // dx f(x) = du z/(1 - z u)
        sum += z / (1 - z * u) * (z / (1 - z * v)) * (1 + w * u * v / (1 - w * u * v));
      }
    }
    return sum / points / points;
  }
}
