package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Display;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Points;
import isowright.report.Document.Section;
import isowright.study.FitFindings.Fitted;
import isowright.study.FitFindings.Pair;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;

/**
 * Method and references: the formulas behind the figures of this report, and where they come from.
 */
final class MethodSection {

  static final String ID = "method";

  private final Material material;
  private final Set<Source> cited = new LinkedHashSet<>();

  private MethodSection(Material material) {
    this.material = material;
  }

  static Section of(Material material) {
    MethodSection method = new MethodSection(material);
    List<Block> blocks = new ArrayList<>();
    if (CostsSection.alone(material.findings())) {
      blocks.add(CostMethod.of(material.findings().costs().fits(), method::cite));
    } else {
      blocks.add(method.notation());
      blocks.add(method.forms());
      blocks.add(method.derived());
      if (!material.findings().costs().fits().isEmpty()) {
        blocks.add(CostMethod.of(material.findings().costs().fits(), method::cite));
      }
    }
    if (!material.findings().fits().isEmpty()) {
      blocks.add(method.estimation());
    }
    if (!material.findings().plans().isEmpty() && !CostsSection.alone(material.findings())) {
      blocks.add(method.leastCost());
    }
    if (!material.findings().reviews().isEmpty()) {
      blocks.add(ReviewMethod.of(material, method::cite));
    }
    blocks.add(method.references());
    return new Section(ID, "Method and references", blocks);
  }

  private Paragraph notation() {
    return new Paragraph(
        Text.formula("Q")
            .then(" is output, ")
            .thenFormula("x_i")
            .then(" the quantity of input ")
            .thenFormula("i")
            .then(", ")
            .thenFormula("w_i")
            .then(" its price, ")
            .thenFormula("C")
            .then(" cost, ")
            .thenFormula("f")
            .then(" the technology, ")
            .thenFormula("z_i = ln(x_i/x̄_i)")
            .then(" the log of an input divided by what it is scaled by, ")
            .thenFormula("t")
            .then(" the period. All logs are natural."));
  }

  private Section forms() {
    Set<String> names = new LinkedHashSet<>();
    material.findings().fits().forEach(fit -> names.add(fit.technology()));
    material.findings().given().forEach(given -> names.add(given.technology()));
    List<Block> blocks = new ArrayList<>();
    for (String name : names) {
      form(name, blocks);
    }
    return new Section(ID + "-forms", "Forms", blocks);
  }

  private void form(String name, List<Block> blocks) {
    switch (name) {
      case "cobb-douglas" -> {
        blocks.add(Paragraph.of("Cobb-Douglas " + cite(Source.COBB_DOUGLAS) + ":"));
        blocks.add(Display.of("ln Q = ln A + Σ_i β_i z_i + τ t"));
      }
      case "ces" -> {
        blocks.add(
            Paragraph.of(
                "Constant elasticity of substitution "
                    + cite(Source.ARROW, Source.UZAWA)
                    + ", written at a base point, since shares have no meaning without one "
                    + cite(Source.KLUMP)
                    + ":"));
        blocks.add(
            Display.of("ln Q = ln A − {ν}/{ρ} ln Σ_i δ_i e^{−ρ z_i} + τ t, σ = {1}/{1 + ρ}"));
      }
      case "nested-ces" -> {
        blocks.add(
            Paragraph.of(
                "Constant elasticity of substitution in two stages "
                    + cite(Source.SATO)
                    + ": inputs make composites, composites make output:"));
        blocks.add(Display.of("y_g = −{1}/{ρ_g} ln Σ_i δ_i e^{−ρ_g z_i}, σ_g = {1}/{1 + ρ_g}"));
        blocks.add(
            Display.of("ln Q = ln A − {ν}/{ρ} ln Σ_g δ_g e^{−ρ y_g} + τ t, σ = {1}/{1 + ρ}"));
      }
      case "generalised-leontief" -> {
        blocks.add(
            Paragraph.of(
                "Generalised Leontief production function "
                    + cite(Source.DIEWERT)
                    + ", homogeneous of degree ν, its weights summing to one:"));
        blocks.add(Display.of("ln Q = ln A + ν ln Σ_i Σ_j b_{ij} √{u_i u_j} + τ t, ln u_i = z_i"));
      }
      case "translog" -> {
        blocks.add(
            Paragraph.of(
                "Translog "
                    + cite(Source.CHRISTENSEN)
                    + "; the factor ½ makes second-order coefficients second derivatives:"));
        blocks.add(
            Display.of(
                "ln Q = ln A + Σ_i β_i z_i + {1}/{2} Σ_i Σ_j β_{ij} z_i z_j + τ t, β_{ij} ="
                    + " β_{ji}"));
      }
      default -> blocks.add(Paragraph.of("The form " + name + "."));
    }
  }

