package isowright.report;

import static java.nio.charset.StandardCharsets.UTF_8;
import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import isowright.study.Figure;
import isowright.study.Findings;
import isowright.study.FindingsFixture;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Parameter;
import isowright.study.PlanFindings.CurvePoint;
import isowright.study.PlanFindings.Planned;
import isowright.study.RealFindings;
import isowright.study.RealFindings.Study;
import java.io.IOException;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The findings file keeps its format and says what the findings say, digit by digit. */
class FindingsJsonTest {

  private static final ObjectMapper STRICT =
      new ObjectMapper().enable(JsonParser.Feature.STRICT_DUPLICATE_DETECTION);

  static Stream<Named<Findings>> all() {
    return RealFindings.withInvented().entrySet().stream()
        .map(entry -> Named.of(entry.getKey(), entry.getValue()));
  }

  private static JsonNode file(Findings findings) throws IOException {
    return STRICT.readTree(FindingsJson.write(findings));
  }

  @ParameterizedTest
  @MethodSource("all")
  void keepsTheFormat(Findings findings) throws IOException {
    FindingsContract.check(file(findings));
  }

  /** JSON has no word for them; a file that held one would not parse elsewhere. */
  @ParameterizedTest
  @MethodSource("all")
  void knowsNoNaNAndNoInfinity(Findings findings) {
    assertThat(new String(FindingsJson.write(findings), UTF_8))
        .doesNotContainPattern("\\b(NaN|Infinity|null,null|Optional)\\b");
  }

  /** Objects that a study may do without, and what an exact figure in a list leaves open. */
  private static final Set<String> MAY_BE_ABSENT =
      Set.of(
          "records",
          "scaling",
          "summary",
          "regularity",
          "curvature",
          "method",
          "varianceComponents",
          "technicalChange");

  @ParameterizedTest
  @MethodSource("all")
  void whereANumberIsNullTheNearestRemarksAreNotEmpty(Findings findings) throws IOException {
    explained(file(findings), "", false);
  }

  private static void explained(JsonNode node, String path, boolean above) {
    boolean remarked = node.has("remarks") ? !node.get("remarks").isEmpty() : above;
    boolean exact = node.has("method") && node.get("method").isNull();
    if (node.isArray()) {
      for (int i = 0; i < node.size(); i++) {
        explained(node.get(i), path + "/" + i, remarked);
      }
    }
    node.fields()
        .forEachRemaining(
            field -> {
              String at = path + "/" + field.getKey();
              boolean open = exact && List.of("se", "low", "high").contains(field.getKey());
              if (field.getValue().isNull() && !MAY_BE_ABSENT.contains(field.getKey()) && !open) {
                assertThat(remarked).as(at + " is null and no remark says why").isTrue();
              }
              explained(field.getValue(), at, remarked);
            });
  }

  @ParameterizedTest
  @MethodSource("all")
  void isTheSameBytesEachTime(Findings findings) {
    assertThat(FindingsJson.write(findings)).isEqualTo(FindingsJson.write(findings));
  }

