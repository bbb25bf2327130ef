package spgpe.examples;

import static com.tngtech.archunit.base.DescribedPredicate.not;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.belongToAnyOf;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.fields;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.domain.JavaCodeUnit;
import com.tngtech.archunit.core.domain.JavaField;
import com.tngtech.archunit.core.domain.JavaMethod;
import com.tngtech.archunit.core.domain.JavaModifier;
import com.tngtech.archunit.core.domain.JavaType;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.io.Serializable;
import java.lang.reflect.Field;
import java.lang.reflect.Modifier;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.hamiltonian.CoherentCoupling;
import spgpe.hamiltonian.Hamiltonian;
import spgpe.integrate.OuRk4;
import spgpe.integrate.Rk4Ip;
import spgpe.model.Model;
import spgpe.projector.Projector;
import spgpe.reservoir.Reservoir;
import spgpe.run.Ensemble;
import spgpe.run.InitialState;

/** The structure that the code promises: layers, no cycles, no global state, no foreign types. */
class ArchitectureTest {
  private static final JavaClasses CODE =
      new ClassFileImporter()
          .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
          .withImportOption(location -> !location.contains("-tests.jar"))
          .importPackages("spgpe");

  /** What each package of the core may import of the project, next to itself and the checks. */
  private static final Map<String, List<String>> ARROWS =
      new TreeMap<>(
          Map.ofEntries(
              Map.entry("grid", List.of()),
              Map.entry("fourier", List.of("grid")),
              Map.entry(
                  "projector",
                  List.of("grid", "fourier", "internal.lanes", "internal.vector")),
              Map.entry("hamiltonian", List.of("grid", "projector")),
              Map.entry(
                  "reservoir",
                  List.of("grid", "projector", "internal.random", "internal.vector")),
              Map.entry(
                  "model", List.of("grid", "fourier", "projector", "hamiltonian", "reservoir")),
              Map.entry(
                  "integrate",
                  List.of(
                      "grid", "fourier", "projector", "hamiltonian", "reservoir", "model",
                      "internal.linear")),
              Map.entry(
                  "run",
                  List.of(
                      "grid", "fourier", "projector", "hamiltonian", "reservoir", "model",
                      "integrate", "internal.linear")),
              Map.entry(
                  "integrate.bench",
                  List.of(
                      "grid", "fourier", "projector", "hamiltonian", "reservoir", "model",
                      "integrate")),
              Map.entry("units", List.of()),
              Map.entry("internal.check", List.of()),
              Map.entry("internal.random", List.of("internal.vector")),
              Map.entry("internal.linear", List.of()),
              Map.entry("internal.vector", List.of()),
              Map.entry("internal.lanes", List.of("internal.vector")),
              Map.entry("internal.fourier", List.of("fourier"))));

  /** Packages that may be absent while the project grows. */
  private static final List<String> LATER = List.of("units", "integrate.bench");

  private static final String[] CORE =
      ARROWS.keySet().stream().map(p -> "spgpe." + p).toArray(String[]::new);

  /** What is built on the core. */
  private static final String[] OBSERVABLES = {
    "spgpe.observables..", "spgpe.statistics..", "spgpe.theory..", "spgpe.output..",
    "spgpe.planning..", "spgpe.internal.measure.."
  };

  private static final String[] FOREIGN = {
    "org.jtransforms..", "pl.edu.icm..", "org.apache.commons.math3..", "org.ejml.."
  };

  @Test
  void theCodeWasFound() {
    for (String name : ARROWS.keySet()) {
      if (!LATER.contains(name)) {
        assertTrue(CODE.containPackage("spgpe." + name), name);
      }
    }
    assertTrue(CODE.size() > 70, "classes: " + CODE.size());
  }

  @Test
  void noPackageCycles() {
    slices().matching("spgpe.(**)").should().beFreeOfCycles().check(CODE);
  }

  @Test
  void everyPackageOfTheCoreImportsOnlyWhatLiesBelow() {
    for (Map.Entry<String, List<String>> entry : ARROWS.entrySet()) {
      String[] allowed =
          Stream.concat(
                  Stream.of(entry.getKey(), "internal.check").map(p -> "spgpe." + p),
                  entry.getValue().stream().map(p -> "spgpe." + p))
              .toArray(String[]::new);
      noClasses()
          .that()
          .resideInAPackage("spgpe." + entry.getKey())
          .should()
          .dependOnClassesThat(
              resideInAnyPackage("spgpe..").and(not(resideInAnyPackage(allowed))))
          .allowEmptyShould(true)
          .check(CODE);
    }
  }

