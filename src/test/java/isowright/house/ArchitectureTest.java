package isowright.house;

import static com.tngtech.archunit.base.DescribedPredicate.describe;
import static com.tngtech.archunit.core.domain.JavaModifier.SYNTHETIC;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.fields;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noFields;
import static com.tngtech.archunit.library.GeneralCodingRules.ACCESS_STANDARD_STREAMS;
import static com.tngtech.archunit.library.GeneralCodingRules.NO_CLASSES_SHOULD_THROW_GENERIC_EXCEPTIONS;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The house keeps its plan: what each package may import, and what no class may do. Each rule has
 * its reason, which is printed when the rule is broken.
 */
class ArchitectureTest {

  private static final JavaClasses HOUSE =
      new ClassFileImporter()
          .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
          .importPackages("isowright");

  /** What every package may use: the platform (see the rule on drawing) and null annotations. */
  private static final List<String> PLATFORM = List.of("java..", "org.jspecify..");

  private static final String MATHS = "org.apache.commons.math3..";
  private static final String DISTRIBUTIONS = "org.apache.commons.statistics..";

  /**
   * One package and what it may import besides itself and the platform.
   *
   * @param name the package
   * @param rooms other packages of the house
   * @param libraries libraries and special parts of the platform
   * @param reason why no more
   */
  record Room(String name, List<String> rooms, List<String> libraries, String reason) {
    @Override
    public String toString() {
      return name;
    }
  }

  static Stream<Room> plan() {
    List<String> ground = List.of("technology", "cost", "regression", "records");
    List<String> fitting = with(ground, "estimation");
    List<String> concluding = with(fitting, "inference");
    List<String> reviewing = with(with(concluding, "leastcost"), "review");
    return Stream.of(
        new Room(
            "technology",
            List.of(),
            List.of(MATHS, DISTRIBUTIONS),
            "a technology is economics alone: it must serve a filing's formula as well as a fit"),
        new Room(
            "cost",
            List.of(),
            List.of(MATHS, DISTRIBUTIONS),
            "a cost function is economics alone, the other side of a technology"),
        new Room(
            "regression",
            List.of(),
            List.of(MATHS, DISTRIBUTIONS),
            "least squares is statistics alone, certified on data that know no economics"),
        new Room(
            "records",
            List.of(),
            List.of(
                "tech.tablesaw..",
                "org.apache.poi..",
                "de.siegmar.fastcsv..",
                "javax.xml..",
                "org.xml.sax.."),
            "reading files must not depend on what is later done with the numbers"),
        new Room(
            "estimation",
            ground,
            List.of(MATHS, DISTRIBUTIONS),
            "estimation joins the ground rooms, no more"),
        new Room(
            "inference",
            fitting,
            List.of(MATHS, DISTRIBUTIONS),
            "conclusions rest on fits and what is below"),
        new Room(
            "leastcost",
            List.of("technology"),
            List.of(),
            "a least cost follows from a technology alone, however that was come by"),
        new Room(
            "review",
            with(concluding, "leastcost"),
            List.of(),
            "a review holds costs against plans and fits; it words nothing"),
        new Room(
            "study",
            reviewing,
            List.of("org.snakeyaml.."),
            "the study runs the stages and gathers findings; no view may be known to it"),
        new Room(
            "charts",
            List.of("study"),
            List.of("org.knowm.xchart..", "javax.imageio..", "org.w3c.dom.."),
            "a chart shows findings; one that reaches below would compute"),
        new Room(
            "runs",
            List.of("study", "records", "estimation"),
            List.of("com.fasterxml.jackson..", "org.snakeyaml.."),
            "two runs are compared by what their folders say; nothing is estimated here"),
        new Room(
            "report",
            List.of("study", "charts", "runs"),
            List.of("com.fasterxml.jackson.."),
            "a report shows findings; one that reaches below would compute"),
        new Room(
            "handover",
            List.of("report", "charts", "study", "records"),
            List.of(
                "org.apache.poi..",
                "org.apache.commons.compress..",
                "org.openxmlformats..",
                "org.apache.xmlbeans.."),
            "paper says what the page says; workpapers show how it follows from the records"),
        new Room(
            "workbench",
            List.of("study", "records", "estimation", "charts", "report"),
            List.of(),
            "from code a study is said as in its file, and answered by the same stages"),
        new Room(
            "cli",
            with(
                with(with(with(with(reviewing, "study"), "charts"), "runs"), "report"), "handover"),
            List.of("picocli.."),
            "commands may use everything, and are used by nothing"));
  }

  private static List<String> with(List<String> rooms, String more) {
    List<String> all = new ArrayList<>(rooms);
    all.add(more);
    return List.copyOf(all);
  }

