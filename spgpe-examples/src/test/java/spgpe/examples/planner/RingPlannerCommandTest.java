package spgpe.examples.planner;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import picocli.CommandLine;

/** The planner as a command. */
class RingPlannerCommandTest {
  private record Outcome(int code, String out, String err) {}

  private static Outcome run(String... arguments) {
    StringWriter out = new StringWriter();
    StringWriter err = new StringWriter();
    CommandLine line =
        RingPlannerCommand.commandLine().setOut(new PrintWriter(out)).setErr(new PrintWriter(err));
    int code = line.execute(arguments);
    return new Outcome(code, out.toString(), err.toString());
  }

  @SuppressWarnings("unchecked")
  private static Map<String, Object> json(String... arguments) {
    String[] all = Arrays.copyOf(arguments, arguments.length + 1);
    all[arguments.length] = "--json";
    Outcome outcome = run(all);
    assertEquals(0, outcome.code(), outcome.err());
    return (Map<String, Object>) JsonReader.read(outcome.out());
  }

  @SuppressWarnings("unchecked")
  private static Map<String, Object> part(Map<String, Object> json, String key) {
    Map<String, Object> part = (Map<String, Object>) json.get(key);
    assertNotNull(part, key);
    return part;
  }

  private static double number(Map<String, Object> json, String part, String key) {
    return (double) part(json, part).get(key);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "--temperature=0", "--temperature=NaN", "--temperature=warm", "--atoms=1", "--radius=0",
        "--coherent=-1", "--coherent=NaN", "--lambda2=-1", "--inter=2000", "--shot=0",
        "--damping=0", "--error=0", "--lifetime=-5", "--vary=luck", "--modes=-1",
        "--trajectories=0", "--threads=0", "--unknown=1"
      })
  void wrongValueGivesOneLineAndCode2(String option) {
    Outcome outcome = run(option);
    assertEquals(2, outcome.code(), outcome.err());
    assertEquals(1, outcome.err().strip().lines().count(), outcome.err());
    assertTrue(outcome.err().contains("--help"), outcome.err());
    assertTrue(outcome.err().contains(option.substring(0, option.indexOf('='))), outcome.err());
    assertEquals("", outcome.out());
  }

  @Test
  void unreachableLifetimeGivesOneLineWithTheRangeAndCode2() {
    Outcome outcome = run("--lifetime=0.01");
    assertEquals(2, outcome.code());
    assertEquals(1, outcome.err().strip().lines().count(), outcome.err());
    assertTrue(outcome.err().contains("range"), outcome.err());
    assertTrue(outcome.err().contains("nK"), outcome.err());
    assertEquals("", outcome.out());
  }

  @Test
  void helpNamesUnitsAndCaution() {
    Outcome outcome = run("--help");
    assertEquals(0, outcome.code());
    for (String word : List.of("nK", "ms", "Hz", "Bohr radii", "dimensionless", "safety rules")) {
      assertTrue(outcome.out().replaceAll("\\s+", " ").contains(word), word);
    }
  }

  @Test
  void textReport() {
    Outcome outcome = run();
    assertEquals(0, outcome.code(), outcome.err());
    assertEquals("", outcome.err());
    for (String word :
        List.of(
            "safety rules", "mean lifetime", "FULL_SADDLE", "shots", "truncation time",
            "--calibrate", "OUTSIDE  gamma used/gamma kinetic", "more checks")) {
      assertTrue(outcome.out().contains(word), word + " missing in " + outcome.out());
    }
    assertTrue(outcome.out().lines().count() < 50, "a page");
  }

  @Test
  void jsonHoldsThePlan() {
    Map<String, Object> plan = json("--temperature=27", "--shot=1000", "--error=5");
    double rate = number(plan, "rate", "per_second");
    assertEquals(1000 / rate, number(plan, "shots", "mean_lifetime_ms"), 1e-9 * 1000 / rate);
    double fraction = number(plan, "shots", "decayed_fraction");
    assertEquals(1 - Math.exp(-rate), fraction, 1e-12);
    assertEquals(400, number(plan, "shots", "decays_needed"));
    assertEquals(Math.ceil(400 / fraction), number(plan, "shots", "shots_needed"));
    assertTrue(number(plan, "simulation", "step") > 0);
    assertFalse(part(plan, "simulation").containsKey("computing_time_s"), "nothing timed unasked");
    assertFalse(plan.containsKey("refusal"));
    assertTrue(((List<?>) plan.get("verdicts")).size() > 15);
    assertTrue(String.valueOf(plan.get("caution")).contains("safety rules"));
  }

  @Test
  void calibrationAddsAPositiveComputingTime() {
    Map<String, Object> plan = json("--calibrate");
    assertTrue(number(plan, "simulation", "computing_time_s") > 0);
    assertTrue(number(plan, "simulation", "us_per_trajectory_and_step") > 0);
  }

  @ParameterizedTest
  @CsvSource({
    "--lambda2=0.9, NOT_METASTABLE", "--coherent=0, NOT_METASTABLE",
    "--coherent=200, NOT_COVERED", "--temperature=90, BARRIER_TOO_LOW",
    "--radius=1, RING_TOO_SHORT"
  })
  void refusalsAreReportedNotFailed(String option, String reason) {
    Map<String, Object> plan = json(option);
    assertEquals(reason, part(plan, "refusal").get("reason"));
    assertFalse(plan.containsKey("rate"));
    assertFalse(plan.containsKey("shots"));
    Outcome text = run(option);
    assertEquals(0, text.code(), text.err());
    assertTrue(text.out().contains("no rate: " + reason), text.out());
  }

  @Test
  void couplingBetweenTheComponentsFallsBackWithAReason() {
    Map<String, Object> plan = json("--inter=6");
    assertEquals("SADDLE_BARRIER", part(plan, "rate").get("basis"));
    assertTrue(String.valueOf(part(plan, "rate").get("remarks")).contains("g12"));
  }

  @ParameterizedTest
  @ValueSource(strings = {"temperature", "coupling"})
  void searchFindsTheLifetime(String knob) {
    Map<String, Object> plan = json("--lifetime=2000", "--vary=" + knob);
    assertEquals(2000, number(plan, "shots", "mean_lifetime_ms"), 1e-4);
    assertEquals(2.2, number(plan, "experiment", "lambda_squared"));
    boolean colder = number(plan, "experiment", "temperature_nk") < 26;
    boolean stronger = number(plan, "experiment", "coherent_coupling_hz") > 50;
    assertEquals(knob.equals("temperature"), colder);
    assertEquals(knob.equals("coupling"), stronger);
  }
}