  @Test
  void everyPackageHasItsPlace() {
    String[] places =
        Stream.of(Stream.of(CORE), Stream.of(OBSERVABLES), Stream.of("spgpe.examples.."))
            .flatMap(s -> s)
            .toArray(String[]::new);
    classes().should().resideInAnyPackage(places).check(CODE);
  }

  @Test
  void theCoreNeedsItsTwoLibrariesAndNothingElse() {
    noClasses()
        .that()
        .resideInAnyPackage(CORE)
        .should()
        .dependOnClassesThat()
        .resideOutsideOfPackages(
            Stream.concat(
                    Stream.of(CORE),
                    Stream.of(
                        "java..", "org.jspecify..", "org.apache.commons.rng..",
                        "org.jtransforms..", "jdk.incubator.vector..",
                        "")) // "": primitives and their arrays
                .toArray(String[]::new))
        .check(CODE);
  }

  @Test
  void internalPackagesStayInternal() {
    noClasses()
        .that()
        .resideOutsideOfPackages(
            Stream.concat(Stream.of(CORE), Stream.of(OBSERVABLES)).toArray(String[]::new))
        .should()
        .dependOnClassesThat()
        .resideInAPackage("spgpe.internal..")
        .allowEmptyShould(true)
        .check(CODE);
  }

  @Test
  void theCoreDoesNoInputOutputAndNoGraphics() {
    noClasses()
        .that()
        .resideInAnyPackage(CORE)
        .should()
        .dependOnClassesThat(
            resideInAnyPackage(
                    "java.io..", "java.nio.file..", "java.awt..", "java.net..", "java.sql..",
                    "javax..", "org.apache.commons.math3..", "org.ejml..")
                .and(not(belongToAnyOf(Serializable.class))))
        .check(CODE);
  }

  @Test
  void onlyOnePlaceKnowsTheTransformLibrary() {
    noClasses()
        .that()
        .resideOutsideOfPackage("spgpe.internal.fourier")
        .should()
        .dependOnClassesThat()
        .resideInAnyPackage("org.jtransforms..", "pl.edu.icm..")
        .check(CODE);
  }

  /** The classes that need the vector module load only where it is; the others must not name them. */
  @Test
  void onlyTheVectorClassesKnowTheVectorModule() {
    noClasses()
        .that()
        .haveSimpleNameNotStartingWith("Vector")
        .should()
        .dependOnClassesThat()
        .resideInAPackage("jdk.incubator.vector..")
        .orShould()
        .dependOnClassesThat()
        .haveNameMatching("spgpe\\.internal\\.(lanes|random)\\.Vector.*")
        .check(CODE);
  }

  @Test
  void noForeignOrInternalTypesInPublicSignatures() {
    List<String> wrong = new ArrayList<>();
    for (JavaClass type : CODE) {
      if (!isPublic(type) || type.getPackageName().startsWith("spgpe.internal")) {
        continue;
      }
      for (JavaField field : type.getFields()) {
        if (isVisible(field.getModifiers())) {
          collect(wrong, field.getFullName(), field.getType());
        }
      }
      for (JavaCodeUnit unit : type.getCodeUnits()) {
        if (isVisible(unit.getModifiers())) {
          collect(wrong, unit.getFullName(), unit.getReturnType());
          unit.getParameterTypes().forEach(p -> collect(wrong, unit.getFullName(), p));
        }
      }
      type.getSuperclass().ifPresent(s -> collect(wrong, type.getName(), s));
      type.getInterfaces().forEach(i -> collect(wrong, type.getName(), i));
    }
    assertEquals(List.of(), wrong);
  }

  private static boolean isPublic(JavaClass type) {
    return type.getModifiers().contains(JavaModifier.PUBLIC)
        && type.getEnclosingClass().map(ArchitectureTest::isPublic).orElse(true);
  }

  private static boolean isVisible(Set<JavaModifier> modifiers) {
    return modifiers.contains(JavaModifier.PUBLIC) || modifiers.contains(JavaModifier.PROTECTED);
  }

  private static void collect(List<String> wrong, String where, JavaType type) {
    for (JavaClass raw : type.getAllInvolvedRawTypes()) {
      if (resideInAnyPackage(FOREIGN).or(resideInAnyPackage("spgpe.internal..")).test(raw)) {
        wrong.add(where + " shows " + raw.getName());
      }
    }
  }

  @Test
  void staticFieldsAreFinal() {
    fields().that().areStatic().should().beFinal().check(CODE);
  }

