package spgpe.examples.oblate;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.image.BufferedImage;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import picocli.CommandLine;

/** The two-dimensional example as a command. */
class OblateDecayCommandTest {
  private record Outcome(int code, String out, String err) {}

  private static Outcome run(String... arguments) {
    StringWriter out = new StringWriter();
    StringWriter err = new StringWriter();
    CommandLine line =
        OblateDecayCommand.commandLine()
            .setOut(new PrintWriter(out)).setErr(new PrintWriter(err));
    int code = line.execute(arguments);
    return new Outcome(code, out.toString(), err.toString());
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "--temperature=5", "--temperature=NaN", "--trajectories=0", "--until=1",
        "--until=Infinity", "--modes=6", "--modes=64", "--damping=0", "--damping=2",
        "--threads=-1", "--seed=x", "--unknown=1"
      })
  void wrongValueGivesOneLineAndCode2(String option) {
    Outcome outcome = run(option);
    assertEquals(2, outcome.code(), outcome.err());
    assertEquals(1, outcome.err().strip().lines().count(), outcome.err());
    assertTrue(outcome.err().contains("--help"), outcome.err());
    assertEquals("", outcome.out());
  }

  /** A warm gas, which decays at once: table, figures and files. */
  @Test
  void aSmallRunWritesEverything(@TempDir Path folder) throws Exception {
    Outcome outcome =
        run(
            "--temperature=68", "--trajectories=2", "--until=45", "--threads=1",
            "--out=" + folder);
    assertEquals(0, outcome.code(), outcome.err());
    assertEquals("", outcome.err());
    for (String expected :
        new String[] {
          "box of side 37.0 um", "FINE     m g/hbar^2 = 0.06988", "E_b/T = 14.4",
          "from the metastable state: mean cosine -0.8", "Nucleations:", "Wall speed:",
          "Trajectory 1: at most"
        }) {
      assertTrue(outcome.out().contains(expected), expected + " is not in:\n" + outcome.out());
    }
    assertTrue(Files.size(folder.resolve("defects.csv")) > 5000);
    assertTrue(Files.readString(folder.resolve("radii.csv")).contains("trajectory"));
    for (String name : new String[] {"panels.png", "radii.png", "defects.png"}) {
      BufferedImage image = ImageIO.read(folder.resolve(name).toFile());
      assertTrue(image.getWidth() > 800, name);
    }
  }

  @Test
  void anUnusedColdGasHasNoFigures(@TempDir Path folder) {
    Outcome outcome =
        run(
            "--modes=7", "--temperature=30", "--trajectories=1", "--until=35", "--threads=1",
            "--out=" + folder);
    assertEquals(0, outcome.code(), outcome.err());
    assertTrue(outcome.out().contains("No nucleation"), outcome.out());
  }
}
