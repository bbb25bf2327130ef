package spgpe.examples.integrator;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import spgpe.integrate.OuRk4;
import spgpe.integrate.bench.EquilibriumBias;

class MeasureIntegratorTest {
  @Test
  void benchRunsAUsersOwnIntegrator() {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    MeasureIntegrator.report(new PrintStream(bytes, true, StandardCharsets.UTF_8));
    String text = bytes.toString(StandardCharsets.UTF_8);
    Matcher order = Pattern.compile("order ([0-9.]+)").matcher(text);
    assertTrue(order.find(), text);
    assertEquals(2, Double.parseDouble(order.group(1)), 0.1, text);
    assertTrue(order.find());
    assertEquals(1, Double.parseDouble(order.group(1)), 0.3, text);
  }

  /** Without an interaction picture the same bias costs several times as much. */
  @Test
  void ownSchemeCostsMoreThanTheDefault() {
    EquilibriumBias modes = EquilibriumBias.onRing(16, 8, 1, 0.05);
    double own = 2 / modes.largestStep(new ExplicitMidpoint(1), 1e-3, 0.2);
    double standard = 4 / modes.largestStep(OuRk4.ofStep(1), 1e-3, 0.2);
    assertTrue(own > 2.5 * standard, "own=" + own + ", default=" + standard);
  }
}
