package spgpe.examples.ring;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import picocli.CommandLine;

/** The main example as a command. */
class RingDecayCommandTest {
  private record Outcome(int code, String out, String err) {}

  private static Outcome run(String... arguments) {
    StringWriter out = new StringWriter();
    StringWriter err = new StringWriter();
    CommandLine line =
        RingDecayCommand.commandLine().setOut(new PrintWriter(out)).setErr(new PrintWriter(err));
    int code = line.execute(arguments);
    return new Outcome(code, out.toString(), err.toString());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "--temperatures=5", "--temperatures=NaN", "--temperatures=30,30", "--temperatures=warm",
        "--trajectories=0", "--trajectories=-3", "--until=1", "--until=Infinity", "--damping=0",
        "--damping=2", "--threads=-1", "--threads=5000", "--seed=x", "--unknown=1"
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
  void unusableFolderGivesOneLineAndCode2(@TempDir Path folder) throws IOException {
    Path file = Files.writeString(folder.resolve("file"), "in the way");
    Outcome outcome = run("--out=" + file.resolve("below"));
    assertEquals(2, outcome.code());
    assertEquals(1, outcome.err().strip().lines().count(), outcome.err());
    assertTrue(outcome.err().contains(file.toString()), outcome.err());
  }

  @Test
  void helpNamesUnits() {
    Outcome outcome = run("--help");
    assertEquals(0, outcome.code());
    for (String word : List.of("nK", "ms", "dimensionless", "default", "safety rules")) {
      assertTrue(outcome.out().contains(word), word);
    }
  }

  @Test
  void aSmallRunReportsAndWritesEverything(@TempDir Path folder) throws IOException {
    String[] options = {"--temperatures=33,40", "--trajectories=6", "--until=120", "--threads=2"};
    Outcome outcome = run(withOut(options, folder.resolve("a")));
    assertEquals(0, outcome.code(), outcome.err());
    assertTrue(outcome.out().contains("rate per second"), outcome.out());
    assertTrue(outcome.out().contains("Chosen for speed"), outcome.out());
    assertTrue(outcome.out().contains("mean lifetime/ms, predicted"), outcome.out());
    // at 40 nK the barrier is 7.5 T in the full saddle and 8.7 T in closed form
    assertTrue(outcome.out().contains("7.47   8.67"), outcome.out());
    for (String name :
        List.of("space-time.png", "survival.png", "rates.png", "rates.csv", "curves.npz")) {
      assertTrue(Files.size(folder.resolve("a").resolve(name)) > 0, name);
    }
    try (var files = Files.list(folder.resolve("a"))) {
      assertFalse(files.anyMatch(f -> f.toString().endsWith(".part")), "half-written file");
    }
    Outcome again = run(withOut(
        new String[] {options[0], options[1], options[2], "--threads=1"}, folder.resolve("b")));
    assertEquals(0, again.code());
    assertEquals(
        -1,
        Files.mismatch(
            folder.resolve("a").resolve("rates.csv"), folder.resolve("b").resolve("rates.csv")),
        "one and two threads must give the same numbers");
  }

  private static String[] withOut(String[] options, Path folder) {
    String[] all = java.util.Arrays.copyOf(options, options.length + 1);
    all[options.length] = "--out=" + folder;
    return all;
  }
}