  @ParameterizedTest
  @MethodSource("plan")
  void importsKeepThePlan(Room room) {
    List<String> allowed = new ArrayList<>(PLATFORM);
    allowed.add("isowright." + room.name());
    room.rooms().forEach(other -> allowed.add("isowright." + other));
    allowed.addAll(room.libraries());
    classes()
        .that()
        .resideInAPackage("isowright." + room.name())
        .should()
        .onlyDependOnClassesThat()
        .resideInAnyPackage(allowed.toArray(String[]::new))
        .because(room.reason())
        .check(HOUSE);
  }

  @Test
  void everyPackageIsInThePlan() {
    List<String> planned = plan().map(room -> "isowright." + room.name()).toList();
    assertThat(HOUSE)
        .as("a class in a package without a row in the plan would escape it")
        .allSatisfy(type -> assertThat(planned).contains(type.getPackageName()));
  }

  /** The rules above pass on an empty house too, so the house must not be empty. */
  @Test
  void enoughClassesAreSeen() {
    assertThat(HOUSE.size()).isGreaterThan(60);
  }

  @Test
  void noCycles() {
    slices()
        .matching("isowright.(*)..")
        .should()
        .beFreeOfCycles()
        .because("data flows one way, so a reader can too")
        .check(HOUSE);
  }

  @Test
  void formsAreKnownInOnePlaceOnly() {
    List<String> forms =
        List.of("CobbDouglas", "Ces", "NestedCes", "GeneralisedLeontief", "Translog");
    noClasses()
        .that()
        .resideOutsideOfPackage("isowright.technology")
        .and(
            describe(
                "are not the reader of given technologies",
                type -> !type.getName().startsWith("isowright.study.GivenBinder")))
        .should()
        .dependOnClassesThat(
            describe(
                "are a concrete form",
                (JavaClass type) ->
                    type.getPackageName().equals("isowright.technology")
                        && forms.contains(type.getSimpleName())))
        .because("a new form is one file and one entry in the reader of given technologies")
        .check(HOUSE);
  }

  @Test
  void onlyTheCommandLinePrints() {
    noClasses()
        .that()
        .resideOutsideOfPackage("isowright.cli")
        .should(ACCESS_STANDARD_STREAMS)
        .because("results are values; only the command line speaks to people")
        .check(HOUSE);
  }

  @Test
  void onlyTheEntryEndsTheProcess() {
    noClasses()
        .that()
        .doNotHaveFullyQualifiedName("isowright.cli.Main")
        .should()
        .callMethod(System.class, "exit", int.class)
        .because("a library that ends the process cannot be tested or used")
        .check(HOUSE);
  }

  @Test
  void onlyChartsDraw() {
    noClasses()
        .that()
        .resideOutsideOfPackage("isowright.charts")
        .should()
        .dependOnClassesThat()
        .resideInAnyPackage("java.awt..", "javax.swing..", "java.beans..")
        .because("drawing loads fonts and a toolkit, which every other command does without")
        .check(HOUSE);
  }

  @Test
  void noGenericExceptions() {
    NO_CLASSES_SHOULD_THROW_GENERIC_EXCEPTIONS
        .because("a failure says of which kind it is: the exit code depends on it")
        .check(HOUSE);
  }

  @Test
  void noPublicMutableFields() {
    fields()
        .that()
        .arePublic()
        .should()
        .beFinal()
        .because("values do not change under their readers")
        .check(HOUSE);
    noFields()
        .that()
        .arePublic()
        .should()
        .haveRawType(describe("an array", JavaClass::isArray))
        .because("the elements of a public array can be set by anybody")
        .check(HOUSE);
  }

  @Test
  void noStaticMutableState() {
    fields()
        .that()
        .areStatic()
        .and()
        .doNotHaveModifier(SYNTHETIC)
        .should()
        .beFinal()
        .because("two studies in one process must not see each other")
        .check(HOUSE);
    noFields()
        .that()
        .areStatic()
        .should()
        .haveRawType(
            describe(
                "a container or counter made to be changed",
                type ->
                    type.getPackageName().startsWith("java.util.concurrent")
                        || List.of("ArrayList", "HashMap", "LinkedHashMap", "HashSet", "Random")
                            .contains(type.getSimpleName())
                        || type.getSimpleName().startsWith("StringBu")))
        .because("two studies in one process must not see each other")
        .check(HOUSE);
  }

  @Test
  void noDrawersForOddments() {
    noClasses()
        .should()
        .haveNameMatching(".*(Util|Utils|Utility|Helper|Helpers|Manager|Common)(\\$.*)?")
        .because("a name that tells nothing gathers everything")
        .check(HOUSE);
  }
}
