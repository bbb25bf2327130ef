package spgpe.theory;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class MathieuTest {

  /** Abramowitz and Stegun, table 20.1, and DLMF chapter 28 (values from memory). */
  @Test
  void publishedCharacteristicValues() {
    assertEquals(-5.80004602, Mathieu.evenValue(0, 5), 6e-9);
    assertEquals(-13.93697996, Mathieu.evenValue(0, 10), 6e-9);
    assertEquals(-40.25677955, Mathieu.evenValue(0, 25), 6e-9);
    assertEquals(2.09946045, Mathieu.oddValue(2, 5), 6e-9);
    assertEquals(-2.38215824, Mathieu.oddValue(2, 10), 6e-9);
    assertEquals(-.45513860, Mathieu.evenValue(0, 1), 6e-9);
    assertEquals(-.11024882, Mathieu.oddValue(1, 1), 6e-9);
    assertEquals(1.85910807, Mathieu.evenValue(1, 1), 6e-9);
  }

  /** Further values computed independently with another library's routine. */
  @Test
  void furtherCharacteristicValues() {
    assertEquals(1.85818754, Mathieu.evenValue(1, 5), 6e-9);
    assertEquals(-5.79008060, Mathieu.oddValue(1, 5), 6e-9);
    assertEquals(-2.39914240, Mathieu.evenValue(1, 10), 6e-9);
    assertEquals(-13.93655248, Mathieu.oddValue(1, 10), 6e-9);
    assertEquals(4.37130098, Mathieu.evenValue(2, 1), 6e-9);
    assertEquals(3.91702477, Mathieu.oddValue(2, 1), 6e-9);
  }

  /** DLMF 28.6.1: a_0 = -q^2/2 + 7 q^4/128 - 29 q^6/2304 + ... */
  @Property(tries = 40)
  void smallQ(@ForAll @DoubleRange(min = 0, max = 0.2) double q) {
    double q2 = q * q;
    double series = -q2 / 2 + 7 * q2 * q2 / 128 - 29 * q2 * q2 * q2 / 2304;
    assertEquals(series, Mathieu.evenValue(0, q), 1e-2 * q2 * q2 * q2 * q2 + 1e-13);
  }

  /** Growth exponents per unit z; derived, see docs/theory-references.md. */
  @ParameterizedTest
  @CsvSource({
    "1, .1, .04994157", "1, .2, .09953644", "1, .5, .24314576", "1, 1, .45345353",
    ".5, 1, .47422426", "4, 1, .04643032", "-.2, .5, .29561108"
  })
  void growth(double a, double q, double growth) {
    assertEquals(growth, Mathieu.exponent(a, q).growth(), 6e-9);
  }

  /** Stable exponents, principal value; derived, see docs/theory-references.md. */
  @ParameterizedTest
  @CsvSource({"2, 1, .78342374", "2.5, 2, .75337991", "3, .5, .28514924", "0, .5, .37374412"})
  void stableExponent(double a, double q, double exponent) {
    assertEquals(0, Mathieu.exponent(a, q).growth(), 0);
    assertEquals(exponent, Mathieu.exponent(a, q).frequency(), 6e-9);
  }

  /** Trace of the monodromy over pi, and minus two at the edges of the first band. */
  @Test
  void trace() {
    assertEquals(-2.61241891, traceAt(1, .5), 6e-9);
    assertEquals(-4.39666773, traceAt(1, 1), 6e-9);
    assertEquals(-2, traceAt(Mathieu.oddValue(1, 1), 1), 1e-11);
    assertEquals(-2, traceAt(Mathieu.evenValue(1, 1), 1), 1e-11);
    assertEquals(2, traceAt(Mathieu.evenValue(0, 1), 1), 1e-11);
    assertEquals(2, traceAt(Mathieu.oddValue(2, 3), 3), 1e-10);
  }

  private static double traceAt(double a, double q) {
    return Monodromy.of(0, z -> 1, z -> -(a - 2 * q * Math.cos(2 * z)), Math.PI).trace();
  }

  @Test
  void refusals() {
    assertThrows(IllegalArgumentException.class, () -> Mathieu.evenValue(0, Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> Mathieu.oddValue(0, 1));
    assertThrows(IllegalArgumentException.class, () -> Mathieu.exponent(Double.NaN, 1));
  }
}
