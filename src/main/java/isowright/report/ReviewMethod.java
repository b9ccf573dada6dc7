package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Display;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Section;
import isowright.report.PanelMethod.Citing;
import isowright.study.PlanFindings.Detail;
import isowright.study.PlanFindings.Reviewed;
import isowright.study.ReviewFindings;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;

/** The formulas behind a review of filed costs, and where they come from. */
final class ReviewMethod {

  private ReviewMethod() {}

  static Section of(Material material, Citing citing) {
    List<Block> blocks = new ArrayList<>();
    List<Reviewed> reviews = material.findings().reviews();
    if (reviews.stream().anyMatch(r -> r.technical().isPresent())
        || material.findings().costs().fits().isEmpty()) {
      parts(blocks, citing);
    }
    if (!material.findings().costs().fits().isEmpty()) {
      costSide(blocks, citing);
    }
    ReviewFindings review = material.findings().review();
    if (!review.orders().isEmpty()) {
      order(blocks, citing);
    }
    if (reviews.stream().flatMap(r -> r.detail().stream()).anyMatch(d -> d.scale().isPresent())) {
      blocks.add(
          Paragraph.of(
              "The efficient scale is the output at which average cost is least, where the scale"
                  + " elasticity along the least-cost mixes is one and falls "
                  + citing.cite(Source.CHRISTENSEN_GREENE, Source.HANOCH)
                  + "; a homogeneous technology has none."));
    }
    if (needed(reviews)) {
      blocks.add(
          Paragraph.of(
              "What would have to be true: one price, productivity or the elasticity of"
                  + " substitution (its base point kept "
                  + citing.cite(Source.DE_LA_GRANDVILLE)
                  + ") is moved until least cost equals the filed cost; least cost is monotone in"
                  + " each, so there is one value or none. Intervals by the implicit function."));
    }
    if (review.terms().isPresent()) {
      allowance(blocks);
    }
    Set<String> settings = material.findings().run().settings().keySet();
    if (settings.stream().anyMatch(key -> key.startsWith("capital."))) {
      userCost(blocks, citing);
    }
    return new Section(MethodSection.ID + "-review", "Review of filed costs", blocks);
  }

  private static void parts(List<Block> blocks, Citing citing) {
    blocks.add(
        Paragraph.of(
            "With x the quantities used, F the filed cost and θ the factor by which all quantities"
                + " would shrink to make just the output recorded, f(θ x) = Q "
                + citing.cite(Source.FARRELL, Source.KOPP)
                + ":"));
    blocks.add(
        Display.of(
            "F − C(w, Q) = (F − Σ_i w_i x_i) + (1 − θ) Σ_i w_i x_i + (θ Σ_i w_i x_i − C(w, Q))"));
    blocks.add(
        Paragraph.of(
            "These are the unreconciled, the technical and the mix part. Where no θ makes the"
                + " output, what they would divide stands as remainder. The split is made by"
                + " shrinking inputs at the recorded output; where isoquants are not parallel"
                + " another direction would split the same gap otherwise, which is said where it is"
                + " so. Intervals follow from the parameters' covariance with derivatives in closed"
                + " form "
                + citing.cite(Source.SHEPHARD)
                + "; the filing, its quantities and prices are taken as they stand, so the"
                + " unreconciled part is exact."));
    blocks.add(
        Display.of(
            "{∂ C}/{∂ β_k} = −λ Q {∂ ln f}/{∂ β_k}, {∂ ln θ}/{∂ β_k} = −{1}/{e} {∂ ln f}/{∂ β_k}"));
  }

  private static void costSide(List<Block> blocks, Citing citing) {
    blocks.add(
        Paragraph.of(
            "Against a cost function the gap is what the filing holds beyond recorded cost R"
                + " (unreconciled, exact) and what recorded cost holds beyond least cost. Where"
                + " shares are recorded they say the quantities x, and θ follows from the prices u"
                + " at which x would be least cost "
                + citing.cite(Source.KOPP)
                + "; technical and mix part are then those above, else they stand together as"
                + " remainder:"));
    blocks.add(
        Display.of("F − C(w, y) = (F − R) + (R − C(w, y)), θ = max_u {C(u, y)}/{Σ_i u_i x_i}"));
  }

  private static void order(List<Block> blocks, Citing citing) {
    blocks.add(
        Paragraph.of(
            "Ranks are taken in draws of the parameters from their estimated sampling distribution;"
                + " the band of a plant holds the middle of its ranks, and the share of draws in"
                + " which it has a rank is the probability of that rank "
                + citing.cite(Source.MARSHALL)
                + ". Plants are told apart by all pairs at once, against the largest studentised"
                + " difference "
                + citing.cite(Source.HOTHORN)
                + "."));
  }

  private static boolean needed(List<Reviewed> reviews) {
    return reviews.stream()
        .flatMap(r -> r.detail().stream())
        .map(Detail::needed)
        .anyMatch(n -> !n.isEmpty());
  }

  private static void allowance(List<Block> blocks) {
    blocks.add(
        Paragraph.of(
            "The allowance of year t, with c the controllable share, g the quantile of the gap that"
                + " is used (nought where it is negative), Y the years, f the frontier shift and i"
                + " the index (common practice of incentive regulation):"));
    blocks.add(
        Display.of(
            "A_t = [(1 − c) F + (c F − {t}/{Y} c g) (1 − f)^t] (1 + i)^t, g = 0 where it is"
                + " negative"));
  }

  private static void userCost(List<Block> blocks, Citing citing) {
    blocks.add(
        Paragraph.of(
            "User cost of capital, with q the price of the asset, r the rate of return, d"
                + " depreciation, p the change of the asset's price, t the tax rate, k the credit"
                + " and z the present value of the depreciation allowed "
                + citing.cite(Source.JORGENSON, Source.HALL)
                + ":"));
    blocks.add(Display.of("u = q (r + d − p) {1 − k − t z}/{1 − t}"));
  }
}