  private Section derived() {
    List<Block> blocks = new ArrayList<>();
    blocks.add(Paragraph.of("Output elasticities and the scale elasticity, which is their sum:"));
    blocks.add(Display.of("e_i = {∂ ln f}/{∂ ln x_i}, e = Σ_i e_i"));
    Set<String> measures = measures();
    if (measures.contains("hicks")) {
      blocks.add(Paragraph.of("Direct elasticity of substitution " + cite(Source.HICKS) + ":"));
      blocks.add(
          Display.of(
              "σ_{ij} = {f_i f_j (x_i f_i + x_j f_j)}/{x_i x_j (2 f_i f_j f_{ij} − f_i^2 f_{jj} −"
                  + " f_j^2 f_{ii})}"));
    }
    if (measures.contains("allen")) {
      blocks.add(
          new Paragraph(
              Text.of("Allen-Uzawa elasticity, with ")
                  .thenFormula("F")
                  .then(" the Hessian bordered by the gradient " + cite(Source.ALLEN) + ":")));
      blocks.add(Display.of("A_{ij} = {Σ_k x_k f_k}/{x_i x_j} {F_{ij}}/{|F|}"));
    }
    if (measures.contains("morishima")) {
      blocks.add(
          Paragraph.of(
              "Morishima elasticity; the price of the second input moves and the ratio answers "
                  + cite(Source.BLACKORBY)
                  + ":"));
      blocks.add(Display.of("M_{ij} = {f_j}/{x_i} {F_{ij}}/{|F|} − {f_j}/{x_j} {F_{jj}}/{|F|}"));
    }
    blocks.add(
        new Paragraph(
            Text.of("A technology is regular at a mix where every ")
                .thenFormula("f_i > 0")
                .then(
                    " and its Hessian is negative definite on the plane of equal output; both are"
                        + " examined at every row.")));
    return new Section(ID + "-derived", "What follows from a technology", blocks);
  }

  private Set<String> measures() {
    Set<String> measures = new LinkedHashSet<>();
    for (Fitted fit : material.findings().fits()) {
      fit.substitution().stream().map(Pair::measure).forEach(measures::add);
    }
    material
        .findings()
        .given()
        .forEach(given -> given.substitution().stream().map(Pair::measure).forEach(measures::add));
    return measures;
  }

