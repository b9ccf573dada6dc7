package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Display;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Section;
import isowright.report.PanelMethod.Citing;
import java.util.ArrayList;
import java.util.List;

/** The formulas behind the cost side, and where they come from. */
final class CostMethod {

  private CostMethod() {}

  static Section of(Citing citing) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "Translog cost over the logs z of prices w, outputs y, fixed inputs and, as it is, time "
                + citing.cite(Source.CHRISTENSEN_GREENE)
                + "; other forms leave terms out. The share of input i is the derivative in the log of"
                + " its price "
                + citing.cite(Source.SHEPHARD)
                + ":"));
    blocks.add(
        Display.of(
            "ln C = a_0 + Σ_k a_k z_k + {1}/{2} Σ_k Σ_l b_{kl} z_k z_l, s_i = {∂ ln C}/{∂ ln w_i}"));
    blocks.add(
        Paragraph.of(
            "Homogeneity in prices is imposed by writing the coefficients of the last price in terms of"
                + " the others. Cost and share equations, one share left out, share their"
                + " coefficients; their errors go together within a row and are weighted by their"
                + " estimated covariance, renewed until nothing moves, which is maximum likelihood and"
                + " does not depend on the share left out where shares add up to one "
                + citing.cite(Source.ZELLNER, Source.BARTEN, Source.BERNDT)
                + ". A cost equation alone is fitted by least squares."));
    blocks.add(
        Paragraph.of(
            "Elasticities from shares and the Hessian H of ln C in the logs of prices; scale economies"
                + " are one over the elasticity of cost in outputs, less what fixed inputs bear where"
                + " there are any "
                + citing.cite(Source.CAVES)
                + ":"));
    blocks.add(Display.of("A_{ij} = {H_{ij} + s_i s_j}/{s_i s_j}, i ≠ j, ε_{ij} = s_j A_{ij}"));
    blocks.add(
        Paragraph.of(
            "It is a cost function where shares and marginal costs are positive and cost is concave in"
                + " prices; both are examined at every row."));
    return new Section(MethodSection.ID + "-costs", "The cost side", blocks);
  }
}
