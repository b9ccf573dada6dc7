package isowright.report;

import isowright.report.Document.Block;
import isowright.report.Document.Display;
import isowright.report.Document.Paragraph;
import isowright.report.Document.Section;
import isowright.report.PanelMethod.Citing;
import isowright.study.CostFindings.Fitted;
import java.util.ArrayList;
import java.util.List;

/** The formulas behind the cost side, and where they come from. */
final class CostMethod {

  private CostMethod() {}

  static Section of(List<Fitted> fits, Citing citing) {
    List<Block> blocks = new ArrayList<>();
    blocks.add(
        Paragraph.of(
            "Translog cost over the logs z of prices w, outputs y, fixed inputs and, as it is, time"
                + " "
                + citing.cite(Source.CHRISTENSEN_GREENE)
                + "; other forms leave terms out. The share of input i is the derivative in the log"
                + " of its price "
                + citing.cite(Source.SHEPHARD)
                + ":"));
    blocks.add(
        Display.of(
            "ln C = a_0 + Σ_k a_k z_k + {1}/{2} Σ_k Σ_l b_{kl} z_k z_l, s_i = {∂ ln C}/{∂ ln"
                + " w_i}"));
    blocks.add(
        Paragraph.of(
            "Homogeneity in prices is imposed by writing the coefficients of the last price in"
                + " terms of the others. Cost and share equations, one share left out, share their"
                + " coefficients; their errors go together within a row and are weighted by their"
                + " estimated covariance, renewed until nothing moves, which is maximum likelihood"
                + " and does not depend on the share left out where shares add up to one "
                + citing.cite(Source.ZELLNER, Source.BARTEN, Source.BERNDT)
                + ". A cost equation alone is fitted by least squares."));
    if (fits.stream().anyMatch(fit -> fit.how().equations().equals("quantities"))) {
      inLevels(blocks, citing);
    }
    if (fits.stream().anyMatch(fit -> fit.how().concave().isPresent())) {
      concave(blocks, citing);
    }
    blocks.add(
        Paragraph.of(
            "Elasticities from shares and the Hessian H of ln C in the logs of prices; scale"
                + " economies are one over the elasticity of cost in outputs, less what fixed"
                + " inputs bear where there are any "
                + citing.cite(Source.CAVES)
                + ":"));
    blocks.add(Display.of("A_{ij} = {H_{ij} + s_i s_j}/{s_i s_j}, i ≠ j, ε_{ij} = s_j A_{ij}"));
    blocks.add(
        Paragraph.of(
            "It is a cost function where shares and marginal costs are positive and cost is concave"
                + " in prices; both are examined at every row."));
    answers(blocks, citing);
    return new Section(MethodSection.ID + "-costs", "The cost side", blocks);
  }

  /** How least-cost questions are answered, and average costs compared. */
  private static void answers(List<Block> blocks, Citing citing) {
    blocks.add(
        Paragraph.of(
            "Asked for a least cost, a cost function answers with its value, its demands (share"
                + " times cost over price) and its derivative in output. Inputs of a total cost"
                + " that are held or limited are answered by virtual prices v at which what is held"
                + " would be bought of one's own accord "
                + citing.cite(Source.NEARY_ROBERTS)
                + "; fixed inputs of a variable cost V that have a price p are chosen where a unit"
                + " of them saves as much variable cost as it costs, which is the long run "
                + citing.cite(Source.BROWN_CHRISTENSEN)
                + ":"));
    blocks.add(Display.of("C_{held} = C(v, y) + Σ_h (w_h − v_h) x_h, −{∂ V}/{∂ k_f} = p_f"));
    blocks.add(
        Paragraph.of(
            "With plant effects the level of the typical plant is the mean over rows of ln C less"
                + " what the cost function explains, that of one plant the mean over its own rows;"
                + " controls stand at their means. The chance left in such a mean is part of the"
                + " interval. Average costs of rows are carried to mean prices by the ratio of the"
                + " cost function there to that at the prices paid."));
  }

  private static void inLevels(List<Block> blocks, Citing citing) {
    blocks.add(
        Paragraph.of(
            "Generalised Leontief and McFadden cost are sums in levels, homogeneous in prices as"
                + " they stand, with h the sum of outputs, θ the mean quantities of inputs over"
                + " their sum, prices and outputs over their base "
                + citing.cite(Source.DIEWERT_WALES)
                + "; several outputs enter by their products, with costs b that are fixed "
                + citing.cite(Source.BAUMOL_PANZAR_WILLIG)
                + ". The price function q is a sum of roots of products of two prices, or a"
                + " quadratic form S over the index θ′w. They are fitted to the quantities of all"
                + " inputs, spending over price, over h, their errors weighted and renewed"
                + " likewise."));
    blocks.add(
        Display.of(
            "C = h q(w) + Σ_i Σ_k c_{ik} w_i y_k + Σ_i b_i w_i + h t Σ_i τ_i w_i + θ′w (β t + β_2"
                + " t^2 h + Σ_k Σ_l d_{kl} y_k y_l)"));
  }

  private static void concave(List<Block> blocks, Citing citing) {
    blocks.add(
        Paragraph.of(
            "Cost is made concave in prices by writing a matrix as the negative of a square, −L L′"
                + " with L lower triangular: S of McFadden cost, which is then concave at all"
                + " prices "
                + citing.cite(Source.DIEWERT_WALES)
                + "; of translog cost the second derivatives at the mean of the records, where it"
                + " is then concave, s the shares there "
                + citing.cite(Source.RYAN_WALES)
                + ". Tests of such a fit are those of the same equations fitted freely."));
    blocks.add(
        Display.of(
            "b_{ij} + s_i s_j = −Σ_k L_{ik} L_{jk}, i ≠ j, b_{ii} + s_i s_i − s_i = −Σ_k L_{ik}"
                + " L_{ik}"));
  }
}