  /**
   * Static final fields must hold values that do not change. A number, text, date, font, colour,
   * enum constant, logger or function is one; a collection must be unmodifiable; an object of the
   * project may have final fields only. Arrays are allowed as constants if no other package sees them and no method that
   * reads one returns an array it has not cloned; that nobody writes to them is seen by comparing
   * their contents before and after a run (next test).
   */
  @Test
  void staticFieldsHoldConstants() throws Exception {
    List<String> wrong = new ArrayList<>();
    for (JavaClass type : CODE) {
      for (JavaField field : type.getFields()) {
        if (!field.getModifiers().contains(JavaModifier.STATIC)
            || field.getModifiers().contains(JavaModifier.SYNTHETIC)) {
          continue;
        }
        if (field.getRawType().isArray()) {
          checkArray(field, wrong);
        } else if (!isConstant(value(field))) {
          wrong.add(field.getFullName() + " holds " + value(field));
        }
      }
    }
    assertEquals(List.of(), wrong);
  }

  private static void checkArray(JavaField field, List<String> wrong) {
    if (isVisible(field.getModifiers())) {
      wrong.add(field.getFullName() + " is an array that others may write to");
    }
    field
        .getAccessesToSelf()
        .forEach(
            access -> {
              boolean clones =
                  access.getOrigin().getMethodCallsFromSelf().stream()
                      .anyMatch(call -> call.getTarget().getName().matches("clone|copyOf.*"));
              if (access.getOrigin() instanceof JavaMethod method
                  && method.getRawReturnType().isArray()
                  && !method.getModifiers().contains(JavaModifier.PRIVATE)
                  && !clones) {
                wrong.add(method.getFullName() + " may hand out " + field.getName());
              }
            });
  }

  private static Object value(JavaField field) throws ReflectiveOperationException {
    Field reflected = field.reflect();
    reflected.setAccessible(true);
    return reflected.get(null);
  }

  private static boolean isConstant(Object value) {
    Class<?> type = value.getClass();
    if (value instanceof Collection || value instanceof Map) {
      return type.getName()
          .matches("java\\.util\\.(ImmutableCollections|Collections\\$(Unmod|Emp|Sing)).*");
    }
    boolean counter = type.getName().startsWith("java.util.concurrent");
    if ((value instanceof Number && !counter)
        || value instanceof String || value instanceof Boolean || value instanceof Character
        || value instanceof Enum || value instanceof System.Logger
        || value instanceof java.util.regex.Pattern || value instanceof java.nio.charset.Charset
        || value instanceof java.util.Locale || value instanceof Class
        || value instanceof java.time.temporal.TemporalAccessor
        || value instanceof java.awt.Font || value instanceof java.awt.Color
        || value instanceof java.awt.BasicStroke
        || type.getName().startsWith("jdk.incubator.vector.")
        || type.isHidden()) { // functions
      return true;
    }
    return type.getName().startsWith("spgpe.")
        && Arrays.stream(type.getDeclaredFields())
            .map(Field::getModifiers)
            .allMatch(m -> Modifier.isStatic(m) || Modifier.isFinal(m));
  }

  @Test
  void aRunLeavesEveryStaticArrayAsItWas() throws Exception {
    Map<String, String> before = staticArrays();
    Model model =
        Model.of(
            Projector.modesUpTo(4).on(PeriodicGrid.of(Axis.of(32, 9))),
            Hamiltonian.pair(1, 0.1).with(CoherentCoupling.constant(0.1)),
            Reservoir.of(0.1, 1, 0.1));
    Ensemble plan =
        Ensemble.of(model)
            .startingFrom(InitialState.uniform(1, -1))
            .trajectories(3)
            .seed(1)
            .until(5);
    assertTrue(plan.integratedBy(OuRk4.ofStep(0.1)).run().isComplete());
    assertTrue(plan.integratedBy(Rk4Ip.ofStep(0.1)).run().isComplete());
    assertEquals(before, staticArrays());
    assertTrue(before.keySet().stream().anyMatch(name -> name.contains("BoxMuller")), "found some");
  }

  private static Map<String, String> staticArrays() throws ReflectiveOperationException {
    Map<String, String> contents = new TreeMap<>();
    for (JavaClass type : CODE) {
      for (JavaField field : type.getFields()) {
        if (field.getModifiers().contains(JavaModifier.STATIC)
            && !field.getModifiers().contains(JavaModifier.SYNTHETIC)
            && field.getRawType().isArray()) {
          contents.put(field.getFullName(), Arrays.deepToString(new Object[] {value(field)}));
        }
      }
    }
    return contents;
  }
}