  @ParameterizedTest
  @MethodSource("all")
  void fitsAreThoseOfTheFindings(Findings findings) throws IOException {
    JsonNode fits = file(findings).get("fits");
    assertThat(fits).hasSameSizeAs(findings.fits());
    for (int f = 0; f < fits.size(); f++) {
      Fitted fit = findings.fits().get(f);
      JsonNode written = fits.get(f);
      assertThat(written.get("technology").textValue()).isEqualTo(fit.technology());
      assertThat(written.get("state").textValue()).isEqualTo(fit.state());
      assertThat(written.get("converged").booleanValue()).isEqualTo(fit.usable());
      for (int p = 0; p < fit.parameters().size(); p++) {
        Parameter parameter = fit.parameters().get(p);
        assertThat(written.at("/parameters/" + p + "/name").textValue())
            .isEqualTo(parameter.name());
        assertSame(written.at("/parameters/" + p), parameter.figure());
        for (int q = 0; q < fit.parameters().size(); q++) {
          assertThat(written.get("covariance").get(p).get(q).doubleValue())
              .isEqualTo(fit.covariance()[p][q]);
        }
      }
      fit.returnsToScale().ifPresent(scale -> assertSame(written.get("returnsToScale"), scale));
      assertSame(written.get("outputElasticity"), fit.outputElasticity());
      for (int i = 0; i < fit.substitution().size(); i++) {
        assertSame(written.get("substitution").get(i), fit.substitution().get(i).figure());
      }
      assertThat(written.get("points")).hasSize(Math.min(10_000, fit.points().size()));
      assertThat(written.get("tests")).hasSameSizeAs(fit.tests());
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void plansAndFilingsAreThoseOfTheFindings(Findings findings) throws IOException {
    JsonNode file = file(findings);
    assertThat(file.get("leastCost")).hasSameSizeAs(findings.plans());
    for (int i = 0; i < findings.plans().size(); i++) {
      Planned plan = findings.plans().get(i);
      JsonNode written = file.get("leastCost").get(i);
      assertThat(written.get("status").textValue()).isEqualTo(plan.status());
      assertSame(written.get("mix"), plan.mix());
      assertSame(written.get("shares"), plan.shares());
      plan.cost().ifPresent(cost -> assertSame(written.get("cost"), cost));
      plan.marginalCost().ifPresent(cost -> assertSame(written.get("marginalCost"), cost));
      plan.averageCost().ifPresent(cost -> assertSame(written.get("averageCost"), cost));
      assertThat(written.get("curve")).hasSameSizeAs(plan.curve());
      for (int c = 0; c < plan.curve().size(); c++) {
        CurvePoint point = plan.curve().get(c);
        assertThat(written.at("/curve/" + c + "/target").doubleValue()).isEqualTo(point.target());
        assertSame(written.at("/curve/" + c + "/cost"), point.cost());
      }
    }
    assertThat(file.get("filing")).hasSameSizeAs(findings.reviews());
    for (int i = 0; i < findings.reviews().size(); i++) {
      JsonNode written = file.get("filing").get(i);
      findings.reviews().get(i).gap().ifPresent(gap -> assertSame(written.get("gap"), gap));
    }
  }

  private static void assertSame(JsonNode written, Map<String, Figure> figures) {
    assertThat(FindingsContract.names(written)).containsExactlyElementsOf(figures.keySet());
    figures.forEach((name, figure) -> assertSame(written.get(name), figure));
  }

  /** A double written in the fewest digits that read back to it is read back to it. */
  private static void assertSame(JsonNode written, Figure figure) {
    if (!Double.isFinite(figure.value())) {
      assertThat(written.isNull()).isTrue();
    } else if (written.isNumber()) {
      assertThat(figure.uncertainty()).as("exact").isEmpty();
      assertThat(written.doubleValue()).isEqualTo(figure.value());
    } else {
      assertThat(written.get("value").doubleValue()).isEqualTo(figure.value());
      figure
          .uncertainty()
          .ifPresent(
              u -> {
                assertNumber(written.get("se"), u.standardError());
                assertNumber(written.get("low"), u.low());
                assertNumber(written.get("high"), u.high());
                assertThat(written.get("method").textValue()).isEqualTo(u.method());
              });
    }
  }

  private static void assertNumber(JsonNode written, double number) {
    if (Double.isFinite(number)) {
      assertThat(written.doubleValue()).isEqualTo(number);
    } else {
      assertThat(written.isNull()).isTrue();
    }
  }

  @Test
  void aTechnologyTakenAsKnownHasPlainNumbers() throws IOException {
    JsonNode plan = file(FindingsFixture.givenOnly()).at("/leastCost/0");
    assertThat(plan.get("cost").isNumber()).isTrue();
    assertThat(plan.get("mix")).isNotEmpty().allSatisfy(q -> assertThat(q.isNumber()).isTrue());
  }

  /** A figure that no parameter moves is exact, and no interval of width nothing is made up. */
  @Test
  void whatAFormFixesIsExact() throws IOException {
    JsonNode pair = file(RealFindings.of(Study.DEMO)).at("/fits/0/substitution/0");
    assertThat(pair.get("value").doubleValue()).isEqualTo(1);
    assertThat(pair.get("se").isNull() && pair.get("low").isNull()).isTrue();
  }

  @Test
  void anOpenIntervalIsToldInTheNearestRemarks() throws IOException {
    JsonNode ces = file(FindingsFixture.troubled()).at("/fits/1");
    assertThat(ces.at("/curvature/substitutionHigh").isNull()).isTrue();
    assertThat(ces.get("remarks").findValuesAsText("code")).contains("open-interval");
  }

  @Test
  void everyDifficultStateIsWritten() throws IOException {
    JsonNode metals = file(RealFindings.of(Study.PRIMARY_METALS));
    assertThat(metals.get("fits").findValuesAsText("state")).contains("boundary", "estimated");
    assertThat(metals.at("/fits/1/converged").booleanValue()).isFalse();
    assertThat(metals.at("/fits/1/returnsToScale").isNull()).isTrue();
    assertThat(statuses(metals)).contains("outside-records", "irregular", "infeasible");
    JsonNode points = file(RealFindings.of(Study.THIRTY_POINTS));
    assertThat(points.get("fits").findValuesAsText("state")).contains("flat");
    assertThat(statuses(file(RealFindings.of(Study.DEMO)))).contains("solved", "corner");
  }

  private static List<String> statuses(JsonNode file) {
    return file.get("leastCost").findValuesAsText("status");
  }
}
