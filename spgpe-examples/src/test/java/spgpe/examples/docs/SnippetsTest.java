package spgpe.examples.docs;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.BiquadraticCoupling;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.model.Model;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;

/** The documents show code that compiles and runs, and their links lead somewhere. */
class SnippetsTest {
  private static final Path ROOT = Path.of("..").toAbsolutePath().normalize();
  private static final Path SOURCES = ROOT.resolve("spgpe-examples/src");
  private static final Pattern REGION =
      Pattern.compile("(?m)^ *// snippet-begin (\\S+)\\R(.*?)^ *// snippet-end", Pattern.DOTALL);
  private static final Pattern SHOWN =
      Pattern.compile("<!-- snippet: (\\S+) -->\\R```java\\R(.*?)```", Pattern.DOTALL);
  private static final Pattern JAVA_BLOCK = Pattern.compile("```java\\R");
  private static final Pattern LINK = Pattern.compile("\\]\\(([^)#\\s]+)(#[^)\\s]*)?\\)");

  @Test
  void firstUseRuns() {
    // 48 atoms in one component of the uniform state; the run must stay near it
    assertEquals(48, Snippets.firstUse(), 10);
  }

  @Test
  void ownEnsembleRuns() {
    double[] result = Snippets.ownEnsemble(Runnable::run);
    assertTrue(result[0] > 0.8 && result[0] < 1, "contrast after a cold start: " + result[0]);
    assertTrue(result[1] >= 0 && result[1] <= 8, "decayed: " + result[1]);
  }

  @Test
  void ringUnitsGiveTheNumbersOfThePage() {
    double[] numbers = Snippets.ringUnits();
    assertTrue(numbers[0] > 10, "verdicts: " + numbers[0]);
    assertEquals(0.401, numbers[1], 5e-4, "2000 t0 in s");
    // 3.2e-5 per x0 t0 with x0 = 0.55768 um, t0 = 0.20060 ms as printed on the page
    assertEquals(3.2e-5 / 0.55768e-6 / 0.20060e-3, numbers[2], 1e-4 * numbers[2]);
  }

  @Test
  void shotPlanGivesTheNumbersOfThePage() {
    double[] numbers = Snippets.shotPlan();
    assertEquals(0.775, numbers[0], 5e-4, "fraction");
    assertEquals(130, numbers[1], "shots");
    assertEquals(23.45, numbers[2], 0.05, "temperature in nK");
    assertEquals(11.06, numbers[3], 0.005, "E_b/T");
    assertEquals(2, numbers[4], "components");
  }

  @Test
  void metastableAverageIsNearTheMeanField() {
    CoherentRegion region = Projector.modesUpTo(24).on(PeriodicGrid.of(Axis.of(128, 48)));
    Hamiltonian energy =
        Hamiltonian.pair(1, 0).with(CoherentCoupling.constant(0.1))
            .with(BiquadraticCoupling.of(0.225));
    Model model = Model.of(region, energy, Reservoir.of(0.02, 1.1, 0.1));
    // mean field (mu - J)/g = 1, lowered by about half of the fluctuations of order T
    assertEquals(1, Snippets.metastableAverage(model, Runnable::run).value(), 0.02);
  }

  @Test
  void documentsShowTheCodeOfTheSources() throws IOException {
    Map<String, String> regions = new HashMap<>();
    for (Path source : files(SOURCES, ".java")) {
      Matcher region = REGION.matcher(Files.readString(source));
      while (region.find()) {
        regions.put(region.group(1), region.group(2).stripTrailing().stripIndent());
      }
    }
    Set<String> seen = new HashSet<>();
    for (Path document : documents()) {
      String text = Files.readString(document);
      Matcher shown = SHOWN.matcher(text);
      int count = 0;
      while (shown.find()) {
        count++;
        String name = shown.group(1);
        assertTrue(regions.containsKey(name), document + " shows an unknown snippet " + name);
        assertEquals(
            regions.get(name), shown.group(2).strip(), document + ", snippet " + name);
        seen.add(name);
      }
      assertEquals(
          JAVA_BLOCK.matcher(text).results().count(), count,
          document + " has a Java block that is no snippet");
    }
    assertEquals(regions.keySet(), seen, "snippets that no document shows");
  }

  @Test
  void linksOfTheDocumentsLeadSomewhere() throws IOException {
    for (Path document : documents()) {
      Matcher link = LINK.matcher(Files.readString(document));
      while (link.find()) {
        String target = link.group(1);
        if (!target.contains("://")) {
          assertTrue(
              Files.exists(document.resolveSibling(target)),
              document + " links to a missing file: " + target);
        }
      }
    }
  }

  private static List<Path> documents() throws IOException {
    List<Path> all = new ArrayList<>(files(ROOT.resolve("docs"), ".md"));
    all.add(ROOT.resolve("README.md"));
    all.add(ROOT.resolve("DEVELOPERS.md"));
    return all;
  }

  private static List<Path> files(Path folder, String ending) throws IOException {
    try (Stream<Path> walk = Files.walk(folder)) {
      return walk.filter(path -> path.toString().endsWith(ending)).toList();
    }
  }
}