  private Section estimation() {
    List<Text> points = new ArrayList<>();
    points.add(
        Text.of(
            "Forms linear in their parameters by least squares through an orthogonal decomposition,"
                + " with collinear columns found and named."));
    if (any("ces")) {
      points.add(
          Text.of(
              "CES along a grid of curvature, nonlinear least squares at every point, so that a"
                  + " flat or inadmissible optimum is seen; the interval of the elasticity of"
                  + " substitution comes from the profile of the sum of squares."));
    }
    if (material.usable().stream()
        .anyMatch(fit -> fit.regularity().flatMap(r -> r.imposed()).isPresent())) {
      points.add(
          Text.of(
              "Regularity imposed: the least sum of squares among the technologies whose"
                  + " elasticities are at least 0.000001 and whose isoquants bend by at least as"
                  + " much, by sequential quadratic programming from several starts, rows taken in"
                  + " as they are missed "
                  + cite(Source.JUDGE, Source.GALLANT, Source.GOLDFARB)
                  + "; bounds of the p-value of the rise "
                  + cite(Source.KODDE)
                  + "; covariance with what binds held as equations. Estimates at a bound are not"
                  + " normal, and a bootstrap does not mend it "
                  + cite(Source.ANDREWS)
                  + "."));
    }
    points.addAll(PanelMethod.points(material, this::cite));
    if (with("clustered")) {
      points.add(
          Text.of(
              "Covariance clustered by plant, factor G/(G − 1) · (N − 1)/(N − K), with t quantiles"
                  + " on G − 1 degrees of freedom "
                  + cite(Source.LIANG, Source.CAMERON)
                  + ". Tests of several restrictions at once take the covariance over plants left"
                  + " out, one at a time, and Hotelling’s law F(q, G − q): where plants are few the"
                  + " clustered covariance would reject far too often "
                  + cite(Source.BELL, Source.HOTELLING, Source.MACKINNON_GUIDE)
                  + "."));
    }
    if (with("robust") || with("hc3")) {
      points.add(Text.of("Covariance robust to unequal variances " + cite(Source.MACKINNON) + "."));
    }
    if (with("clustered-two-way")) {
      points.add(
          Text.of(
              "Covariance clustered by plant and by period: the sum of the two less that of their"
                  + " cells, with t quantiles on the smaller number of clusters less one "
                  + cite(Source.CAMERON_GELBACH)
                  + "."));
    }
    if (with("newey-west")) {
      points.add(
          Text.of(
              "Covariance for rows of a plant that depend on one another less and less over time "
                  + cite(Source.NEWEY)
                  + lags()));
    }
    if (with("driscoll-kraay")) {
      points.add(
          Text.of(
              "Covariance for rows of all plants that move together and depend on one another less"
                  + " and less over time "
                  + cite(Source.DRISCOLL)
                  + lags()));
    }
    points.add(
        Text.of(
            "Standard errors of derived figures by first-order propagation of the parameter"
                + " covariance; intervals of positive figures on the log scale, so that they stay"
                + " positive. Figures are rounded by their standard error "
                + cite(Source.GUM)
                + "."));
    if (material.findings().fits().stream().anyMatch(fit -> fit.smearing().isPresent())) {
      points.add(
          Text.of(
              "Predictions of output from logs by the smearing factor " + cite(Source.DUAN) + "."));
    }
    points.addAll(RobustnessMethod.points(material, this::cite));
    points.add(
        Text.of("On inputs chosen knowing productivity, see " + cite(Source.MARSCHAK) + "."));
    return new Section(ID + "-estimation", "Estimation", List.of(new Points(false, points)));
  }

  private String lags() {
    return "; the number of lags follows from the number of periods "
        + cite(Source.NEWEY_LAGS)
        + ".";
  }

  private boolean any(String technology) {
    return material.findings().fits().stream().anyMatch(f -> f.technology().equals(technology));
  }

  /** Of fits by least squares; what a likelihood does stands with it. */
  private boolean with(String standardErrors) {
    return material.findings().fits().stream()
        .filter(fit -> fit.frontier().isEmpty())
        .anyMatch(fit -> fit.how().standardErrors().equals(standardErrors));
  }

  private Section leastCost() {
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "The least-cost mix and its first-order conditions; the multiplier is marginal cost "
                + cite(Source.SHEPHARD)
                + ":"));
    blocks.add(Display.of("C(w, Q) = min_x Σ_i w_i x_i, f(x) = Q"));
    blocks.add(Display.of("w_i = λ f_i, λ = {∂ C}/{∂ Q}"));
    return new Section(ID + "-least-cost", "Least cost", blocks);
  }

  private Section references() {
    List<Text> entries = new ArrayList<>();
    cited.stream()
        .sorted((a, b) -> a.authors().compareTo(b.authors()))
        .forEach(source -> entries.add(source.entry()));
    return new Section(ID + "-references", "References", List.of(new Points(false, entries)));
  }

  /** "(Arrow et al. 1961; Uzawa 1962)"; what is cited is listed. */
  private String cite(Source... sources) {
    List<String> names = new ArrayList<>();
    for (Source source : sources) {
      cited.add(source);
      names.add(source.cited());
    }
    return "(" + String.join("; ", names) + ")";
  }
}
